import { describe, expect, it } from "vitest";
import { bagTagsPdf } from "@/labels/bag-tag";
import { boltTagsPdf } from "@/labels/bolt-tag";
import { cutTagsPdf } from "@/labels/cut-tag";
import { kitLabelsPdf } from "@/labels/kit-label";
import { receiptPdf } from "@/labels/receipt";
import { shelfLabelsPdf } from "@/labels/shelf-label";
import { BAG_TAGS, BOLT_TAGS, CUT_TAGS, LONG_RECEIPT, RECEIPT, SHELF_LABELS } from "@/tests/fixtures/labels/shop-papers";
import { FOREIGN_LABEL, LONG_LABEL, WEIR_POOL_LABEL } from "@/tests/fixtures/labels/weir-pool-label";
import { coloursOf, rasterise, readPdf, scan, textOffThePage, type Raster } from "./read-pdf";

const PRINTER = 203;

/** Lengths of black and white along one row, without the white at its ends. */
function stripes(raster: Raster, y: number): number[] {
  const row = raster.black.subarray(y * raster.width, (y + 1) * raster.width);
  const lengths: number[] = [];
  let from = row.indexOf(1);
  for (let x = from; x <= row.lastIndexOf(1); x += 1) {
    if (row[x + 1] === row[x]) continue;
    lengths.push(x + 1 - from);
    from = x + 1;
  }
  return lengths;
}

describe("kit labels", () => {
  const kinds = [WEIR_POOL_LABEL, LONG_LABEL, FOREIGN_LABEL];

  it("scan as their serial and their link, whatever else is on them", async () => {
    const rasters = rasterise(await kitLabelsPdf(kinds), PRINTER);
    expect(rasters).toHaveLength(3);
    for (const [index, label] of kinds.entries()) {
      expect(rasters[index]).toMatchObject({ width: 812, height: 1218 });
      expect(await scan(rasters[index] as Raster)).toEqual([`Code128 ${label.serial}`, `QRCode ${label.link}`]);
    }
  });

  it("say what a kit's label must say", async () => {
    const { pages, title, printScaling } = await readPdf(await kitLabelsPdf([WEIR_POOL_LABEL]));
    expect(title).toBe("Kit label K20410387X");
    expect(printScaling).toBe("None");
    const text = pages[0]?.text ?? "";
    for (const said of ["Osier Falls Cloth Room", "Weir Pool", "Ferry Crossing", "66 \u00d7 80 in", "Midnight Ferry", "lot 7731", "100 % cotton.", "Portugal", "Not a toy: small parts.", "$94.00", "K20410387X"]) {
      expect(text.replace(/\s+/g, " ")).toContain(said);
    }
    expect(text).toMatch(/1 ?1\u20444/);
  });

  it("leave the caution and the price out where they are not set", async () => {
    const { pages } = await readPdf(await kitLabelsPdf([{ ...WEIR_POOL_LABEL, smallParts: false, price: null }]));
    expect(pages[0]?.text).not.toContain("Not a toy");
    expect(pages[0]?.text).not.toContain("$");
  });

  it("keep all text on the page and never cut the serial", async () => {
    const { pages } = await readPdf(await kitLabelsPdf(kinds));
    expect(textOffThePage(pages)).toEqual([]);
    expect(pages[1]?.text).toContain(LONG_LABEL.serial);
    expect(pages[1]?.text).toContain(LONG_LABEL.price);
  });

  it("print letters the face lacks in its understudy, and what no face has as a question mark", async () => {
    const { pages } = await readPdf(await kitLabelsPdf([FOREIGN_LABEL]));
    expect(pages[0]?.text).toContain("??? Sakura ??");
    expect(pages[0]?.text).toContain("\u0421\u0438\u043d\u0438\u0439");
    expect(pages[0]?.text).toContain("\u0141\u00f3d\u017a");
    expect(pages[0]?.text).not.toContain("\u0000");
  });

  it("set bars and QR modules on whole dots", async () => {
    const [raster] = rasterise(await kitLabelsPdf([WEIR_POOL_LABEL]), PRINTER);
    // A row through the bars and the QR code: each stripe is a whole number of its modules.
    const row = stripes(raster as Raster, 1100);
    const gap = row.findIndex((stripe) => stripe > 60);
    expect(gap).toBeGreaterThan(40);
    for (const stripe of row.slice(0, gap)) expect(stripe % 3).toBe(0);
    for (const stripe of row.slice(gap + 1)) expect(stripe % 5).toBe(0);
  });

  it("hold no grey: a thermal printer has none", async () => {
    expect(await coloursOf(await kitLabelsPdf(kinds))).toEqual(["#000000"]);
  });
});

describe("small tags", () => {
  const sheaves = [
    { name: "bolt tags", pdf: () => boltTagsPdf(BOLT_TAGS), codes: BOLT_TAGS.map((tag) => tag.code), says: ["Midnight Ferry", "lot 7731, 42\u00a0in wide", "B 4"] },
    { name: "bag tags", pdf: () => bagTagsPdf(BAG_TAGS), codes: BAG_TAGS.map((tag) => tag.serial), says: ["Weir Pool", "bag 3", "of 12", "Run 12"] },
    { name: "cut tags", pdf: () => cutTagsPdf(CUT_TAGS), codes: CUT_TAGS.map((tag) => tag.code), says: ["Midnight Ferry", "lot 7731", "bag 3, run 12"] },
    { name: "shelf labels", pdf: () => shelfLabelsPdf(SHELF_LABELS), codes: SHELF_LABELS.map((label) => label.code), says: ["B 4", "Blues, prints and"] },
  ];

  it.each(sheaves)("$name scan as their code and keep their text on the page", async ({ pdf, codes, says }) => {
    const bytes = await pdf();
    const rasters = rasterise(bytes, PRINTER);
    for (const [index, code] of codes.entries()) expect(await scan(rasters[index] as Raster)).toEqual([`Code128 ${code}`]);
    const { pages, printScaling } = await readPdf(bytes);
    expect(pages[0]).toMatchObject({ width: 162, height: 90 });
    expect(printScaling).toBe("None");
    expect(textOffThePage(pages)).toEqual([]);
    for (const said of says) expect(pages[0]?.text.replace(/\s+/g, " ")).toContain(said.replace(/\s+/g, " "));
    for (const [index, code] of codes.entries()) expect(pages[index]?.text).toContain(code);
  });

  it("turn to a QR code where a code is too long for bars", async () => {
    const code = "https://osierfalls.example/b/B004217K?from=the-table";
    const [tag] = BOLT_TAGS;
    if (!tag) throw new Error("The fixture has no tag");
    const [raster] = rasterise(await boltTagsPdf([{ ...tag, code }]), PRINTER);
    expect(await scan(raster as Raster)).toEqual([`QRCode ${code}`]);
  });

  it("write a length between eighths in yards and inches", async () => {
    const { pages } = await readPdf(await cutTagsPdf(CUT_TAGS));
    expect(pages[1]?.text.replace(/\s+/g, " ")).toMatch(/2 yd 28 1\u20444 in/);
  });
});

describe("receipts", () => {
  it("say lengths, tax, tenders, change and the rule about cut goods, and scan as their number", async () => {
    const bytes = await receiptPdf(RECEIPT);
    const { pages, title } = await readPdf(bytes);
    expect(title).toBe("Receipt R00104217M");
    expect(pages).toHaveLength(1);
    const text = (pages[0]?.text ?? "").replace(/\s+/g, " ");
    for (const said of ["$12.80 a yard, lot 7731", "Sales tax 6.25 %", "$130.90", "Gift card ending 0412", "Change", "$20.00", "Cut goods are not returned unless flawed.", "Tax is worked out on the whole sale."]) {
      expect(text).toContain(said);
    }
    const [raster] = rasterise(bytes, PRINTER);
    expect(await scan(raster as Raster)).toEqual(["Code128 R00104217M"]);
  });

  it("grow with their lines, on one page, with all text on it", async () => {
    const [short, long] = [await readPdf(await receiptPdf(RECEIPT)), await readPdf(await receiptPdf(LONG_RECEIPT))];
    expect(long.pages).toHaveLength(1);
    expect(long.pages[0]?.height).toBeGreaterThan((short.pages[0]?.height ?? 0) * 3);
    expect(textOffThePage([...short.pages, ...long.pages])).toEqual([]);
  });
});
