"use client";

import { useRef, useState, type FormEvent } from "react";
import { ClothLength } from "@/components/ui/figures";
import { Notice } from "@/components/ui/notice";
import { SubmitButton } from "@/components/ui/submit-button";
import { Button } from "@/components/ui/button";
import { Cell, Head, RowHead, RuledTable } from "@/components/ui/table";
import { TextInput } from "@/components/ui/text-input";
import type { MeasureSystem } from "@/lib/core/measure/format";
import type { Length } from "@/lib/core/measure/length";
import type { PackingView } from "@/lib/data/runs/pack-kit";
import { postJson, type Posted } from "@/app/post-json";
import { useReady } from "@/app/use-ready";

/** One field takes every scan: a bag's serial opens the bag, anything else goes into it. */
export function PackingBench({ system }: { readonly system: MeasureSystem }) {
  const [kit, setKit] = useState<PackingView | null>(null);
  const [error, setError] = useState<string | null>(null);
  const [pending, setPending] = useState(false);
  const ready = useReady();
  const field = useRef<HTMLInputElement>(null);

  function take(answer: Posted<PackingView>) {
    setPending(false);
    if (answer.ok) {
      setKit(answer.value);
      setError(null);
    } else setError(answer.sentence);
  }

  async function scan(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const form = event.currentTarget;
    const text = String(new FormData(form).get("scan") ?? "").trim();
    if (text === "") return;
    setPending(true);
    const opensBag = kit === null || /^k/i.test(text);
    take(opensBag ? await getKit(text) : await postJson<PackingView>(`/api/kits/${kit.serial}/packing`, { requestId: crypto.randomUUID(), scan: text }));
    form.reset();
    field.current?.focus();
  }

  async function finish() {
    if (!kit) return;
    setPending(true);
    take(await postJson<PackingView>(`/api/kits/${kit.serial}/finish`, { requestId: crypto.randomUUID(), shelf: "" }));
  }

  const missing = kit ? kit.lengths.filter((each) => !each.packed).length + kit.notions.reduce((sum, each) => sum + each.wanted - each.count, 0) : 0;
  return (
    <div className="page-section grid gap-5">
      <form onSubmit={scan} className="flex flex-wrap items-end gap-4">
        <TextInput ref={field} label={kit ? `Scan into bag ${kit.number}, ${kit.serial}` : "Scan the tag on the bag"} name="scan" readOnly={!ready} autoComplete="off" autoFocus maxLength={80} />
        <SubmitButton variant="plain" pending={pending}>
          Take the scan
        </SubmitButton>
      </form>
      {error ? <Notice kind="error">{error}</Notice> : null}
      {kit ? (
        <>
          <h2>
            {kit.kit}, {kit.colourway}, bag {kit.number} of run {kit.run}
          </h2>
          <RuledTable caption="What goes into the bag">
            <thead>
              <tr>
                <Head>What</Head>
                <Head figure>Length or count</Head>
                <Head>Cut tag or number</Head>
                <Head>In the bag</Head>
              </tr>
            </thead>
            <tbody>
              {kit.lengths.map((each) => (
                <tr key={`length-${each.id}`}>
                  <RowHead>{each.fabric}</RowHead>
                  <Cell figure label="Length">
                    <ClothLength value={each.length as Length} system={system} />
                  </Cell>
                  <Cell label="Cut tag">{each.cutTag ?? "not cut yet"}</Cell>
                  <Cell label="In the bag">{each.packed ? "in" : "missing"}</Cell>
                </tr>
              ))}
              {kit.notions.map((each) => (
                <tr key={`notion-${each.id}`}>
                  <RowHead>{each.name}</RowHead>
                  <Cell figure label="Count">
                    {each.count} of {each.wanted}
                  </Cell>
                  <Cell label="Number">{each.number}</Cell>
                  <Cell label="In the bag">{each.count >= each.wanted ? "in" : "missing"}</Cell>
                </tr>
              ))}
            </tbody>
          </RuledTable>
          {kit.state === "packed" ? (
            <Notice kind="info">Kit {kit.serial} is packed. Its label waits on the print queue.</Notice>
          ) : (
            <div className="acts">
              <Button variant="fill" onClick={() => void finish()} pending={pending}>
                Close the bag
              </Button>
              <span className="second">{missing === 0 ? "Everything is in." : `${missing} still missing.`}</span>
            </div>
          )}
        </>
      ) : null}
    </div>
  );
}

async function getKit(serial: string): Promise<Posted<PackingView>> {
  try {
    const response = await fetch(`/api/kits/${encodeURIComponent(serial)}/packing`);
    const answer = (await response.json()) as PackingView & { fault?: { message: string } };
    return response.ok ? { ok: true, value: answer } : { ok: false, sentence: answer.fault?.message ?? "No bag was found." };
  } catch {
    return { ok: false, sentence: "There is no connection to the shop’s server. Scan again when it is back." };
  }
}
