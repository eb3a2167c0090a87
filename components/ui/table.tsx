import type { ComponentPropsWithoutRef, ReactNode } from "react";

interface RuledTableProps extends ComponentPropsWithoutRef<"table"> {
  /** Said by screen readers; the page's own heading is seen. */
  readonly caption: string;
  readonly dense?: boolean;
  /** Runs to both edges of the sheet. */
  readonly page?: boolean;
  /** Becomes slips below 860 px; give each figure cell a `label`. */
  readonly stack?: boolean;
}

/** Ruled off like a pattern sheet. Use plain thead, tbody and tr inside, and the cells below. */
export function RuledTable({ caption, dense = false, page = false, stack = false, className = "", children, ...rest }: RuledTableProps) {
  const classes = ["ruled", dense ? "ruled-dense" : "", page ? "ruled-page" : "", stack ? "ruled-stack" : "", className].filter(Boolean).join(" ");
  return (
    <div className="table-scroll">
      <table {...rest} className={classes}>
        <caption className="sr">{caption}</caption>
        {children}
      </table>
    </div>
  );
}

interface HeadProps extends ComponentPropsWithoutRef<"th"> {
  readonly figure?: boolean;
}

export function Head({ figure = false, className = "", ...rest }: HeadProps) {
  return <th scope="col" {...rest} className={`${figure ? "figure" : ""} ${className}`.trim() || undefined} />;
}

interface CellProps extends ComponentPropsWithoutRef<"td"> {
  /** Right-aligned and tabular. */
  readonly figure?: boolean;
  /** The column's name, shown before the figure on a narrow sheet. */
  readonly label?: string;
  /** Takes a line of its own on a narrow sheet: tapes. */
  readonly wide?: boolean;
}

export function Cell({ figure = false, label, wide = false, className = "", ...rest }: CellProps) {
  return <td {...rest} data-label={label} data-wide={wide || undefined} className={`${figure ? "figure" : ""} ${className}`.trim() || undefined} />;
}

export function RowHead({ children, ...rest }: ComponentPropsWithoutRef<"th">) {
  return (
    <th scope="row" {...rest}>
      {children}
    </th>
  );
}

/** A table with no rows keeps its head and says what would lie here. */
export function NoRows({ columns, children }: { columns: number; children: ReactNode }) {
  return (
    <tr>
      <td colSpan={columns} className="ruled-nothing" data-wide="">
        {children}
      </td>
    </tr>
  );
}

/** Rows whose cloth is still being fetched. The table around them carries aria-busy. */
export function SkeletonRows({ rows = 5, columns }: { rows?: number; columns: number }) {
  return Array.from({ length: rows }, (_, row) => (
    <tr key={row} className="skeleton" aria-hidden="true">
      {Array.from({ length: columns }, (_, column) => (
        <td key={column}>
          <span className="skeleton-bar" style={{ width: `${40 + ((row * 7 + column * 23) % 45)}%` }} />
        </td>
      ))}
    </tr>
  ));
}
