import { bagTagsPdf, type BagTagInput } from "./bag-tag";
import { boltTagsPdf, type BoltTagInput } from "./bolt-tag";
import { cutListPdf, type CutListInput } from "./cut-list-sheet";
import { cutTagsPdf, type CutTagInput } from "./cut-tag";
import { instructionSheetPdf } from "./instruction-sheet";
import { kitLabelsPdf, type KitLabelInput } from "./kit-label";
import { receiptPdf, type ReceiptInput } from "./receipt";
import type { InstructionSheetInput } from "./sheet/sheet-input";
import { shelfLabelsPdf, type ShelfLabelInput } from "./shelf-label";

/**
 * Everything the shop prints, as plain data that can lie on the print queue as JSON. Labels come in sheaves: one
 * document, one page a label.
 */
export type PrintDocument =
  | { readonly kind: "kit-label"; readonly content: readonly KitLabelInput[] }
  | { readonly kind: "bag-tag"; readonly content: readonly BagTagInput[] }
  | { readonly kind: "bolt-tag"; readonly content: readonly BoltTagInput[] }
  | { readonly kind: "cut-tag"; readonly content: readonly CutTagInput[] }
  | { readonly kind: "shelf-label"; readonly content: readonly ShelfLabelInput[] }
  | { readonly kind: "receipt"; readonly content: ReceiptInput }
  | { readonly kind: "bolt-length-list"; readonly content: CutListInput }
  | { readonly kind: "instruction-sheet"; readonly content: InstructionSheetInput };

export type DocumentKind = PrintDocument["kind"];
export type DocumentContent<Kind extends DocumentKind> = Extract<PrintDocument, { readonly kind: Kind }>["content"];

/** The machine a document goes to. */
export type DocumentPrinter = "label-4x6" | "label-small" | "receipt" | "sheet";

interface KindOfDocument<Kind extends DocumentKind> {
  /** What people call it. */
  readonly name: string;
  readonly printer: DocumentPrinter;
  /** In words, for the queue and the printer's settings. */
  readonly paper: string;
  readonly render: (content: DocumentContent<Kind>) => Promise<Buffer>;
}

const SMALL = "2 1/4 x 1 1/4 in label";
const SHEET = "letter or A4";

export const DOCUMENT_KINDS: { readonly [Kind in DocumentKind]: KindOfDocument<Kind> } = {
  "kit-label": { name: "Kit label", printer: "label-4x6", paper: "4 x 6 in label", render: kitLabelsPdf },
  "bag-tag": { name: "Bag tag", printer: "label-small", paper: SMALL, render: bagTagsPdf },
  "bolt-tag": { name: "Bolt tag", printer: "label-small", paper: SMALL, render: boltTagsPdf },
  "cut-tag": { name: "Cut tag", printer: "label-small", paper: SMALL, render: cutTagsPdf },
  "shelf-label": { name: "Shelf label", printer: "label-small", paper: SMALL, render: shelfLabelsPdf },
  receipt: { name: "Receipt", printer: "receipt", paper: "80 mm roll", render: receiptPdf },
  "bolt-length-list": { name: "Bolt-length list", printer: "sheet", paper: SHEET, render: cutListPdf },
  "instruction-sheet": { name: "Instruction sheet", printer: "sheet", paper: SHEET, render: instructionSheetPdf },
};

/** Renders any document of the queue. Throws RangeError on a sheaf of no labels: a PDF has at least one page. */
export function printDocumentPdf(document: PrintDocument): Promise<Buffer> {
  if (Array.isArray(document.content) && document.content.length === 0) throw new RangeError(`A ${document.kind} document needs at least one label`);
  switch (document.kind) {
    case "kit-label":
      return kitLabelsPdf(document.content);
    case "bag-tag":
      return bagTagsPdf(document.content);
    case "bolt-tag":
      return boltTagsPdf(document.content);
    case "cut-tag":
      return cutTagsPdf(document.content);
    case "shelf-label":
      return shelfLabelsPdf(document.content);
    case "receipt":
      return receiptPdf(document.content);
    case "bolt-length-list":
      return cutListPdf(document.content);
    case "instruction-sheet":
      return instructionSheetPdf(document.content);
  }
}

/** Tells whether what came out of the queue names a kind this version prints; its content was typed when it was put there. */
export function isPrintDocument(value: unknown): value is PrintDocument {
  if (typeof value !== "object" || value === null || !("kind" in value) || !("content" in value)) return false;
  return typeof value.kind === "string" && Object.hasOwn(DOCUMENT_KINDS, value.kind) && typeof value.content === "object" && value.content !== null;
}
