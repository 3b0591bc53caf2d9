"use client";
import type { LookView } from "@withy/contracts/patients";
import { type DataColumn, DataTable } from "@withy/ui/data-table";
import { Skeleton } from "@withy/ui/skeleton";
import { useState } from "react";
import { useWhoLooked } from "../hooks/use-who-looked";
import { dayAndYear } from "../short-day";

const columns: readonly DataColumn<LookView>[] = [
  {
    id: "when",
    header: "When",
    rowHeader: true,
    cell: (row) => (
      <span className="num">
        {dayAndYear(row.day)}, {row.time}
      </span>
    ),
  },
  { id: "who", header: "Who", cell: (row) => row.staffName },
  { id: "job", header: "Works as", cell: (row) => row.jobTitle },
  { id: "what", header: "What", cell: (row) => row.action.replace(/[.-]/g, " ") },
];

/** Who opened or changed the record, newest first. */
export function LooksList({ patientId }: { patientId: string }) {
  const [page, setPage] = useState(1);
  const { data, error } = useWhoLooked(patientId, page);
  if (error) return <p className="danger">{error.message}</p>;
  if (!data) return <Skeleton lines={8} label="The list is being read" />;
  return (
    <DataTable
      caption="Who opened or changed this record"
      columns={columns}
      rows={data.rows}
      rowId={(row) => row.id}
      page={{ index: data.page - 1, size: data.pageSize, total: data.total }}
      onPageChange={(index) => setPage(index + 1)}
    />
  );
}
