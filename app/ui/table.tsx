// A stacked table loses its roles to `display: block`, so they are given again.
// biome-ignore-all lint/a11y/noRedundantRoles: see above
// biome-ignore-all lint/a11y/useSemanticElements: see above
import type { ReactNode } from "react";

export interface Column<Row> {
  key: string;
  head: string;
  cell: (row: Row) => ReactNode;
  /** Tabular figures, right-aligned where the table is a table. */
  number?: boolean;
  /** Names the row: one column of a table. */
  rowHead?: boolean;
}

/**
 * Rows that line up. On a narrow screen each row becomes a block with its heads before its values
 * (`stack`), or the table scrolls by itself in a region the keyboard reaches (`scroll`).
 */
export function Table<Row>({
  caption,
  columns,
  rows,
  rowKey,
  narrow = "stack",
  captionHidden = false,
}: {
  caption: string;
  columns: readonly Column<Row>[];
  rows: readonly Row[];
  rowKey: (row: Row) => string;
  narrow?: "stack" | "scroll";
  captionHidden?: boolean;
}) {
  const stack = narrow === "stack";
  const table = (
    <table
      role="table"
      className={`w-full border-collapse text-left ${stack ? "max-sm:block" : ""}`}
    >
      <caption
        className={
          captionHidden ? "sr-only" : `pb-2 text-left font-bold ${stack ? "max-sm:block" : ""}`
        }
      >
        {caption}
      </caption>
      <thead role="rowgroup" className={stack ? "max-sm:sr-only" : ""}>
        <tr role="row" className="border-b-2 border-ink">
          {columns.map(({ key, head, number }) => (
            <th
              key={key}
              role="columnheader"
              scope="col"
              className={`py-2 pr-4 align-bottom text-sm font-bold last:pr-0 ${number ? "text-right" : ""}`}
            >
              {head}
            </th>
          ))}
        </tr>
      </thead>
      <tbody role="rowgroup" className={stack ? "max-sm:block" : ""}>
        {rows.map((row) => (
          <tr
            key={rowKey(row)}
            role="row"
            className={`break-inside-avoid border-b border-line ${stack ? "max-sm:block max-sm:py-2" : ""}`}
          >
            {columns.map((column) => (
              <TableCell key={column.key} column={column} row={row} stack={stack} />
            ))}
          </tr>
        ))}
      </tbody>
    </table>
  );
  if (stack) return table;
  return (
    <section
      aria-label={caption}
      // biome-ignore lint/a11y/noNoninteractiveTabindex: a region that scrolls must take the keyboard
      tabIndex={0}
      className="overflow-x-auto"
    >
      {table}
    </section>
  );
}

function TableCell<Row>({ column, row, stack }: { column: Column<Row>; row: Row; stack: boolean }) {
  const look = `py-2.5 pr-4 align-top last:pr-0 ${column.number ? "tabular-nums text-right" : ""} ${
    stack ? "max-sm:flex max-sm:justify-between max-sm:gap-4 max-sm:py-1 max-sm:pr-0" : ""
  }`;
  const head = stack && (
    <span aria-hidden="true" className="shrink-0 text-sm font-normal text-mute sm:hidden">
      {column.head}
    </span>
  );
  const value = stack ? (
    <div className="min-w-0 max-sm:text-right">{column.cell(row)}</div>
  ) : (
    column.cell(row)
  );
  if (column.rowHead) {
    return (
      <th
        role="rowheader"
        scope="row"
        className={`py-2.5 pr-4 align-top font-bold ${stack ? "max-sm:block max-sm:py-1 max-sm:text-lg" : ""}`}
      >
        {column.cell(row)}
      </th>
    );
  }
  return (
    <td role="cell" className={look}>
      {head}
      {value}
    </td>
  );
}
