import { headers } from "next/headers";
import { redirect } from "next/navigation";
import type { ReactNode } from "react";
import { StaffShell } from "@/components/shell/staff-shell";
import { currentActor } from "@/lib/server/auth/current-actor";
import { SignOut } from "./sign-out";

/** The back office's frame. It is no lock: each page asks for itself. */
export default async function StaffLayout({ children }: { children: ReactNode }) {
  const actor = await currentActor();
  if (!actor) redirect(`/sign-in?next=${encodeURIComponent((await headers()).get("x-ellwand-path") ?? "/staff")}`);
  return (
    <StaffShell person={{ name: actor.name, roles: actor.roles }} signOut={<SignOut />}>
      {children}
    </StaffShell>
  );
}
