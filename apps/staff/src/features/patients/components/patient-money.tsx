"use client";
import type { InvoiceRowView, PatientAccountView } from "@withy/contracts/billing";
import { formatMoney } from "@withy/core/money";
import { type DataColumn, DataTable } from "@withy/ui/data-table";
import { EmptyState } from "@withy/ui/empty-state";
import { Money } from "@withy/ui/money";
import { SectionHead } from "@withy/ui/section-head";
import Link from "next/link";
import { dayAndYear } from "../short-day";

const columns: readonly DataColumn<InvoiceRowView>[] = [
  {
    id: "reference",
    header: "Invoice",
    rowHeader: true,
    cell: (row) => <Link href={`/billing/invoices/${row.id}`}>{row.reference}</Link>,
  },
  { id: "issued", header: "Issued", cell: (row) => dayAndYear(row.issuedOn) },
  { id: "due", header: "Due", cell: (row) => dayAndYear(row.dueOn) },
  { id: "payer", header: "Who pays", cell: (row) => row.payerName ?? row.patientName },
  { id: "site", header: "Site", cell: (row) => row.siteName },
  { id: "state", header: "State", cell: (row) => row.stateWord },
  { id: "total", header: "Total", numeric: true, cell: (row) => <Money pence={row.totalPence} /> },
  { id: "paid", header: "Paid", numeric: true, cell: (row) => <Money pence={row.paidPence} /> },
  { id: "owed", header: "Owed", numeric: true, cell: (row) => <Money pence={row.owedPence} strong /> },
];

/** A patient's invoices and what is owed on them. */
export function PatientMoney({ account }: { account: PatientAccountView }) {
  const { invoices, owedPence, overduePence, toInvoice } = account;
  const waiting = toInvoice === 1 ? "1 attended visit waits" : `${toInvoice} attended visits wait`;
  return (
    <>
      <SectionHead
        title="Money"
        aside={
          owedPence === 0
            ? "nothing is owed"
            : `${formatMoney(owedPence)} owed, ${formatMoney(overduePence)} of it overdue`
        }
      />
      {toInvoice > 0 && (
        <p className="small">
          {waiting} for an invoice. <Link href="/billing/drafts">Draft invoices</Link>
        </p>
      )}
      <DataTable
        caption="Invoices of this patient"
        columns={columns}
        rows={invoices}
        rowId={(row) => row.id}
        empty={
          <EmptyState title="No invoice yet.">Attended visits become invoices under Accounts.</EmptyState>
        }
      />
    </>
  );
}
