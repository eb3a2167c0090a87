"use client";

import { useRouter } from "next/navigation";
import { useState, type FormEvent } from "react";
import { Notice } from "@/components/ui/notice";
import { SubmitButton } from "@/components/ui/submit-button";
import { TextInput } from "@/components/ui/text-input";
import { useReady } from "@/app/use-ready";
import { beginRun } from "./actions";

/** Reserves the fabric of so many kits and goes to the run's list. What was typed stays when it is refused. */
export function StartRunForm({ colourwayId, most }: { readonly colourwayId: number; readonly most: number }) {
  const router = useRouter();
  const [requestId, setRequestId] = useState(() => crypto.randomUUID());
  const [error, setError] = useState<string | null>(null);
  const ready = useReady();
  const [pending, setPending] = useState(false);

  async function submit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const form = new FormData(event.currentTarget);
    setPending(true);
    setError(null);
    const answer = await beginRun({ requestId, colourwayId, kits: String(form.get("kits")), purpose: "shelf", due: String(form.get("due")) }).catch(() => null);
    setPending(false);
    if (answer?.ok) {
      setRequestId(crypto.randomUUID());
      router.push(`/staff/runs/${answer.value.code}`);
    } else setError(answer?.fault.message ?? "The server did not answer. What you typed is still here; try again.");
  }

  return (
    <form onSubmit={submit} className="flex flex-wrap items-end gap-4 mt-4">
      {error ? <Notice kind="error">{error}</Notice> : null}
      <TextInput label="Make kits" name="kits" inputMode="numeric" defaultValue={String(Math.max(1, Math.min(3, most)))} required maxLength={4} />
      <TextInput label="By when" name="due" type="date" optional />
      <SubmitButton disabled={!ready} pending={pending}>Reserve fabric</SubmitButton>
    </form>
  );
}
