import { describe, expect, it } from "vitest";
import { inches, length } from "@/lib/core/measure/length";
import { cutListPdf } from "@/labels/cut-list-sheet";
import { instructionSheetPdf } from "@/labels/instruction-sheet";
import { groupStrips, numberWords } from "@/labels/sheet/strip-groups";
import { CUT_LIST, LONG_CUT_LIST } from "@/tests/fixtures/labels/shop-papers";
import { everyMethodSheet } from "@/tests/fixtures/labels/every-method-sheet";
import { LONG_SHEET, WEIR_POOL_SHEET } from "@/tests/fixtures/labels/weir-pool-sheet";
import { rasterise, readPdf, textOffThePage, type Raster } from "./read-pdf";

/** Longest run of black on any row from `top` to `foot`, left of `right`. */
function longestLine(raster: Raster, top: number, foot: number, right: number): number {
  let longest = 0;
  for (let y = Math.round(top); y < foot; y += 1) {
    let run = 0;
    for (let x = 0; x < right; x += 1) {
      run = raster.black[y * raster.width + x] ? run + 1 : 0;
      longest = Math.max(longest, run);
    }
  }
  return longest;
}

describe("the instruction sheet", () => {
  it("names materials, cautions, strips, diagonal cuts and assembly", async () => {
    const { pages, title, language, printScaling } = await readPdf(await instructionSheetPdf(WEIR_POOL_SHEET));
    expect({ title, language, printScaling }).toEqual({ title: "Weir Pool, instruction sheet", language: "en-US", printScaling: "None" });
    const text = pages.map((page) => page.text.replace(/\s+/g, " "));
    for (const said of ["Finished size 66 \u00d7 80 in", "Midnight Ferry, wheels and binding", "Shell buttons, 12 mm", "Retract the blade", "Irons and steam burn", "pins and needles", "not a toy"]) {
      expect(text[0]).toContain(said);
    }
    const cutting = text.slice(1).join(" ");
    for (const said of ["Cutting", "240 B", "cut once, corner to corner", "1 to 12", "exact 3.854 in", "Binding. 304 in in all of strips", "joined on the bias", "Clay\u2019s Choice", "make 20", "In one block: 4 A, 24 B.", "The quilt", "3. Binding"]) {
      expect(cutting).toContain(said);
    }
    pages.forEach((page, index) => {
      expect(page).toMatchObject({ width: 612, height: 792 });
      expect(page.text).toContain(`page ${index + 1} of ${pages.length}`);
      expect(page.text).toContain("Version 3, 24 November");
    });
  });

  it("keeps its text on the page with two dozen fabrics and names that do not end", async () => {
    const { pages } = await readPdf(await instructionSheetPdf(LONG_SHEET));
    expect(textOffThePage(pages)).toEqual([]);
    for (const page of pages) expect(page.height).toBeCloseTo(841.89, 1);
    expect(pages.map((page) => page.text).join(" ")).toContain("25 mm");
  });

  it("carries a test mark that is an inch long on paper", async () => {
    const dotsPerInch = 288;
    const [raster] = rasterise(await instructionSheetPdf(WEIR_POOL_SHEET), dotsPerInch, 1);
    const scale = dotsPerInch / 72;
    const inch = longestLine(raster as Raster, 688 * scale, 726 * scale, 200 * scale);
    expect(Math.abs(inch - dotsPerInch)).toBeLessThanOrEqual(4);
  });

  it("prints where a kit has no block, no fabric and no steps", async () => {
    const { pages } = await readPdf(await instructionSheetPdf({ ...WEIR_POOL_SHEET, fabrics: [], blocks: [], assembly: [], notions: [], alsoNeeded: [] }));
    expect(pages).toHaveLength(1);
  });

  it("adds up the patches of a fabric to what the pieces ask for", () => {
    for (const fabric of WEIR_POOL_SHEET.fabrics) {
      const { layout } = fabric;
      if (!layout) continue;
      const groups = groupStrips(layout.plan, layout.blanks);
      expect(groups.reduce((sum, group) => sum + group.strips, 0)).toBe(layout.plan.strips.length);
      for (const blank of layout.blanks) {
        const cut = groups.flatMap((group) => group.each.map((each) => (each.blank.key === blank.key ? each.count * group.strips : 0)));
        expect(cut.reduce((sum, count) => sum + count, 0)).toBe(blank.count);
      }
    }
  });

  it("lists what the planner lays, whichever way a piece is cut", async () => {
    const { pages } = await readPdf(await instructionSheetPdf(await everyMethodSheet()));
    expect(textOffThePage(pages)).toEqual([]);
    const text = pages.map((page) => page.text).join(" ").replace(/\s+/g, " ");
    for (const said of ["cut twice, corner to corner", "cut once, corner to corner, the other way", "at 60 degrees", "By the template", "the whole strip", "3 lengths, 8 in", "Er, 24 patches", "the long edges are bias", "Border. 60 1\u20442 in in all"]) {
      expect(text).toContain(said);
    }
  });

  it("numbers strips in words", () => {
    expect(numberWords([1, 2, 3, 7, 9, 10])).toBe("1 to 3, 7, 9, 10");
    expect(numberWords([])).toBe("");
  });
});

describe("the bolt-length list", () => {
  it("lists bolts in shelf order with lengths, bags, flaws and what is left", async () => {
    const { pages, printScaling } = await readPdf(await cutListPdf(CUT_LIST));
    expect(printScaling).toBe("None");
    const text = pages.map((page) => page.text).join(" ").replace(/\s+/g, " ");
    const places = ["B004217K", "B004222C", "B004230A", "B004231B", "B004232D"].map((tag) => text.indexOf(tag));
    expect(places.every((place) => place > 0)).toBe(true);
    expect([...places].sort((a, b) => a - b)).toEqual(places);
    for (const said of ["17 lengths from 5 bolts for 5 kits", "Flaw from", "cut away, straighten", "bag 5", "page 1 of 1", "leaves 3 yd 8 in"]) expect(text).toContain(said);
  });

  it("runs over pages without losing a bag or leaving the page", async () => {
    const { pages } = await readPdf(await cutListPdf(LONG_CUT_LIST));
    expect(textOffThePage(pages)).toEqual([]);
    const text = pages.map((page) => page.text).join("\n");
    for (let bag = 1; bag <= 700; bag += 1) expect(text).toMatch(new RegExp(`bag ${bag}(?!\\d)`));
  });

  it("says so where nothing is planned, and where more is cut than the book has", async () => {
    const empty = await readPdf(await cutListPdf({ ...CUT_LIST, bolts: [] }));
    expect(empty.pages[0]?.text).toContain("No bolt is planned for this run.");
    const [bolt] = CUT_LIST.bolts;
    if (!bolt) throw new Error("The fixture has no bolt");
    const short = await readPdf(await cutListPdf({ ...CUT_LIST, bolts: [{ ...bolt, left: inches(36), flaws: [{ startsAt: inches(30), endsAt: length(inches(36)) }] }] }));
    expect(textOffThePage(short.pages)).toEqual([]);
  });
});
