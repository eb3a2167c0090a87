"use client";

import { useRouter } from "next/navigation";
import { useState, type FormEvent } from "react";
import { LengthField } from "@/components/ui/length-field";
import { Notice } from "@/components/ui/notice";
import { SubmitButton } from "@/components/ui/submit-button";
import { Select, TextInput } from "@/components/ui/text-input";
import type { MeasureSystem } from "@/lib/core/measure/format";
import type { Length } from "@/lib/core/measure/length";
import { postJson } from "@/app/post-json";

const WHERE = [
  { value: "edge", label: "At the cut edge: earlier cuts were longer or shorter" },
  { value: "core", label: "At the core: the bolt never held what was written" },
];

/** The book follows the tape, with a reason. */
export function MeasureForm({ tag, system, left }: { readonly tag: string; readonly system: MeasureSystem; readonly left: number }) {
  const router = useRouter();
  const [measured, setMeasured] = useState<Length | null>(left as Length);
  const [requestId, setRequestId] = useState(() => crypto.randomUUID());
  const [error, setError] = useState<string | null>(null);
  const [pending, setPending] = useState(false);

  async function submit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const form = new FormData(event.currentTarget);
    setPending(true);
    const answer = await postJson(`/api/bolts/${tag}/measure`, { requestId, left: measured, where: form.get("where"), reason: form.get("reason") });
    setPending(false);
    setError(answer.ok ? null : answer.sentence);
    if (!answer.ok) return;
    setRequestId(crypto.randomUUID());
    router.refresh();
  }

  return (
    <form onSubmit={submit} className="grid gap-4" style={{ maxWidth: 640 }}>
      {error ? <Notice kind="error">{error}</Notice> : null}
      <LengthField label="What the tape says" name="left" system={system} defaultValue={left as Length} onChange={setMeasured} />
      <Select label="Where the difference lies" name="where" options={WHERE} />
      <TextInput label="Reason" name="reason" required maxLength={200} />
      <div>
        <SubmitButton pending={pending}>Write it down</SubmitButton>
      </div>
    </form>
  );
}
