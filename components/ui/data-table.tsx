"use client";

import { createSortedRowModel, rowSelectionFeature, rowSortingFeature, sortFns, tableFeatures, useTable, type ColumnDef, type Row } from "@tanstack/react-table";
import Link from "next/link";
import { useRouter } from "next/navigation";
import { useMemo, useRef, type KeyboardEvent, type ReactNode } from "react";
import type { MeasureSystem } from "@/lib/core/measure/format";
import { nameThem, type DataColumn, type DataRow } from "./data-rows";
import { PickedBar } from "./picked-bar";

const features = tableFeatures({ rowSelectionFeature, rowSortingFeature, sortedRowModel: createSortedRowModel(), sortFns });
type Features = typeof features;

interface DataTableProps {
  /** Said by screen readers. */
  readonly caption: string;
  readonly columns: readonly DataColumn[];
  readonly rows: readonly DataRow[];
  /** Stands in place of the rows where there are none. */
  readonly empty: ReactNode;
  readonly dense?: boolean;
  /** Rows can be picked: what one is called, and the acts upon them, as buttons of a form that receives `pick` fields. */
  readonly picks?: { readonly noun: string; readonly nouns: string; readonly acts: ReactNode; readonly action?: string | ((form: FormData) => void | Promise<void>) };
  readonly system?: MeasureSystem;
  /** What the table shows of how much, and the addresses of the pages before and after it. */
  readonly paging?: { readonly said: string; readonly before?: string | null; readonly after?: string | null };
}

/** Arrows move from row to row, Space picks, Enter opens; "/" goes to the find field, which listens for itself. */
export function DataTable({ caption, columns, rows, empty, dense = false, picks, system = "yards", paging }: DataTableProps) {
  const router = useRouter();
  const body = useRef<HTMLTableSectionElement>(null);
  const defs = useMemo(() => columns.map(columnDef), [columns]);
  const data = useMemo(() => [...rows], [rows]);
  const table = useTable({ features, columns: defs, data, getRowId: (row) => row.id, enableRowSelection: picks !== undefined });
  const shown = table.getRowModel().rows;
  const picked = shown.filter((row) => table.state.rowSelection[row.id]).map((row) => row.original);
  const byId = new Map(columns.map((column) => [column.id, column]));

  const sheet = (
    <>
      <div className="table-scroll">
        <table className={`ruled ruled-page ruled-stack ruled-open${dense ? " ruled-dense" : ""}`}>
          <caption className="sr">{caption}</caption>
          <thead>
            {table.getHeaderGroups().map((group) => (
              <tr key={group.id}>
                {picks ? (
                  <th scope="col" className="pick-cell">
                    <span className="sr">Pick</span>
                  </th>
                ) : null}
                {group.headers.map((header) => (
                  <ColumnHead key={header.id} column={byId.get(header.column.id)} sorted={header.column.getIsSorted()} toggle={() => header.column.toggleSorting()} />
                ))}
              </tr>
            ))}
          </thead>
          <tbody ref={body} onKeyDown={(event) => moveByKey(event, body.current)}>
            {shown.length === 0 ? (
              <tr>
                <td colSpan={columns.length + (picks ? 1 : 0)} className="ruled-nothing" data-wide="">
                  {empty}
                </td>
              </tr>
            ) : (
              shown.map((row) => <RowSlip key={row.id} row={row} byId={byId} picked={Boolean(table.state.rowSelection[row.id])} picks={picks !== undefined} open={(href) => router.push(href)} />)
            )}
          </tbody>
        </table>
      </div>
      <TableFoot picks={picks !== undefined} paging={paging} />
      {picks && picked.length > 0 ? (
        <PickedBar rows={picked} noun={picked.length === 1 ? picks.noun : picks.nouns} names={nameThem(picked.map((row) => row.name))} system={system} acts={picks.acts} letGo={() => table.resetRowSelection(true)} />
      ) : null}
    </>
  );
  return picks ? <form action={picks.action}>{sheet}</form> : sheet;
}

function columnDef(column: DataColumn): ColumnDef<Features, DataRow> {
  return {
    id: column.id,
    accessorFn: (row) => row.order?.[column.id] ?? plain(row.cells[column.id]),
    enableSorting: column.sorts === true,
    sortUndefined: "last",
  };
}

function plain(cell: ReactNode): string | number | undefined {
  return typeof cell === "string" || typeof cell === "number" ? cell : undefined;
}

interface ColumnHeadProps {
  readonly column: DataColumn | undefined;
  readonly sorted: false | "asc" | "desc";
  readonly toggle: () => void;
}

function ColumnHead({ column, sorted, toggle }: ColumnHeadProps) {
  if (!column) return null;
  const order = sorted === "asc" ? "ascending" : sorted === "desc" ? "descending" : "none";
  return (
    <th scope="col" className={column.figure ? "figure" : undefined} style={{ width: column.width }} aria-sort={column.sorts ? order : undefined}>
      {column.sorts ? (
        <button type="button" onClick={toggle}>
          {column.head}
          <span aria-hidden="true">{sorted === "asc" ? " ↑" : sorted === "desc" ? " ↓" : ""}</span>
        </button>
      ) : (
        column.head
      )}
    </th>
  );
}

interface RowSlipProps {
  readonly row: Row<Features, DataRow>;
  readonly byId: ReadonlyMap<string, DataColumn>;
  readonly picks: boolean;
  readonly picked: boolean;
  readonly open: (href: string) => void;
}

function RowSlip({ row, byId, picks, picked, open }: RowSlipProps) {
  const { id, name, href, cells, limiting, chosen } = row.original;
  const className = [chosen ? "chosen" : "", limiting ? "limiting" : ""].filter(Boolean).join(" ") || undefined;
  return (
    <tr
      className={className}
      data-href={href}
      onClick={(event) => {
        if (href && event.target instanceof Element && !event.target.closest("a, button, input, label, select") && !window.getSelection()?.toString()) open(href);
      }}
    >
      {picks ? (
        <td className="pick-cell">
          <label className="tick-label">
            <input type="checkbox" className="tick" name="pick" value={id} checked={picked} onChange={row.getToggleSelectedHandler()} />
            <span className="sr">Pick {name}</span>
          </label>
        </td>
      ) : null}
      {[...byId.values()].map((column) => {
        const cell = cells[column.id];
        if (column.names)
          return (
            <th key={column.id} scope="row">
              {href ? <Link href={href}>{cell}</Link> : cell}
            </th>
          );
        return (
          <td key={column.id} className={column.figure ? "figure" : undefined} data-label={column.label} data-wide={column.wide || undefined}>
            {cell}
          </td>
        );
      })}
    </tr>
  );
}

/** In a row the keys act on its own link and tick box, so that what has the focus is always a thing that can be pressed. */
function moveByKey(event: KeyboardEvent, body: HTMLElement | null): void {
  const target = event.target;
  if (!body || !(target instanceof HTMLElement) || event.altKey || event.ctrlKey || event.metaKey) return;
  const row = target.closest("tr");
  if (!row || target.matches("input:not([type=checkbox]), select, textarea")) return;
  const isTick = target.matches("input[type=checkbox]");
  if (event.key === " " && !isTick && target.matches("a")) {
    const tick = row.querySelector<HTMLInputElement>("input[name=pick]");
    if (!tick) return;
    event.preventDefault();
    tick.click();
  } else if (event.key === "Enter" && isTick) {
    event.preventDefault();
    row.querySelector<HTMLElement>("th a")?.click();
  } else {
    const rows = [...body.querySelectorAll<HTMLElement>(":scope > tr")];
    const next = { ArrowDown: rows[rows.indexOf(row) + 1], ArrowUp: rows[rows.indexOf(row) - 1], Home: rows[0], End: rows.at(-1) }[event.key];
    const tick = next?.querySelector<HTMLElement>("input[name=pick]");
    const stop = isTick ? tick : (next?.querySelector<HTMLElement>("th a") ?? tick);
    if (!stop) return;
    event.preventDefault();
    stop.focus();
    next?.scrollIntoView({ block: "nearest" });
  }
}

function TableFoot({ picks, paging }: { picks: boolean; paging: DataTableProps["paging"] }) {
  if (!paging) return null;
  return (
    <div className="table-foot">
      <span className="no-print">
        <kbd>↓</kbd> <kbd>↑</kbd> move{picks ? (
          <>
            , <kbd>Space</kbd> picks
          </>
        ) : null}
        , <kbd>Enter</kbd> opens
      </span>
      <span>{paging.said}</span>
      {paging.before || paging.after ? (
        <nav className="paging" aria-label="Pages">
          {paging.before ? (
            <Link href={paging.before} rel="prev">
              Those before
            </Link>
          ) : null}
          {paging.after ? (
            <Link href={paging.after} rel="next">
              Those after
            </Link>
          ) : null}
        </nav>
      ) : null}
    </div>
  );
}
