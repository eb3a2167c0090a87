import { readdirSync } from "node:fs";
import path from "node:path";
import { pathToFileURL } from "node:url";
import type { BenchRow } from "./bench-row";

/** Runs each `*.bench.ts` beside it, or those whose names are given, and prints a table. Nothing here asserts a time. */
const folder = import.meta.dirname;
const wanted = process.argv.slice(2);
const files = readdirSync(folder)
  .filter((file) => file.endsWith(".bench.ts"))
  .filter((file) => wanted.length === 0 || wanted.some((name) => file.startsWith(name)))
  .sort();

for (const file of files) {
  const loaded = (await import(pathToFileURL(path.join(folder, file)).href)) as { default: () => Promise<BenchRow[]> };
  print(file, await loaded.default());
}

function print(file: string, rows: readonly BenchRow[]): void {
  const cells = rows.map((row) => [row.name, row.figure, row.ratio === null ? "" : row.ratio.toFixed(4), row.note]);
  const widths = [0, 1, 2].map((column) => Math.max(...cells.map((line) => line[column]?.length ?? 0), 0));
  console.log(`\n${file}`);
  for (const line of cells) console.log(`  ${line.map((cell, column) => cell.padEnd(widths[column] ?? 0)).join("  ")}`.trimEnd());
}
