"use client";

import { signIn } from "next-auth/react";
import { useState, type FormEvent } from "react";
import { Button } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";
import { useReady } from "@/app/use-ready";
import { TextInput } from "@/components/ui/text-input";

const SENTENCES: Readonly<Record<string, string>> = {
  "wrong-sign-in": "That e-mail and password do not go together. The e-mail you typed is still there.",
  "too-many": "Too many tries. Wait 15 minutes, or ask the owner for a new password link.",
};

/** Signs in and goes on; what was typed as e-mail stays when it fails. */
export function SignInForm({ next }: { readonly next: string }) {
  const [error, setError] = useState<string | null>(null);
  const ready = useReady();
  const [pending, setPending] = useState(false);

  async function submit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const form = new FormData(event.currentTarget);
    setPending(true);
    setError(null);
    const answer = await signIn("credentials", { redirect: false, email: form.get("email"), password: form.get("password") }).catch(() => undefined);
    if (answer?.ok && !answer.error) {
      window.location.assign(next);
      return;
    }
    setPending(false);
    setError(SENTENCES[answer?.error ?? ""] ?? "The shop's server did not answer. Try again in a moment.");
  }

  return (
    <form onSubmit={submit} className="grid gap-5" style={{ maxWidth: 420, width: "100%" }}>
      {error ? <Notice kind="error">{error}</Notice> : null}
      <TextInput label="E-mail" name="email" type="email" autoComplete="username" required maxLength={254} autoFocus />
      <TextInput label="Password" name="password" type="password" autoComplete="current-password" required maxLength={200} />
      <div>
        <Button type="submit" variant="fill" disabled={!ready} pending={pending} pendingLabel="Signing in">
          Sign in
        </Button>
      </div>
    </form>
  );
}
