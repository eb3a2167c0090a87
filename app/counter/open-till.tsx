"use client";

import { useState, type FormEvent } from "react";
import { postJson } from "@/app/post-json";
import { MoneyField } from "@/components/ui/money-field";
import { Notice } from "@/components/ui/notice";
import { SubmitButton } from "@/components/ui/submit-button";
import { Select } from "@/components/ui/text-input";
import type { TillView } from "@/lib/data/counter/tills";

interface OpenTillProps {
  readonly tills: readonly TillView[];
  readonly tillId: number;
  readonly currency: string;
  readonly choose: (id: number) => void;
  readonly opened: () => void;
}

export function OpenTill({ tills, tillId, currency, choose, opened }: OpenTillProps) {
  const [float, setFloat] = useState<number | null>(null);
  const [requestId] = useState(() => crypto.randomUUID());
  const [error, setError] = useState<string | null>(null);
  const [pending, setPending] = useState(false);

  async function submit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    if (float === null) return setError("Write what lies in the drawer, such as 100.00.");
    setPending(true);
    const answer = await postJson("/api/counter/tills/open", { requestId, tillId, float });
    setPending(false);
    if (answer.ok) opened();
    else setError(answer.sentence);
  }

  return (
    <form onSubmit={submit} className="grid gap-5" style={{ maxWidth: 420 }}>
      {error ? <Notice kind="error">{error}</Notice> : null}
      <Select label="Till" value={String(tillId)} onChange={(event) => choose(Number(event.target.value))} options={tills.map((till) => ({ value: String(till.id), label: till.name }))} />
      <MoneyField currency={currency} label="Float in the drawer" name="float" onChange={setFloat} />
      <div>
        <SubmitButton size="counter" pending={pending}>
          Open the till
        </SubmitButton>
      </div>
    </form>
  );
}
