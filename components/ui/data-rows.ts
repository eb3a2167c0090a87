import type { ReactNode } from "react";
import type { Length } from "@/lib/core/measure/length";

/** A column. All of it is plain data, so that a page on the server may give it to the table in the browser. */
export interface DataColumn {
  readonly id: string;
  readonly head: ReactNode;
  /** Right-aligned, tabular. */
  readonly figure?: boolean;
  /** The column that names the row; exactly one has it. */
  readonly names?: boolean;
  /** Shown before the figure on a narrow sheet. */
  readonly label?: string;
  /** Takes a line of its own on a narrow sheet: tapes. */
  readonly wide?: boolean;
  /** May be put in order in the browser; only where all rows are on the page. */
  readonly sorts?: boolean;
  /** In pixels. */
  readonly width?: number;
}

export interface DataRow {
  readonly id: string;
  /** The row's name in words, for its tick box and the bar at the foot. */
  readonly name: string;
  /** Where Enter goes. */
  readonly href?: string;
  readonly cells: Readonly<Record<string, ReactNode>>;
  /** What a column is put in order by, where the cell itself is not plain text. */
  readonly order?: Readonly<Record<string, string | number>>;
  /** This row limits the whole; its cells say so in words, the edge shows it. */
  readonly limiting?: boolean;
  readonly chosen?: boolean;
  /** Totalled in the bar at the foot, in the order of the first row. */
  readonly totals?: readonly { readonly label: string; readonly length: Length }[];
}

/** Adds the picked rows' totals by label. */
export function totalsOf(rows: readonly DataRow[]): readonly { label: string; units: number }[] {
  const sums = new Map<string, number>();
  for (const row of rows) for (const { label, length } of row.totals ?? []) sums.set(label, (sums.get(label) ?? 0) + length);
  return [...sums].map(([label, units]) => ({ label, units }));
}

/** "Wet Slate", "Wet Slate and Kiln", "Wet Slate, Kiln and 3 more". */
export function nameThem(names: readonly string[]): string {
  if (names.length <= 2) return names.join(" and ");
  if (names.length === 3) return `${names[0]}, ${names[1]} and ${names[2]}`;
  return `${names[0]}, ${names[1]} and ${names.length - 2} more`;
}
