import type { Metadata } from "next";
import type { ReactNode } from "react";
import { DayRod } from "@/components/shell/day-rod";
import { PageHead } from "@/components/shell/page-head";
import { BackLink } from "@/components/ui/back-link";
import { Button } from "@/components/ui/button";
import { Checkbox, RadioRow } from "@/components/ui/choices";
import { clothFill } from "@/components/ui/cloth";
import { ClothPatterns } from "@/components/ui/cloth-patterns";
import { EmptyState } from "@/components/ui/empty-state";
import { Inches, Metres, Money, Yards } from "@/components/ui/figures";
import { Kbd } from "@/components/ui/kbd";
import { LinkButton } from "@/components/ui/link-button";
import { LoadingTape } from "@/components/ui/loading-tape";
import { Notice } from "@/components/ui/notice";
import { PatchLetter } from "@/components/ui/patch-letter";
import { StageDots } from "@/components/ui/selvage-dots";
import { Steps } from "@/components/ui/steps";
import { Swatch, SwatchChip, SwatchWord } from "@/components/ui/swatch";
import { Cell, Head, RowHead, RuledTable, SkeletonRows } from "@/components/ui/table";
import { LinkTabs } from "@/components/ui/tabs";
import { Select, TextArea, TextInput } from "@/components/ui/text-input";
import { centimetres, inches, yards } from "@/lib/core/measure/length";
import { BoltsSample, DialogSample, LengthSample, TabsSample, ToastSample } from "./samples";
import { requireActor } from "@/lib/server/auth/require-actor";
import { FABRICS } from "./sample-fabrics";

export const metadata: Metadata = { title: "Component sheet" };

const COLOURS = ["paper", "flax", "flax-2", "walnut", "walnut-2", "walnut-3", "rod", "brass", "indigo", "madder", "weld", "green"] as const;

/** Every component on one sheet, for those who draw pages: by eye, by key and by machine. */
export default async function ComponentSheet() {
  await requireActor("today.see");
  return (
    <>
      <ClothPatterns fabrics={FABRICS} />
      <PageHead
        back={<BackLink href="/staff">Today</BackLink>}
        title="Component sheet"
        sub="Dashed can be unpicked, solid cannot be uncut. Yellow is the tape: measured cloth, and the mark you are at. Madder is flaw, short, refuse."
        actions={
          <>
            <Button>Print the sheet</Button>
            <Button variant="fill">Reserve fabric</Button>
          </>
        }
      />
      <Section title="Buttons" words="38 px at desks, 56 at the counter, 78 on the wall. One filled button a view.">
        <div className="acts">
          <LinkButton href="#main">A link that acts</LinkButton>
          <Button variant="draft">Keep the draft</Button>
          <Button variant="refuse">Flaw here</Button>
          <Button variant="text">Undo the seam</Button>
          <Button disabled aria-describedby="why">
            Send order
          </Button>
          <span id="why" className="small">
            waits for the owner
          </span>
          <Button pending pendingLabel="Reserving">
            Reserve
          </Button>
          <Button size="sm">Small</Button>
        </div>
        <div className="acts mt-5">
          <Button size="counter" keys="Alt S">
            Set aside
          </Button>
          <Button size="wall">Bolt too short</Button>
          <span className="on-rod inline-flex bg-rod p-5">
            <Button keys="Alt T">Take payment</Button>
          </span>
        </div>
      </Section>
      <Section title="Figures" words="Mixed numbers as people write them; words for those who listen.">
        <p className="text-18 flex flex-wrap gap-x-8 gap-y-2">
          <Yards value={yards(1306.5)} /> <Yards value={yards(0.875)} /> <Yards value={inches(87)} /> <Inches value={inches(3.8125)} /> <Metres value={centimetres(240)} />{" "}
          <Metres value={centimetres(85)} /> <Money minor={128440} currency="USD" /> <Money minor={-1250} currency="USD" bare />
        </p>
      </Section>
      <Section title="Length field" words="Whole yards, a space, eighths; or a written fraction. Up and Down step. A point asks.">
        <LengthSample />
      </Section>
      <Section title="Fields" words="Labels above. An error says what was found and what was wanted, and stays.">
        <div className="grid gap-6 sm:grid-cols-2 desk:grid-cols-4">
          <TextInput label="Shelf" name="shelf" defaultValue="W2 · 14" hint="Wall, then place." />
          <Select label="Mill" name="mill" options={[{ value: "gr", label: "Gannet & Row" }]} />
          <TextInput label="Price a yard" name="price" defaultValue="1.240" error="Dollars and two figures of cents: 12.40 or 1.24?" />
          <TextArea label="Note" name="note" optional />
          <Checkbox label="One-way print" name="oneWay" defaultChecked />
          <RadioRow legend="Setting" name="setting" defaultValue="straight" options={[{ value: "straight", label: "Straight" }, { value: "point", label: "On point" }]} />
        </div>
      </Section>
      <BoltsSample />
      <Section title="Plain table" words="For pages made on the server; and its rows while they are fetched.">
        <RuledTable caption="Takings" stack>
          <thead>
            <tr>
              <Head>What</Head>
              <Head figure>Length</Head>
              <Head figure>$</Head>
            </tr>
          </thead>
          <tbody>
            <tr className="limiting">
              <RowHead>Larder Stripe on unbleached ticking, extra wide, second printing for Osier Falls</RowHead>
              <Cell figure label="length">
                <Yards value={yards(0.75)} bare />
              </Cell>
              <Cell figure label="$">
                <Money minor={640} currency="USD" bare />
              </Cell>
            </tr>
            <SkeletonRows rows={2} columns={3} />
          </tbody>
        </RuledTable>
      </Section>
      <Section title="Marks" words="True stages with their word. Swatches are pinked; nothing chosen is dashed.">
        <div className="flex flex-wrap gap-x-10 gap-y-4 items-center">
          {(["draft", "planned", "reserved", "cutting", "cut", "packed"] as const).map((stage) => (
            <StageDots key={stage} stage={stage} />
          ))}
        </div>
        <div className="flex flex-wrap gap-x-8 gap-y-4 items-start mt-5">
          {FABRICS.slice(0, 5).map((fabric) => (
            <SwatchChip key={fabric.id} fabric={fabric}>
              {fabric.name}
            </SwatchChip>
          ))}
          <SwatchChip fabric={null}>no fabric yet</SwatchChip>
          <SwatchWord fabric={{ tile: "", colour: "#7397AC" }}>blues</SwatchWord>
          <Swatch fabric={{ tile: "/fabrics/kiln.svg", colour: "#B4602F" }} label="Kiln" />
          <PatchLetter letter="A" />
          <PatchLetter letter="Er" />
          <svg width="96" height="96" viewBox="0 0 96 96" role="img" aria-label="Two triangles of Midnight Ferry and Flour Sack">
            <path d="M0 0H96L0 96Z" fill={clothFill("ferry")} stroke="var(--walnut)" />
            <path d="M96 0V96H0Z" fill={clothFill("flour")} stroke="var(--walnut)" />
          </svg>
        </div>
      </Section>
      <Section title="Notices" words="What happened, what was found and wanted, what is kept and what waits.">
        <div className="grid gap-4 desk:grid-cols-2">
          <Notice kind="error" title="That tag is not on this run.">
            Found Moss Stitch, lot 3321. Wanted Madder Bell, lot 6127, shelf W2 · 19.
          </Notice>
          <Notice kind="offline" title="No connection since 11.20.">
            4 cuts are kept on this table and go in when it is back.
          </Notice>
          <Notice kind="warn" title="Marisela changed this bolt at 11.31.">
            Her figure is <Yards value={yards(8.5)} />, yours <Yards value={yards(8.375)} />.
          </Notice>
          <Notice kind="info">The shop shows the longest piece only.</Notice>
        </div>
        <div className="acts mt-5">
          <ToastSample />
          <DialogSample />
        </div>
      </Section>
      <Section title="Nothing, and long work" words="An empty place gives the first move. Long work is a tape being drawn.">
        <div className="grid gap-8 desk:grid-cols-2">
          <EmptyState level={3} title="No remnants in the drawer" action={<Button>Put in a remnant</Button>}>
            Pieces under a yard that come off a bolt go here, a third off.
          </EmptyState>
          <LoadingTape title="Working out 12 cut maps for the spring kits" label="Working out cut maps" done={8} of={12} stop={<Button>Stop</Button>}>
            8 of 12 done, now Lantern Yard. You can leave this page.
          </LoadingTape>
        </div>
      </Section>
      <Section title="Ways about" words="Tabs with addresses, tabs on one sheet, steps.">
        <LinkTabs label="Kit" tabs={[{ href: "#quilt", label: "Quilt", current: true }, { href: "#fabrics", label: "Fabrics", current: false }]} />
        <TabsSample />
        <div className="mt-5">
          <Steps label="Booking in" steps={["Order", "Bolts", "Lots", "Shelves"]} at={2} />
        </div>
      </Section>
      <Section title="Keys" words="Shown on what they do. No lone letter lays or cuts anything.">
        <p className="flex flex-wrap gap-x-6 gap-y-3">
          <span>
            <Kbd keys="/" /> find or scan
          </span>
          <span>
            <Kbd keys="Alt+S" /> set aside
          </span>
          <span>
            <Kbd keys="Esc" /> the safe way out
          </span>
        </p>
      </Section>
      <section aria-label="Day rod" className="border-t-[1.5px] border-walnut">
        <DayRod
          hours={{ from: 510, to: 1080 }}
          now={708}
          lies={[
            { id: "a", from: 555, to: 640, title: "Mail orders, 9 lengths", who: "Tobias, table 1, all cut", href: "#a" },
            { id: "b", from: 600, to: 840, title: "Class: First quilt, six seats", who: "Pru, long table" },
            { id: "c", from: 675, to: 765, title: "Weir Pool × 3", who: "Tobias, 7 of 18 cut", waits: true },
          ]}
          tasks={[
            { id: "t1", at: 630, when: "10.30, still open", title: "Settle Osier Leaf", words: <>The tape says <Yards value={yards(4.25)} />, the book says <Yards value={yards(4.375)} />.</>, act: <Button>Settle by the tape</Button> },
            { id: "t2", at: 720, when: "by noon", title: "Send P-0386 to Gannet & Row", words: "Midnight Ferry, Osier Leaf, Bramble Walk: $173.60.", act: <Button>Open the order</Button> },
            { id: "t3", at: 840, when: "by 2", title: "Answer June Marchbank", words: "Asks for Weir Pool at 54 × 66 in." },
            { id: "t4", at: 870, when: "2.30", title: "Price a colourway", words: "Weir Pool in Bramble Walk: cost is up $2.10 a kit." },
            { id: "t5", at: 1050, when: "5.30", title: "Close till 1", words: "with Wen, counted blind" },
          ]}
        />
      </section>
      <Section title="Colour and type" words="Dye-pot names. Besley names things, Commissioner does all else.">
        <ul className="flex flex-wrap gap-4">
          {COLOURS.map((colour) => (
            <li key={colour} className="w-[96px]">
              <span className="block h-[44px] border border-walnut" style={{ background: `var(--${colour})` }} />
              {colour}
            </li>
          ))}
        </ul>
        <p className="font-word text-48 mt-5">Weir Pool</p>
        <p className="q text-64 font-semibold" aria-hidden="true">
          12 7⁄8
        </p>
      </Section>
    </>
  );
}

function Section({ title, words, children }: { title: string; words: string; children: ReactNode }) {
  return (
    <section className="page-section grid gap-x-10 gap-y-4 desk:grid-cols-[212px_minmax(0,1fr)]">
      <div>
        <h2>{title}</h2>
        <p className="small mt-1">{words}</p>
      </div>
      <div className="min-w-0">{children}</div>
    </section>
  );
}
