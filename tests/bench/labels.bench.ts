import PDFDocument from "pdfkit";
import { bagTagsPdf } from "@/labels/bag-tag";
import { instructionSheetPdf } from "@/labels/instruction-sheet";
import { kitLabelsPdf, type KitLabelInput } from "@/labels/kit-label";
import { faceBytes } from "@/labels/press/faces";
import { receiptPdf } from "@/labels/receipt";
import { BAG_TAGS, RECEIPT } from "@/tests/fixtures/labels/shop-papers";
import { WEIR_POOL_LABEL } from "@/tests/fixtures/labels/weir-pool-label";
import { WEIR_POOL_SHEET } from "@/tests/fixtures/labels/weir-pool-sheet";
import type { BenchRow } from "./bench-row";

const SHEAF = 240;
const ROUNDS = 5;

/** Seconds of the middle round, after one that warms up. */
async function secondsOf(work: () => Promise<unknown>): Promise<number> {
  const seconds: number[] = [];
  for (let round = 0; round <= ROUNDS; round += 1) {
    const from = performance.now();
    await work();
    if (round > 0) seconds.push((performance.now() - from) / 1000);
  }
  return seconds.sort((a, b) => a - b)[Math.floor(ROUNDS / 2)] ?? Number.NaN;
}

/** What pdfkit itself takes: as many pages with the same face, twenty lines of text and eighty filled bars. */
function barePages(pages: number): Promise<Buffer> {
  const doc = new PDFDocument({ autoFirstPage: false, margin: 0 });
  const chunks: Buffer[] = [];
  doc.on("data", (chunk: Buffer) => chunks.push(chunk));
  const done = new Promise<Buffer>((resolve) => doc.on("end", () => resolve(Buffer.concat(chunks))));
  doc.registerFont("text", faceBytes("text"));
  for (let page = 0; page < pages; page += 1) {
    doc.addPage({ size: [288, 432], margin: 0 });
    doc.font("text").fontSize(10).fillColor("#000000");
    for (let line = 0; line < 20; line += 1) doc.text(`Midnight Ferry, lot 7731, page ${page}`, 13, 20 + line * 15, { lineBreak: false });
    for (let bar = 0; bar < 80; bar += 1) doc.rect(13 + bar * 3, 360, 1.5, 36);
    doc.fill("#000000");
  }
  doc.end();
  return done;
}

/** Labels a second, against bare pdfkit writing as many pages in the same run. */
export default async function labelsBench(): Promise<BenchRow[]> {
  const sheaf: KitLabelInput[] = Array.from({ length: SHEAF }, (_, i) => ({ ...WEIR_POOL_LABEL, serial: `K${20410000 + i}X`, link: `https://osierfalls.example/k/K${20410000 + i}X` }));
  const sameLink = sheaf.map((label) => ({ ...label, link: WEIR_POOL_LABEL.link }));
  const bags = Array.from({ length: SHEAF }, (_, i) => ({ ...(BAG_TAGS[0] as (typeof BAG_TAGS)[number]), bag: i + 1, serial: `K${20410000 + i}X` }));
  const bareSheaf = await secondsOf(() => barePages(SHEAF));
  const bareOne = await secondsOf(() => barePages(1));
  const row = (name: string, seconds: number, bare: number, count: number, unit: string): BenchRow => ({
    name,
    figure: `${(count / seconds).toFixed(0)} ${unit} a second`,
    ratio: bare / seconds,
    note: `bare pdfkit ${(count / bare).toFixed(0)} pages a second; median of ${ROUNDS}`,
  });
  return [
    row(`kit labels, ${SHEAF} in one document`, await secondsOf(() => kitLabelsPdf(sheaf)), bareSheaf, SHEAF, "labels"),
    row(`kit labels, ${SHEAF} with one link`, await secondsOf(() => kitLabelsPdf(sameLink)), bareSheaf, SHEAF, "labels"),
    row(`bag tags, ${SHEAF} in one document`, await secondsOf(() => bagTagsPdf(bags)), bareSheaf, SHEAF, "tags"),
    row("kit label, a document of its own", await secondsOf(() => kitLabelsPdf([WEIR_POOL_LABEL])), bareOne, 1, "labels"),
    row("receipt, a document of its own", await secondsOf(() => receiptPdf(RECEIPT)), bareOne, 1, "receipts"),
    row("instruction sheet, five pages", await secondsOf(() => instructionSheetPdf(WEIR_POOL_SHEET)), bareOne, 1, "sheets"),
  ];
}
