import type { ReactNode } from "react";
import { Link, useSearchParams } from "react-router-dom";
import { useNarrow } from "./narrow.ts";
import { classNames } from "./class-names.ts";

export interface Column<Row> {
  id: string;
  header: string;
  cell: (row: Row) => ReactNode;
  /** Numbers stand at the right, in tabular figures. */
  numeric?: boolean;
  /** Sortable by this value; the order lives in the address bar (`sort=id` or `sort=-id`). */
  sortBy?: (row: Row) => string | number;
  /** Shown in the last row, under the column. */
  total?: ReactNode;
}

interface DataTableProps<Row> {
  caption: string;
  /** Hides the caption from sight when a heading above says the same. */
  captionHidden?: boolean;
  /** The first column names the row. */
  columns: Column<Row>[];
  rows: Row[];
  rowId: (row: Row) => string;
  /** Where the row leads; the link is on the first column and covers the row. */
  rowLink?: (row: Row) => string;
  /** What to do next when there is no row. */
  empty?: ReactNode;
  /** Search parameter that holds the order. */
  sortParameter?: string;
}

/** A table with a sticky header; on phones a list with a label to each value. */
export function DataTable<Row>(props: DataTableProps<Row>) {
  const [search] = useSearchParams();
  const narrow = useNarrow();
  const sort = search.get(props.sortParameter ?? "sort") ?? "";
  if (props.rows.length === 0 && props.empty !== undefined) return props.empty;
  const rows = sorted(props.rows, props.columns, sort);
  return narrow ? <LabelledList {...props} rows={rows} /> : <WideTable {...props} rows={rows} sort={sort} />;
}

function sorted<Row>(rows: Row[], columns: Column<Row>[], sort: string): Row[] {
  const down = sort.startsWith("-");
  const value = columns.find((column) => column.id === sort.replace(/^-/, ""))?.sortBy;
  if (value === undefined) return rows;
  const compare = (a: Row, b: Row) => {
    const [left, right] = [value(a), value(b)];
    return typeof left === "number" && typeof right === "number"
      ? left - right
      : String(left).localeCompare(String(right), "en", { numeric: true });
  };
  return [...rows].sort((a, b) => (down ? compare(b, a) : compare(a, b)));
}

function WideTable<Row>(props: DataTableProps<Row> & { sort: string }) {
  const { columns, rows, rowId, rowLink, sort } = props;
  const totals = columns.some((column) => column.total !== undefined);
  return (
    <table className="w-full border-collapse text-left">
      <caption className={props.captionHidden === true ? "sr-only" : "pb-2 text-left text-sm text-iron"}>
        {props.caption}
      </caption>
      <thead className="sticky top-0 z-10 bg-paper">
        <tr className="shadow-[inset_0_-2px_0_var(--ink)]">
          {columns.map((column) => (
            <HeaderCell
              key={column.id}
              column={column}
              sort={sort}
              parameter={props.sortParameter ?? "sort"}
            />
          ))}
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <tr
            key={rowId(row)}
            className={classNames("border-b border-rule", rowLink !== undefined && "relative hover:bg-wash")}
          >
            {columns.map((column, index) =>
              index === 0 ? (
                <th key={column.id} scope="row" className="py-3 pr-4 align-top font-medium">
                  <RowName row={row} column={column} rowLink={rowLink} />
                </th>
              ) : (
                <td
                  key={column.id}
                  className={classNames("py-3 pr-4 align-top last:pr-1", alignment(column))}
                >
                  {column.cell(row)}
                </td>
              ),
            )}
          </tr>
        ))}
      </tbody>
      {totals && (
        <tfoot>
          <tr className="border-t-2 border-ink">
            {columns.map((column, index) =>
              index === 0 ? (
                <th key={column.id} scope="row" className="py-3 pr-4 text-left font-semibold">
                  {column.total ?? "Total"}
                </th>
              ) : (
                <td key={column.id} className={classNames("py-3 pr-4 last:pr-1", alignment(column))}>
                  {column.total}
                </td>
              ),
            )}
          </tr>
        </tfoot>
      )}
    </table>
  );
}

const alignment = <Row,>(column: Column<Row>) => (column.numeric === true ? "numerals text-right" : "");

interface HeaderCellProps<Row> {
  column: Column<Row>;
  sort: string;
  parameter: string;
}

function HeaderCell<Row>({ column, sort, parameter }: HeaderCellProps<Row>) {
  const [search] = useSearchParams();
  const direction = sort === column.id ? "ascending" : sort === `-${column.id}` ? "descending" : undefined;
  const look = classNames(
    "cell-label py-2 pr-4 align-bottom last:pr-1",
    column.numeric === true && "text-right",
  );
  if (column.sortBy === undefined) {
    return (
      <th scope="col" className={look}>
        <span className="inline-flex min-h-6 items-center">{column.header}</span>
      </th>
    );
  }
  const next = new URLSearchParams(search);
  next.set(parameter, direction === "ascending" ? `-${column.id}` : column.id);
  next.delete("page");
  return (
    <th scope="col" aria-sort={direction ?? "none"} className={look}>
      <Link
        to={{ search: next.toString() }}
        replace
        preventScrollReset
        className="inline-flex min-h-6 items-center gap-1 hover:text-ink hover:underline"
      >
        {column.header}
        <svg viewBox="0 0 8 12" aria-hidden="true" className="w-2">
          <path d="M0 5 4 0l4 5z" fill={direction === "ascending" ? "var(--dye)" : "var(--edge)"} />
          <path d="m0 7 4 5 4-5z" fill={direction === "descending" ? "var(--dye)" : "var(--edge)"} />
        </svg>
      </Link>
    </th>
  );
}

interface RowNameProps<Row> {
  row: Row;
  column: Column<Row>;
  rowLink: ((row: Row) => string) | undefined;
}

function RowName<Row>({ row, column, rowLink }: RowNameProps<Row>) {
  if (rowLink === undefined) return column.cell(row);
  return (
    <Link
      to={rowLink(row)}
      className="text-dye underline underline-offset-4 after:absolute after:inset-0 after:content-['']"
    >
      {column.cell(row)}
    </Link>
  );
}

function LabelledList<Row>({ caption, captionHidden, columns, rows, rowId, rowLink }: DataTableProps<Row>) {
  const [name, ...rest] = columns;
  if (name === undefined) return null;
  const totals = columns.filter((column) => column.total !== undefined);
  return (
    <div>
      <p className={captionHidden === true ? "sr-only" : "pb-2 text-sm text-iron"}>{caption}</p>
      <ul className="border-t-2 border-ink">
        {rows.map((row) => (
          <li key={rowId(row)} className="relative border-b border-rule py-3">
            <p className="text-lg font-medium">
              <RowName row={row} column={name} rowLink={rowLink} />
            </p>
            <Labelled entries={rest.map((column) => ({ column, value: column.cell(row) }))} />
          </li>
        ))}
      </ul>
      {totals.length > 0 && (
        <div className="border-b-2 border-ink py-3">
          <p className="font-semibold">Total</p>
          <Labelled
            entries={totals
              .filter((column) => column !== name)
              .map((column) => ({ column, value: column.total }))}
          />
        </div>
      )}
    </div>
  );
}

function Labelled<Row>({ entries }: { entries: { column: Column<Row>; value: ReactNode }[] }) {
  return (
    <dl className="mt-1 grid grid-cols-[auto_1fr] gap-x-4 gap-y-0.5">
      {entries.map(({ column, value }) => (
        <div key={column.id} className="col-span-2 grid grid-cols-subgrid items-baseline">
          <dt className="cell-label">{column.header}</dt>
          <dd className={classNames("text-right", column.numeric === true && "numerals")}>{value}</dd>
        </div>
      ))}
    </dl>
  );
}
