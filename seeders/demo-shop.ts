import { inches, PER_EIGHTH_YARD, type Length } from "../lib/core/measure/length";

/** The demo shop: invented, in yards and dollars, with a tax rate of its own making. */
export const DEMO_SHOP = {
  id: 1,
  name: "Osier Falls Cloth Room",
  address: "14 Weir Street, Osier Falls",
  email: "shop@osierfalls.example",
  currency: "USD",
  locale: "en-US",
  timeZone: "America/New_York",
  system: "yards" as const,
  paper: "letter" as const,
  seamAllowance: inches(0.25),
  rulerStep: inches(0.125),
  sellingStep: PER_EIGHTH_YARD as Length,
  leastCut: (2 * PER_EIGHTH_YARD) as Length,
  straightening: inches(1),
  misCutBasisPoints: 200,
  endOfBolt: 0,
  saleableRemnant: inches(18),
  labourRate: 3000,
  taxBy: "line" as const,
  taxIncluded: false,
  cashStep: 1,
};

export const DEMO_TAX = [
  { name: "Sales tax", goods: "fabric" as const, rate: 65_000, validFrom: "2026-01-01", validTo: null },
  { name: "Sales tax", goods: "kit" as const, rate: 65_000, validFrom: "2026-01-01", validTo: null },
  { name: "Sales tax", goods: "notion" as const, rate: 65_000, validFrom: "2026-01-01", validTo: null },
];

export const DEMO_TILLS = ["Till 1", "Till 2"];

export const DEMO_SUPPLIERS = [
  { name: "Gannet & Row", email: "orders@gannetrow.example" },
  { name: "Lowfield Prints", email: "trade@lowfieldprints.example" },
  { name: "Ashby Tarn", email: "desk@ashbytarn.example" },
  { name: "Saltmarsh Dyehouse", email: "vats@saltmarshdye.example" },
  { name: "Plainsong Mills", email: "mill@plainsong.example" },
];

/** `gtin` numbers lie in the range that GS1 keeps for use inside a shop (prefix 04), check digits right. */
export const DEMO_NOTIONS = [
  { number: "N-101", gtin: "0400000001012", name: "Binding clips, tin of 20", price: 650, cost: 310, onHand: 60 },
  { number: "N-102", gtin: "0400000001029", name: "Cotton thread, natural, 500 m", price: 480, cost: 220, onHand: 80 },
  { number: "N-103", gtin: "0400000001036", name: "Hand needles, packet of 10", price: 320, cost: 140, onHand: 45 },
];
