"use client";
import {
  createColumnHelper,
  type RowData,
  rowPaginationFeature,
  rowSortingFeature,
  tableFeatures,
  useTable,
} from "@tanstack/react-table";
import { type ReactNode, useMemo } from "react";
import { Button } from "./button";
import { classNames } from "./class-names";
import { Glyph } from "./glyph";

/** Sorting and paging are the server's; the table holds their state and draws it. */
const features = tableFeatures({ rowSortingFeature, rowPaginationFeature });

export interface DataColumn<Row> {
  id: string;
  header: string;
  cell: (row: Row) => ReactNode;
  /** Right-aligned with figures in columns. */
  numeric?: boolean;
  /** The server can order by this column. */
  sortable?: boolean;
  /** This cell names its row to a screen reader. */
  rowHeader?: boolean;
  /** What the foot says under this column: a total. */
  total?: ReactNode;
}

export interface TableSort {
  id: string;
  descending: boolean;
}

export interface DataTableProps<Row> {
  /** Names the table; read out, and seen with `showCaption`. */
  caption: string;
  showCaption?: boolean;
  columns: readonly DataColumn<Row>[];
  rows: readonly Row[];
  rowId: (row: Row) => string;
  sort?: TableSort | undefined;
  onSortChange?: (sort: TableSort) => void;
  /** `index` counts from 0. */
  page?: { index: number; size: number; total: number };
  onPageChange?: (index: number) => void;
  chosenId?: string | undefined;
  /** Stands in place of the rows when there are none. */
  empty?: ReactNode;
}

function toDefs<Row extends RowData>(columns: readonly DataColumn<Row>[]) {
  const helper = createColumnHelper<typeof features, Row>();
  return columns.map((column) =>
    helper.display({
      id: column.id,
      header: column.header,
      cell: ({ row }) => column.cell(row.original),
      enableSorting: true,
    }),
  );
}

/** An account-book table on server-ordered, server-paged rows. On a phone each row becomes a block of named lines. */
export function DataTable<Row extends RowData>(props: DataTableProps<Row>) {
  const { columns, rows, sort, page, empty } = props;
  const defs = useMemo(() => toDefs(columns), [columns]);
  const byId = useMemo(() => new Map(columns.map((column) => [column.id, column])), [columns]);
  const table = useTable({
    features,
    columns: defs,
    data: rows as Row[],
    getRowId: props.rowId,
    manualSorting: true,
    manualPagination: true,
    state: {
      sorting: sort ? [{ id: sort.id, desc: sort.descending }] : [],
      pagination: { pageIndex: page?.index ?? 0, pageSize: page?.size ?? Math.max(rows.length, 1) },
    },
  });
  if (rows.length === 0 && empty) return <>{empty}</>;
  return (
    <div className="acc-scroll">
      <table className="acc" data-stack="">
        <caption className={props.showCaption ? undefined : "vh"}>{props.caption}</caption>
        <thead>
          {table.getHeaderGroups().map((group) => (
            <tr key={group.id}>
              {group.headers.map((header) => {
                const column = byId.get(header.column.id);
                return (
                  column && (
                    <HeaderCell
                      key={header.id}
                      column={column}
                      sort={sort}
                      onSortChange={props.onSortChange}
                    />
                  )
                );
              })}
            </tr>
          ))}
        </thead>
        <tbody>
          {table.getRowModel().rows.map((row) => (
            <tr key={row.id} data-chosen={row.id === props.chosenId ? "" : undefined}>
              {row.getAllCells().map((cell) => {
                const column = byId.get(cell.column.id);
                const Cell = column?.rowHeader ? "th" : "td";
                return (
                  <Cell
                    key={cell.id}
                    scope={column?.rowHeader ? "row" : undefined}
                    className={column?.numeric ? "n" : undefined}
                    data-label={column?.header}
                  >
                    <table.FlexRender cell={cell} />
                  </Cell>
                );
              })}
            </tr>
          ))}
        </tbody>
        <TotalLine columns={columns} />
      </table>
      {page && <Pager page={page} onPageChange={props.onPageChange} />}
    </div>
  );
}

interface HeaderCellProps<Row> {
  column: DataColumn<Row>;
  sort: TableSort | undefined;
  onSortChange: ((sort: TableSort) => void) | undefined;
}

function HeaderCell<Row>({ column, sort, onSortChange }: HeaderCellProps<Row>) {
  const sorted = sort?.id === column.id ? (sort.descending ? "descending" : "ascending") : undefined;
  const next = { id: column.id, descending: sorted === "ascending" };
  return (
    <th scope="col" className={classNames(column.numeric && "n")} aria-sort={sorted}>
      {column.sortable && onSortChange ? (
        <button type="button" onClick={() => onSortChange(next)}>
          {column.header}
          {sorted && <Glyph name={sorted === "ascending" ? "up" : "down"} />}
        </button>
      ) : (
        column.header
      )}
    </th>
  );
}

function TotalLine<Row>({ columns }: { columns: readonly DataColumn<Row>[] }) {
  if (!columns.some((column) => column.total !== undefined)) return null;
  return (
    <tfoot>
      <tr>
        {columns.map((column) => (
          <td
            key={column.id}
            className={column.numeric ? "n" : undefined}
            data-label={column.total === undefined ? undefined : column.header}
          >
            {column.total}
          </td>
        ))}
      </tr>
    </tfoot>
  );
}

interface PagerProps {
  page: { index: number; size: number; total: number };
  onPageChange: ((index: number) => void) | undefined;
}

function Pager({ page, onPageChange }: PagerProps) {
  const first = page.index * page.size;
  const last = Math.min(first + page.size, page.total);
  if (page.total <= page.size) return null;
  return (
    <nav className="pager" aria-label="Pages">
      <Button size="small" disabled={page.index === 0} onClick={() => onPageChange?.(page.index - 1)}>
        Earlier rows
      </Button>
      <Button size="small" disabled={last >= page.total} onClick={() => onPageChange?.(page.index + 1)}>
        Later rows
      </Button>
      <span className="num" aria-live="polite">
        {first + 1} to {last} of {page.total}
      </span>
    </nav>
  );
}
