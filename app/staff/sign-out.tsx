"use client";

import { signOut } from "next-auth/react";
import { Button } from "@/components/ui/button";

/** Ends this session, here and in the database. */
export function SignOut() {
  return <Button onClick={() => void signOut({ callbackUrl: "/sign-in" })}>Sign out</Button>;
}
