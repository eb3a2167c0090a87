import PDFDocument from "pdfkit";
import { ALL_FACES, faceBytes } from "./faces";

/** Width and height in points (1/72 in). */
export interface Paper {
  readonly width: number;
  readonly height: number;
}

export const LETTER: Paper = { width: 612, height: 792 };
export const A4: Paper = { width: 595.28, height: 841.89 };
export const LABEL_4X6: Paper = { width: 288, height: 432 };
export const LABEL_SMALL: Paper = { width: 162, height: 90 };
/** 80 mm roll; each receipt has a height of its own. */
export const RECEIPT_WIDTH = 226.77;

export interface PressOptions {
  readonly title: string;
  /** BCP 47, for screen readers. */
  readonly language?: string;
  readonly author?: string;
  /** Keeps the pages open until the end, so that each can say how many there are. */
  readonly countsPages?: boolean;
}

/** One PDF being made. Fonts are parsed once a document, so many labels belong into one. */
export interface Press {
  readonly doc: PDFKit.PDFDocument;
  readonly startPage: (paper: Paper) => void;
  /** Ends the document; pages cannot be added after it. */
  readonly finish: () => Promise<Buffer>;
}

/** Opens a document that asks the viewer for no scaling, so that a printed inch is an inch. */
export function openPress({ title, language = "en", author, countsPages = false }: PressOptions): Press {
  const doc = new PDFDocument({
    autoFirstPage: false,
    pdfVersion: "1.7",
    lang: language,
    displayTitle: true,
    margin: 0,
    bufferPages: countsPages,
    info: { Title: title, Creator: "Ellwand", ...(author ? { Author: author } : {}) },
  });
  const chunks: Buffer[] = [];
  const bytes = new Promise<Buffer>((resolve, reject) => {
    doc.on("data", (chunk: Buffer) => chunks.push(chunk));
    doc.on("end", () => resolve(Buffer.concat(chunks)));
    doc.on("error", reject);
  });
  for (const face of ALL_FACES) doc.registerFont(face, faceBytes(face));
  askForNoScaling(doc);
  return {
    doc,
    startPage: (paper) => void doc.addPage({ size: [paper.width, paper.height], margin: 0 }),
    finish: () => {
      doc.end();
      return bytes;
    },
  };
}

interface WithCatalogue {
  readonly _root: { readonly data: { readonly ViewerPreferences: { readonly data: Record<string, unknown> } } };
}

/** pdfkit writes the viewer preferences for `displayTitle` and has no option for the scaling, so it is added to them. */
function askForNoScaling(doc: PDFKit.PDFDocument): void {
  (doc as unknown as WithCatalogue)._root.data.ViewerPreferences.data["PrintScaling"] = "None";
}
