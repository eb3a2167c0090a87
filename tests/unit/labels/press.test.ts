import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { code128, qr } from "@/labels/barcode";
import { DOCUMENT_KINDS, isPrintDocument, printDocumentPdf, type PrintDocument } from "@/labels/documents";
import { ALL_FACES, faceHas } from "@/labels/press/faces";
import { openPress } from "@/labels/press/press";
import { printable } from "@/labels/press/printable";
import { drawParagraph, fittingSize, paragraphHeight, textWidth } from "@/labels/press/type";
import { BAG_TAGS, BOLT_TAGS, CUT_LIST, CUT_TAGS, RECEIPT, SHELF_LABELS } from "@/tests/fixtures/labels/shop-papers";
import { WEIR_POOL_LABEL } from "@/tests/fixtures/labels/weir-pool-label";
import { WEIR_POOL_SHEET } from "@/tests/fixtures/labels/weir-pool-sheet";
import { readPdf } from "./read-pdf";

describe("what a face can draw", () => {
  it("is read from the font itself", () => {
    for (const face of ALL_FACES) for (const letter of "Aa09\u00e9\u2026\u2019?") expect(faceHas(face, letter.codePointAt(0) ?? 0)).toBe(true);
    expect(faceHas("text", 0x2044)).toBe(true);
    expect(faceHas("text", 0x6c34)).toBe(false);
    expect(faceHas("word", 0x0421)).toBe(false);
  });

  it("is all that is ever set, whatever is typed", () => {
    fc.assert(
      fc.property(fc.string({ unit: "grapheme" }), fc.string({ unit: "binary" }), fc.constantFrom(...ALL_FACES), (typed, raw, face) => {
        for (const part of printable(typed + raw, face)) for (const character of part.text) expect(faceHas(part.face, character.codePointAt(0) ?? 0)).toBe(true);
      }),
      { numRuns: 300 },
    );
  });

  it("stands in for what it lacks", () => {
    const said = (text: string) => printable(text, "text").map((part) => part.text).join("");
    expect(said("Zo\u0065\u0308")).toBe("Zo\u00eb");
    expect(said("a \u2713 b \u2605")).toBe("a x b *");
    expect(said("a\tb\nc")).toBe("a b c");
    expect(said("\u6c34\u8272")).toBe("??");
    expect(said("\u{1f9f5}\ufe0f!")).toBe("?!");
    expect(said("")).toBe("");
  });
});

describe("setting text", () => {
  const press = openPress({ title: "Setting" });
  press.startPage({ width: 300, height: 300 });
  const style = { face: "text", size: 10 } as const;

  it("never makes a paragraph taller than its lines", () => {
    fc.assert(
      fc.property(fc.string({ maxLength: 300 }), fc.integer({ min: 20, max: 250 }), fc.integer({ min: 1, max: 4 }), (text, width, maxLines) => {
        const height = paragraphHeight(press, text, style, { width, maxLines });
        expect(height).toBeLessThanOrEqual(maxLines * 12.8 + 1e-6);
        expect(drawParagraph(press, text, style, 10, 10, { width, maxLines })).toBeCloseTo(10 + height, 6);
      }),
      { numRuns: 100 },
    );
  });

  it("shrinks a name to its room and no further than asked", () => {
    const word = { face: "word-strong", size: 30 } as const;
    const size = fittingSize(press, "Weir Pool", word, 80, 1, 8);
    expect(textWidth(press, "Weir Pool", { ...word, size })).toBeLessThanOrEqual(80);
    expect(fittingSize(press, "Weirpoolweirpoolweirpoolweirpool", word, 20, 1, 8)).toBe(8);
  });

  it("sets a mixed number narrower than the same figures in a row", () => {
    expect(textWidth(press, "3 7\u20448", style)).toBeLessThan(textWidth(press, "3 7/8", style));
  });
});

describe("barcodes", () => {
  it("make the modules two dots where three do not fit, and give up where two do not", () => {
    const wide = code128("B004217K", 456, 60);
    const narrow = code128("B004217K", 320, 60);
    expect(wide?.quiet).toBe(30);
    expect(narrow?.quiet).toBe(20);
    expect(code128("B004217K", 200, 60)).toBeNull();
  });

  it("refuse what Code 128 cannot carry", () => {
    expect(code128("\u6c34", 812, 60)).toBeNull();
    expect(code128("", 812, 60)).toBeNull();
  });

  it("keep every bar inside the symbol", () => {
    for (const symbol of [code128("K20410387X", 812, 60), qr("https://osierfalls.example/k/K20410387X")]) {
      if (!symbol) throw new Error("The symbol does not fit");
      for (const [x, y, width, height] of symbol.bars) {
        expect(x + width).toBeLessThanOrEqual(symbol.width);
        expect(y + height).toBeLessThanOrEqual(symbol.height);
      }
    }
  });
});

describe("the table of documents", () => {
  const documents: readonly PrintDocument[] = [
    { kind: "kit-label", content: [WEIR_POOL_LABEL] },
    { kind: "bag-tag", content: BAG_TAGS },
    { kind: "bolt-tag", content: BOLT_TAGS },
    { kind: "cut-tag", content: CUT_TAGS },
    { kind: "shelf-label", content: SHELF_LABELS },
    { kind: "receipt", content: RECEIPT },
    { kind: "bolt-length-list", content: CUT_LIST },
    { kind: "instruction-sheet", content: WEIR_POOL_SHEET },
  ];

  it("prints every kind after a journey through JSON", async () => {
    expect(documents.map((document) => document.kind).sort()).toEqual(Object.keys(DOCUMENT_KINDS).sort());
    for (const document of documents) {
      const stored: unknown = JSON.parse(JSON.stringify(document));
      if (!isPrintDocument(stored)) throw new Error(`${document.kind} was not known again`);
      const { pages, title, printScaling } = await readPdf(await printDocumentPdf(stored));
      expect(pages.length).toBeGreaterThan(0);
      expect(title).not.toBe("");
      expect(printScaling).toBe("None");
    }
  });

  it("knows what is no document", () => {
    for (const value of [null, 1, "kit-label", {}, { kind: "kit-label" }, { kind: "toString", content: [] }, { kind: "receipt", content: null }]) expect(isPrintDocument(value)).toBe(false);
  });

  it("refuses a sheaf of no labels", () => {
    expect(() => printDocumentPdf({ kind: "bag-tag", content: [] })).toThrow(RangeError);
  });
});
