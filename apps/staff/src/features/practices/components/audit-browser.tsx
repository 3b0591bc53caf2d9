"use client";
import type { AuditRow, ListAuditInput } from "@withy/contracts/audit";
import { auditSubjects } from "@withy/contracts/audit-subjects";
import { type DataColumn, DataTable } from "@withy/ui/data-table";
import { EmptyState } from "@withy/ui/empty-state";
import { FieldRow } from "@withy/ui/field-group";
import { Select } from "@withy/ui/select";
import { Skeleton } from "@withy/ui/skeleton";
import Link from "next/link";
import { useState } from "react";
import { useAudit } from "../hooks/use-audit";
import { AuditDays } from "./audit-days";

const columns: readonly DataColumn<AuditRow>[] = [
  {
    id: "when",
    header: "When",
    rowHeader: true,
    cell: (row) => (
      <span className="num nowrap">
        {row.day} {row.time}
      </span>
    ),
  },
  { id: "who", header: "Who", cell: (row) => row.actorName },
  { id: "what", header: "What", cell: (row) => row.action.replace(/[.-]/g, " ") },
  {
    id: "patient",
    header: "Patient",
    cell: (row) =>
      row.patientId !== null && (
        <Link href={`/patients/${row.patientId}`}>{row.patientName ?? "a patient"}</Link>
      ),
  },
  { id: "site", header: "Site", cell: (row) => row.siteName ?? "" },
  {
    id: "detail",
    header: "Detail",
    cell: (row) => <span className="soft auditdetail">{detailWords(row.detail)}</span>,
  },
];

interface Props {
  staff: readonly { id: string; name: string }[];
  /** Narrowed to one patient, as a record's own link does. */
  patientId: string | null;
  today: string;
}

/** Who did what, by person, subject and days. */
export function AuditBrowser({ staff, patientId, today }: Props) {
  const [filter, setFilter] = useState<ListAuditInput>({ ...(patientId === null ? {} : { patientId }) });
  const { data, error } = useAudit(filter);
  const narrow = (change: ListAuditInput) => setFilter((before) => ({ ...before, ...change, page: 1 }));
  return (
    <>
      <div className="auditfilter">
        <FieldRow>
          <Select
            id="actor"
            label="Who"
            placeholder="Anyone"
            options={staff.map((s) => ({ value: s.id, label: s.name }))}
            onChange={(event) => narrow({ actorId: event.target.value })}
          />
          <Select
            id="subject"
            label="About"
            placeholder="Anything"
            options={auditSubjects.map((s) => ({ value: s, label: s.replace("-", " ") }))}
            onChange={(event) => narrow({ subjectKind: event.target.value as "patient" })}
          />
          <AuditDays today={today} onChange={narrow} />
        </FieldRow>
      </div>
      {error && (
        <p className="danger" role="alert">
          {error.message}
        </p>
      )}
      {!data && !error && <Skeleton lines={10} label="The events are being read" />}
      {data && (
        <>
          <p className="small soft" role="status">
            {data.isCutShort
              ? `More than ${data.total.toLocaleString("en-GB")} events. Narrow the days to reach older ones.`
              : `${data.total.toLocaleString("en-GB")} events`}
          </p>
          <DataTable
            caption="Events, newest first"
            columns={columns}
            rows={data.rows}
            rowId={(row) => row.id}
            page={{ index: data.page - 1, size: data.pageSize, total: data.total }}
            onPageChange={(index) => setFilter((before) => ({ ...before, page: index + 1 }))}
            empty={
              <EmptyState title="Nothing happened that fits.">Widen the days, or choose anyone.</EmptyState>
            }
          />
        </>
      )}
    </>
  );
}

function detailWords(detail: Readonly<Record<string, unknown>>): string {
  return Object.entries(detail)
    .map(([name, value]) => `${name}: ${typeof value === "object" ? JSON.stringify(value) : String(value)}`)
    .join(", ");
}
