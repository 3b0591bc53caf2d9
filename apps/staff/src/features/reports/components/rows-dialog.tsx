"use client";
import type { FigureRow, ListFigureRowsInput } from "@withy/contracts/reports";
import { plainDateWords } from "@withy/core/date-words";
import { formatMoney } from "@withy/core/money";
import { type DataColumn, DataTable } from "@withy/ui/data-table";
import { Dialog } from "@withy/ui/dialog";
import { EmptyState } from "@withy/ui/empty-state";
import { Money } from "@withy/ui/money";
import { Skeleton } from "@withy/ui/skeleton";
import Link from "next/link";
import { useState } from "react";
import { figureLabels, hoursWords } from "../figure-words";
import { useFigureRows } from "../hooks/use-figure-rows";
import type { FigureAsked } from "./figure-asked";

interface RowsDialogProps {
  asked: FigureAsked;
  input: ListFigureRowsInput;
  onClose: () => void;
}

/** The rows that a figure is made of, page by page, with their sum. */
export function RowsDialog({ asked, input, onClose }: RowsDialogProps) {
  const [page, setPage] = useState(1);
  const { data, error } = useFigureRows({ ...input, page });
  const name = figureLabels[asked.figure];
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={asked.who === undefined ? name : `${name}: ${asked.who}`}
      lead={data && sumWords(data)}
      size="wide"
      closeLabel="Close"
    >
      {error && (
        <p className="danger" role="alert">
          {error.message}
        </p>
      )}
      {!data && !error && <Skeleton lines={8} label="The rows are being read" />}
      {data && (
        <DataTable
          caption={`Rows of ${name}`}
          columns={columnsFor(data.sumPence !== null)}
          rows={data.rows}
          rowId={(row) => row.id}
          page={{ index: data.page - 1, size: data.pageSize, total: data.total }}
          onPageChange={(index) => setPage(index + 1)}
          empty={<EmptyState title="There are no rows in this month." />}
        />
      )}
    </Dialog>
  );
}

function sumWords({
  total,
  sumMinutes,
  sumPence,
}: {
  total: number;
  sumMinutes: number | null;
  sumPence: number | null;
}) {
  const rows = total === 1 ? "1 row" : `${total.toLocaleString("en-GB")} rows`;
  if (sumPence !== null) return `${rows}, ${formatMoney(sumPence)} in all`;
  return sumMinutes === null ? rows : `${rows}, ${hoursWords(sumMinutes)} hours in all`;
}

function columnsFor(isMoney: boolean): DataColumn<FigureRow>[] {
  return [
    {
      id: "when",
      header: "When",
      cell: (row) => (
        <span className="num nowrap">
          {plainDateWords(row.day)}
          {row.time !== null && `, ${row.time}`}
        </span>
      ),
    },
    { id: "title", header: "What", rowHeader: true, cell: (row) => <RowTitle row={row} /> },
    { id: "detail", header: "Detail", cell: (row) => row.detail },
    isMoney
      ? { id: "pence", header: "Amount", numeric: true, cell: (row) => <Money pence={row.pence ?? 0} /> }
      : { id: "minutes", header: "Minutes", numeric: true, cell: (row) => row.minutes ?? "" },
  ];
}

function RowTitle({ row }: { row: FigureRow }) {
  if (row.opens === null) return row.title;
  const href =
    row.opens.kind === "patient" ? `/patients/${row.opens.id}` : `/billing/invoices/${row.opens.id}`;
  return <Link href={href}>{row.title}</Link>;
}
