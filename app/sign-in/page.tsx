import { redirect } from "next/navigation";
import { LonePage } from "@/components/shell/lone-page";
import { getShop } from "@/lib/data/shop";
import { currentActor } from "@/lib/server/auth/current-actor";
import { safeNext } from "./safe-next";
import { SignInForm } from "./sign-in-form";

export const metadata = { title: "Sign in" };

export default async function SignInPage({ searchParams }: { searchParams: Promise<Record<string, string | string[] | undefined>> }) {
  const next = safeNext((await searchParams).next);
  if (await currentActor()) redirect(next);
  const shop = await getShop();
  return (
    <LonePage title="Take your place" sub={shop ? shop.name : "This shop has not been set up yet."}>
      <SignInForm next={next} />
    </LonePage>
  );
}
