"use client";

import { useState, type FormEvent } from "react";
import { postJson } from "@/app/post-json";
import { Button } from "@/components/ui/button";
import { Money } from "@/components/ui/figures";
import { LengthField } from "@/components/ui/length-field";
import { MoneyField } from "@/components/ui/money-field";
import { Notice } from "@/components/ui/notice";
import { SubmitButton } from "@/components/ui/submit-button";
import { Cell, Head, NoRows, RowHead, RuledTable } from "@/components/ui/table";
import { TextInput } from "@/components/ui/text-input";
import { displayLength, type MeasureSystem } from "@/lib/core/measure/format";
import type { Length } from "@/lib/core/measure/length";
import { lineTotal } from "@/lib/core/money/unit-price";
import type { Goods } from "@/lib/data/counter/find-goods";
import type { SaleView } from "@/lib/data/counter/record-sale";
import type { SaleLineInput } from "@/lib/input/counter";

interface BasketProps {
  readonly sessionId: number;
  readonly system: MeasureSystem;
  readonly currency: string;
  readonly closed: () => void;
}

interface Line {
  readonly input: SaleLineInput;
  readonly name: string;
  readonly amount: number;
}

/** Scan, measure, add; then take the cash. What is being measured stands apart until it is added. */
export function Basket({ sessionId, system, currency, closed }: BasketProps) {
  const [lines, setLines] = useState<readonly Line[]>([]);
  const [goods, setGoods] = useState<Extract<Goods, { item: "fabric" }> | null>(null);
  const [length, setLength] = useState<Length | null>(null);
  const [cash, setCash] = useState<number | null>(null);
  const [sale, setSale] = useState<SaleView | null>(null);
  const [requestId, setRequestId] = useState(() => crypto.randomUUID());
  const [error, setError] = useState<string | null>(null);
  const [pending, setPending] = useState(false);

  async function find(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const form = event.currentTarget;
    const text = String(new FormData(form).get("text") ?? "").trim();
    if (text === "") return;
    const found = await lookUp(text);
    setError(typeof found === "string" ? found : null);
    if (typeof found === "string") return;
    form.reset();
    setSale(null);
    if (found.item === "fabric") setGoods(found);
    else if (found.item === "kit") add({ input: { item: "kit", serial: found.serial }, name: found.name, amount: found.price });
    else add({ input: { item: "notion", number: found.number, count: 1 }, name: found.name, amount: found.price });
  }

  function add(line: Line) {
    setLines((before) => [...before, line]);
    setRequestId(crypto.randomUUID());
  }

  function addLength() {
    if (!goods || length === null) return setError("Write the length, in yards and eighths such as 2 3.");
    add({ input: { item: "fabric", tag: goods.tag, length }, name: `${goods.name}, ${displayLength(length, system)}`, amount: lineTotal(goods.price, length, system === "yards" ? "yard" : "metre", currency) });
    setGoods(null);
    setLength(null);
    setError(null);
  }

  async function pay(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    if (cash === null) return setError("Write what the customer gave, such as 50.00.");
    setPending(true);
    const answer = await postJson<SaleView>("/api/counter/sales", { requestId, tillSessionId: sessionId, lines: lines.map((line) => line.input), cash });
    setPending(false);
    if (!answer.ok) return setError(answer.sentence);
    setSale(answer.value);
    setLines([]);
    setError(null);
    setRequestId(crypto.randomUUID());
  }

  const goodsTotal = lines.reduce((sum, line) => sum + line.amount, 0);
  return (
    <div className="grid gap-6">
      {error ? (
        <Notice kind="error" size="counter">
          {error}
        </Notice>
      ) : null}
      {sale ? (
        <Notice kind="info" size="counter" title={`Receipt ${sale.receipt}.`}>
          <Money minor={sale.total} currency={currency} /> taken, tax <Money minor={sale.tax} currency={currency} />, change <Money minor={sale.change} currency={currency} />.{" "}
          <a href={`/api/print/${sale.printJobId}/pdf`} target="_blank" rel="noreferrer">
            Open the receipt
          </a>
        </Notice>
      ) : null}
      <form onSubmit={find} className="flex flex-wrap items-end gap-4">
        <TextInput label="Scan a bolt, a kit or a notion" name="text" size="counter" autoComplete="off" autoFocus maxLength={80} />
        <SubmitButton variant="plain" size="counter">
          Find it
        </SubmitButton>
      </form>
      {goods ? (
        <section className="grid gap-4" style={{ border: "var(--seam)", padding: 18 }}>
          <h2>
            {goods.name}, lot {goods.lot}
          </h2>
          <p>
            {displayLength(goods.left, system)} on the bolt, {displayLength(goods.toSell, system)} to sell on one piece.
          </p>
          <LengthField label="Length to cut" name="length" system={system} size="counter" onChange={setLength} autoFocus />
          <div className="acts">
            <Button onClick={() => setGoods(null)} size="counter">
              Put back
            </Button>
            <Button variant="fill" size="counter" onClick={addLength}>
              Add to basket
            </Button>
          </div>
        </section>
      ) : null}
      <RuledTable caption="In the basket">
        <thead>
          <tr>
            <Head>In the basket</Head>
            <Head figure>Amount</Head>
          </tr>
        </thead>
        <tbody>
          {lines.length === 0 ? <NoRows columns={2}>Nothing yet.</NoRows> : null}
          {lines.map((line, index) => (
            <tr key={index}>
              <RowHead>{line.name}</RowHead>
              <Cell figure label="Amount">
                <Money minor={line.amount} currency={currency} />
              </Cell>
            </tr>
          ))}
        </tbody>
      </RuledTable>
      {lines.length > 0 ? (
        <form onSubmit={pay} className="flex flex-wrap items-end gap-4">
          <p className="text-28 strong">
            Goods <Money minor={goodsTotal} currency={currency} />, tax is added
          </p>
          <MoneyField currency={currency} label="Cash given" name="cash" onChange={setCash} />
          <SubmitButton size="counter" pending={pending}>
            Take payment
          </SubmitButton>
          <Button size="counter" onClick={() => setLines([])}>
            Empty the basket
          </Button>
        </form>
      ) : null}
      <CloseTill sessionId={sessionId} currency={currency} closed={closed} />
    </div>
  );
}

function CloseTill({ sessionId, currency, closed }: Pick<BasketProps, "sessionId" | "currency" | "closed">) {
  const [counted, setCounted] = useState<number | null>(null);
  const [said, setSaid] = useState<string | null>(null);
  const [requestId] = useState(() => crypto.randomUUID());

  async function close(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    if (counted === null) return setSaid("Count the drawer and write the sum.");
    const answer = await postJson("/api/counter/tills/close", { requestId, sessionId, counted });
    if (answer.ok) closed();
    else setSaid(answer.sentence);
  }

  return (
    <details>
      <summary>Close the till</summary>
      <form onSubmit={close} className="flex flex-wrap items-end gap-4 mt-4">
        {said ? <Notice kind="error">{said}</Notice> : null}
        <MoneyField currency={currency} label="Counted in the drawer" name="counted" onChange={setCounted} />
        <SubmitButton variant="plain">Close on this count</SubmitButton>
      </form>
    </details>
  );
}

async function lookUp(text: string): Promise<Goods | string> {
  try {
    const response = await fetch(`/api/counter/find?text=${encodeURIComponent(text)}`);
    const answer = (await response.json()) as Goods & { fault?: { message: string } };
    return response.ok ? answer : (answer.fault?.message ?? "Nothing was found.");
  } catch {
    return "There is no connection to the shop’s server. Scan again when it is back.";
  }
}
