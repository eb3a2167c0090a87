/** Fabrics drawn as tiles in public/fabrics, all invented. Prices in 1/10 000 dollar a yard. */
export interface DemoFabric {
  readonly slug: string;
  readonly name: string;
  readonly description: string;
  readonly reference: string;
  readonly supplier: string;
  readonly colour: string;
  readonly value: "light" | "medium" | "dark";
  readonly usableInches: number;
  readonly oneWay?: boolean;
  readonly price: number;
  readonly cost: number;
  /** Yards below which it is time to order. */
  readonly lowYards: number;
  readonly inPrint?: boolean;
}

export const DEMO_FABRICS: readonly DemoFabric[] = [
  { slug: "ferry", name: "Midnight Ferry", description: "dot, indigo", reference: "GR 1104", supplier: "Gannet & Row", colour: "#23365F", value: "dark", usableInches: 42, price: 124_000, cost: 56_000, lowYards: 3 },
  { slug: "osier", name: "Osier Leaf", description: "leaf print, green", reference: "GR 1117", supplier: "Gannet & Row", colour: "#7F9B78", value: "medium", usableInches: 42, price: 124_000, cost: 56_000, lowYards: 4 },
  { slug: "flour", name: "Flour Sack", description: "low volume", reference: "LF 02-1", supplier: "Lowfield Prints", colour: "#F1EFE7", value: "light", usableInches: 42, price: 118_000, cost: 51_000, lowYards: 6 },
  { slug: "madder", name: "Madder Bell", description: "bell flower, red", reference: "GR 1121", supplier: "Gannet & Row", colour: "#A8392F", value: "dark", usableInches: 42, oneWay: true, price: 124_000, cost: 56_000, lowYards: 3 },
  { slug: "slack", name: "Slack Water", description: "wave stripe, pale blue", reference: "LF 88-3", supplier: "Lowfield Prints", colour: "#C2D5DB", value: "light", usableInches: 42, price: 118_000, cost: 52_000, lowYards: 3 },
  { slug: "toll", name: "Turnpike Plaid", description: "yarn-dyed plaid", reference: "Yarn-dyed 93", supplier: "Ashby Tarn", colour: "#D9C27A", value: "medium", usableInches: 42, price: 146_000, cost: 69_000, lowYards: 3 },
  { slug: "wet", name: "Wet Slate", description: "hand-dyed, blue grey", reference: "Vat 12", supplier: "Saltmarsh Dyehouse", colour: "#5C7686", value: "medium", usableInches: 43, price: 138_000, cost: 64_000, lowYards: 3 },
  { slug: "weld", name: "Plain Weld", description: "solid, yellow", reference: "Solid 06", supplier: "Plainsong Mills", colour: "#E3B43B", value: "medium", usableInches: 42, price: 96_000, cost: 42_000, lowYards: 4 },
  { slug: "bramble", name: "Bramble Walk", description: "floral on plum", reference: "GR 1140", supplier: "Gannet & Row", colour: "#3C2440", value: "dark", usableInches: 42, oneWay: true, price: 124_000, cost: 56_000, lowYards: 0, inPrint: false },
  { slug: "kiln", name: "Kiln", description: "hand-dyed, rust", reference: "Vat 31", supplier: "Saltmarsh Dyehouse", colour: "#B05A2E", value: "medium", usableInches: 43, price: 138_000, cost: 64_000, lowYards: 3 },
  { slug: "goose", name: "Gooseberry Check", description: "woven check", reference: "Yarn-dyed 41", supplier: "Ashby Tarn", colour: "#9DB56B", value: "medium", usableInches: 42, price: 132_000, cost: 61_000, lowYards: 3 },
  { slug: "salt", name: "Salt Pan", description: "low volume, crosses", reference: "LF 07-2", supplier: "Lowfield Prints", colour: "#ECEBE3", value: "light", usableInches: 42, price: 118_000, cost: 51_000, lowYards: 5 },
  { slug: "heron", name: "Heron", description: "solid, grey blue", reference: "Solid 22", supplier: "Plainsong Mills", colour: "#7397AC", value: "medium", usableInches: 42, price: 96_000, cost: 42_000, lowYards: 4 },
  { slug: "larder", name: "Larder Stripe", description: "ticking, red", reference: "Yarn-dyed 17", supplier: "Ashby Tarn", colour: "#E9DCCB", value: "light", usableInches: 42, oneWay: true, price: 128_000, cost: 59_000, lowYards: 3 },
  { slug: "peat", name: "Peat", description: "solid, brown", reference: "Solid 31", supplier: "Plainsong Mills", colour: "#4B382B", value: "dark", usableInches: 42, price: 96_000, cost: 42_000, lowYards: 4 },
  { slug: "hedge", name: "Hedge Party", description: "floral on cream", reference: "GR 1152", supplier: "Gannet & Row", colour: "#EFE6D2", value: "light", usableInches: 42, price: 132_000, cost: 60_000, lowYards: 3 },
  { slug: "moss", name: "Moss Stitch", description: "tonal dot, green", reference: "GR 1160", supplier: "Gannet & Row", colour: "#3F5F4C", value: "dark", usableInches: 42, price: 124_000, cost: 56_000, lowYards: 3 },
  { slug: "curd", name: "Lemon Curd", description: "tonal dot, yellow", reference: "GR 1163", supplier: "Gannet & Row", colour: "#EFCF6B", value: "light", usableInches: 42, price: 124_000, cost: 56_000, lowYards: 3 },
  { slug: "brick", name: "Brickyard Gingham", description: "woven check, red", reference: "Yarn-dyed 08", supplier: "Ashby Tarn", colour: "#C46A57", value: "medium", usableInches: 42, price: 132_000, cost: 61_000, lowYards: 3 },
];

/** Bolts as they came in. Lengths in yards; flaws in yards from the first free end. */
export interface DemoBolt {
  readonly fabric: string;
  readonly lot: string;
  readonly shelf: string;
  readonly yards: number;
  readonly flaws?: readonly { readonly from: number; readonly to: number; readonly note: string }[];
}

export const DEMO_BOLTS: readonly DemoBolt[] = [
  { fabric: "slack", lot: "2208", shelf: "W1 · 03", yards: 15 },
  { fabric: "heron", lot: "A2", shelf: "W1 · 11", yards: 12 },
  { fabric: "curd", lot: "1163", shelf: "W1 · 17", yards: 8 },
  { fabric: "peat", lot: "P7", shelf: "W1 · 21", yards: 12 },
  { fabric: "weld", lot: "A4", shelf: "W1 · 30", yards: 8 },
  { fabric: "osier", lot: "3340", shelf: "W2 · 02", yards: 8 },
  { fabric: "ferry", lot: "7731", shelf: "W2 · 14", yards: 15, flaws: [{ from: 13.25, to: 13.5, note: "thick thread, mill's string" }] },
  { fabric: "ferry", lot: "7802", shelf: "W2 · 15", yards: 8 },
  { fabric: "madder", lot: "6127", shelf: "W2 · 19", yards: 10 },
  { fabric: "hedge", lot: "0412", shelf: "W2 · 24", yards: 10 },
  { fabric: "bramble", lot: "7102", shelf: "W2 · 27", yards: 8, flaws: [{ from: 1, to: 1.125, note: "print slipped, mill's string" }] },
  { fabric: "larder", lot: "0017", shelf: "W3 · 02", yards: 12 },
  { fabric: "toll", lot: "0093", shelf: "W3 · 08", yards: 12 },
  { fabric: "goose", lot: "0041", shelf: "W3 · 12", yards: 8 },
  { fabric: "brick", lot: "0008", shelf: "W3 · 14", yards: 10 },
  { fabric: "salt", lot: "0702", shelf: "W4 · 06", yards: 12 },
  { fabric: "flour", lot: "5516", shelf: "W4 · 22", yards: 15 },
  { fabric: "flour", lot: "5540", shelf: "W4 · 23", yards: 15 },
  { fabric: "moss", lot: "1160", shelf: "W5 · 02", yards: 10 },
  { fabric: "wet", lot: "12-C", shelf: "W5 · 11", yards: 12 },
  { fabric: "kiln", lot: "31-A", shelf: "W5 · 16", yards: 8 },
];
