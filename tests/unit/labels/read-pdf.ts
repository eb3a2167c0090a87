import { execFileSync } from "node:child_process";
import { mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { createRequire } from "node:module";
import { tmpdir } from "node:os";
import path from "node:path";
import { getDocument, OPS } from "pdfjs-dist/legacy/build/pdf.mjs";
import { prepareZXingModule, readBarcodes } from "zxing-wasm/reader";

/** One page as a printer burns it: 1 black, 0 white. */
export interface Raster {
  readonly width: number;
  readonly height: number;
  readonly black: Uint8Array;
}

/** Renders with poppler and thresholds at half, which is what a thermal printer's driver does. */
export function rasterise(pdf: Buffer, dotsPerInch: number, pages = 999): Raster[] {
  const folder = mkdtempSync(path.join(tmpdir(), "labels-"));
  try {
    writeFileSync(path.join(folder, "in.pdf"), pdf);
    execFileSync("pdftoppm", ["-r", String(dotsPerInch), "-l", String(pages), "-gray", "in.pdf", "out"], { cwd: folder });
    const names = readdirSync(folder).filter((name) => name.endsWith(".pgm")).sort();
    return names.map((name) => readGreymap(readFileSync(path.join(folder, name))));
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

/** Binary PGM (P5), one byte a pixel. */
function readGreymap(bytes: Buffer): Raster {
  const head = /^P5\s+(\d+)\s+(\d+)\s+255\s/.exec(bytes.toString("latin1", 0, 64));
  if (!head) throw new Error("Not a greymap");
  const [width, height] = [Number(head[1]), Number(head[2])];
  const black = Uint8Array.from(bytes.subarray(head[0].length), (value) => (value < 128 ? 1 : 0));
  return { width, height, black };
}

const wasm = readFileSync(createRequire(import.meta.url).resolve("zxing-wasm/reader/zxing_reader.wasm"));
prepareZXingModule({ overrides: { wasmBinary: Uint8Array.from(wasm).buffer } });

/** Every barcode a scanner finds, as "Code128 K0001X". */
export async function scan(raster: Raster): Promise<string[]> {
  const data = new Uint8ClampedArray(raster.width * raster.height * 4);
  raster.black.forEach((dot, i) => data.fill(dot ? 0 : 255, i * 4, i * 4 + 3).fill(255, i * 4 + 3, i * 4 + 4));
  const image = { data, width: raster.width, height: raster.height, colorSpace: "srgb" } as ImageData;
  const found = await readBarcodes(image, { formats: ["Code128", "QRCode"], tryHarder: true });
  return found.filter((each) => each.isValid).map((each) => `${each.format} ${each.text}`).sort();
}

export interface PdfPage {
  readonly width: number;
  readonly height: number;
  readonly text: string;
  /** Corners of every run of text, in points from the page's lower left corner. */
  readonly runs: readonly { readonly text: string; readonly corners: readonly (readonly [number, number])[] }[];
}

export interface PdfContent {
  readonly title: string;
  readonly language: string;
  readonly printScaling: string;
  readonly pages: readonly PdfPage[];
}

export async function readPdf(pdf: Buffer): Promise<PdfContent> {
  const document = await getDocument({ data: Uint8Array.from(pdf), verbosity: 0 }).promise;
  const { info } = (await document.getMetadata()) as { info: { Title?: string; Language?: string } };
  const preferences = (await document.getViewerPreferences()) as { PrintScaling?: string } | null;
  const pages: PdfPage[] = [];
  for (let number = 1; number <= document.numPages; number += 1) {
    const page = await document.getPage(number);
    const [left = 0, bottom = 0, right = 0, top = 0] = page.view;
    const content = await page.getTextContent();
    const runs = content.items.flatMap((item) => ("str" in item && item.str.trim() ? [{ text: item.str, corners: cornersOf(item.transform as number[], item.width) }] : []));
    pages.push({ width: right - left, height: top - bottom, runs, text: content.items.map((item) => ("str" in item ? item.str + (item.hasEOL ? "\n" : "") : "")).join("") });
  }
  await document.destroy();
  return { title: info.Title ?? "", language: info.Language ?? "", printScaling: preferences?.PrintScaling ?? "", pages };
}

/** Start and end of the baseline, and the same points an x-height up; ascenders may stand a little higher. */
function cornersOf(transform: readonly number[], width: number): (readonly [number, number])[] {
  const [a = 0, b = 0, c = 0, d = 0, x = 0, y = 0] = transform;
  const size = Math.hypot(a, b) || 1;
  const along = [(a / size) * width, (b / size) * width] as const;
  return [
    [x, y],
    [x + along[0], y + along[1]],
    [x + c * 0.5, y + d * 0.5],
    [x + along[0] + c * 0.5, y + along[1] + d * 0.5],
  ];
}

/** Text that lies, wholly or partly, off its page. */
export function textOffThePage(pages: readonly PdfPage[]): string[] {
  return pages.flatMap((page) =>
    page.runs.filter(({ corners }) => corners.some(([x, y]) => x < 0 || y < 0 || x > page.width || y > page.height)).map(({ text }) => text),
  );
}

/** Every colour that anything on the pages is filled or drawn with, as #rrggbb. */
export async function coloursOf(pdf: Buffer): Promise<string[]> {
  const document = await getDocument({ data: Uint8Array.from(pdf), verbosity: 0 }).promise;
  const colours = new Set<string>();
  for (let number = 1; number <= document.numPages; number += 1) {
    const { fnArray, argsArray } = await (await document.getPage(number)).getOperatorList();
    fnArray.forEach((operator, i) => {
      if (operator === OPS.setFillRGBColor || operator === OPS.setStrokeRGBColor) colours.add(String((argsArray[i] as unknown[])[0]));
    });
  }
  await document.destroy();
  return [...colours].sort();
}
