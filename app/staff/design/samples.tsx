"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import type { DataColumn, DataRow } from "@/components/ui/data-rows";
import { DataTable } from "@/components/ui/data-table";
import { Dialog } from "@/components/ui/dialog";
import { EmptyState } from "@/components/ui/empty-state";
import { Money, Yards } from "@/components/ui/figures";
import { InchField } from "@/components/ui/inch-field";
import { LengthField } from "@/components/ui/length-field";
import { MoneyField } from "@/components/ui/money-field";
import { Quantity } from "@/components/ui/quantity";
import { SentenceFilter } from "@/components/ui/sentence-filter";
import { Swatch } from "@/components/ui/swatch";
import { Tabs } from "@/components/ui/tabs";
import { useToast } from "@/components/ui/toast";
import { centimetres, inches, yards, type Length } from "@/lib/core/measure/length";
import { FABRICS } from "./sample-fabrics";

const CENTS_A_YARD = 1240;

export function LengthSample() {
  const [cut, setCut] = useState<Length | null>(yards(2.375));
  return (
    <div className="grid gap-8 desk:grid-cols-2">
      <LengthField label="Length to cut" value={cut} onChange={setCut} most={yards(9.375)} priceOf={(value) => <Money minor={Math.round((value / yards(1)) * CENTS_A_YARD)} currency="USD" />} />
      <LengthField label="Length to cut, metric" system="metres" defaultValue={centimetres(240)} />
      <div className="desk:col-span-2">
        <LengthField label="At the counter" size="counter" defaultValue={yards(0.375)} />
      </div>
      <div className="flex flex-wrap gap-8">
        <InchField label="Cut size" defaultValue={inches(3.875)} hint="Down to 1/32." />
        <InchField label="Cut size, metric" system="metres" defaultValue={centimetres(9.8)} />
        <MoneyField label="Price" currency="USD" defaultValue={1240} per="a yard" />
        <Quantity label="Kits" noun="kit" defaultValue={3} most={12} />
      </div>
    </div>
  );
}

const COLUMNS: readonly DataColumn[] = [
  { id: "swatch", head: <span className="sr">Swatch</span>, width: 56 },
  { id: "fabric", head: "Fabric", names: true, sorts: true },
  { id: "lot", head: "Lot", label: "lot" },
  { id: "sell", head: "To sell, yd", figure: true, label: "to sell", sorts: true },
  { id: "price", head: "$ a yard", figure: true, label: "$" },
  { id: "note", head: "Note" },
];

const LENGTHS = [yards(6.5), yards(3.375), yards(0.75), yards(10), yards(2)];

const ROWS: readonly DataRow[] = FABRICS.map((fabric, index) => {
  const toSell = LENGTHS[index] ?? yards(1);
  const isLow = index === 2;
  return {
    id: fabric.id,
    name: fabric.name,
    href: `#${fabric.id}`,
    limiting: isLow,
    chosen: index === 1,
    order: { sell: toSell },
    totals: [{ label: "to sell", length: toSell }],
    cells: {
      swatch: <Swatch fabric={fabric} />,
      fabric: fabric.name,
      lot: String(7731 + index),
      sell: isLow ? <span className="short"><Yards value={toSell} bare /></span> : <Yards value={toSell} bare />,
      price: "12.40",
      note: isLow ? <span className="short">limits the run to 3 kits</span> : "",
    },
  };
});

export function BoltsSample() {
  return (
    <section aria-label="Table sample">
      <SentenceFilter
        action="/staff/design"
        parts={[
          "Show",
          { name: "which", label: "Which bolts", value: "all", options: [{ value: "all", label: "all bolts" }, { value: "low", label: "bolts below the mark" }] },
          "on",
          { name: "shelf", label: "Shelf", value: "", options: [{ value: "", label: "any shelf" }, { value: "W1", label: "W1 front wall" }] },
          "called",
          { name: "name", label: "Name", blank: true, value: "", placeholder: "anything" },
        ]}
      />
      <DataTable
        caption="Bolts"
        columns={COLUMNS}
        rows={ROWS}
        empty={<EmptyState title="No bolts below the mark" />}
        picks={{ noun: "bolt", nouns: "bolts", acts: <Button>Count them</Button> }}
        paging={{ said: "5 of 163", before: null, after: "#after" }}
      />
    </section>
  );
}

export function ToastSample() {
  const tell = useToast();
  return (
    <Button onClick={() => tell({ said: "6 yd of Midnight Ferry reserved for Weir Pool.", undo: { label: "Give it back", act: () => tell({ said: "Given back." }) } })}>Say what happened</Button>
  );
}

export function DialogSample() {
  const [open, setOpen] = useState(false);
  const close = () => setOpen(false);
  return (
    <>
      <Button onClick={() => setOpen(true)}>Break down a kit</Button>
      <Dialog open={open} title="Break down kit 0384?" safeLabel="Leave it packed" onSafe={close} actLabel="Break it down" actVariant="refuse" onAct={close}>
        <p>Six lengths go to the remnant drawer at a third off and the label is void. The kit cannot be put together again.</p>
      </Dialog>
    </>
  );
}

export function TabsSample() {
  const [chosen, setChosen] = useState("cut");
  return (
    <Tabs
      label="Bench"
      chosen={chosen}
      onChoose={setChosen}
      tabs={[
        { id: "cut", label: "Cut map", panel: <p className="p-4">The strips of one fabric.</p> },
        { id: "sew", label: "Sewing order", panel: <p className="p-4">Units, then rows.</p> },
      ]}
    />
  );
}
