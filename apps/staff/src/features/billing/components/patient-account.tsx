"use client";
import { useQuery } from "@tanstack/react-query";
import type { PatientAccountView } from "@withy/contracts/billing";
import { shortDate } from "@withy/core/date-words";
import { formatMoney } from "@withy/core/money";
import { ButtonLink } from "@withy/ui/button";
import { type DataColumn, DataTable } from "@withy/ui/data-table";
import { EmptyState } from "@withy/ui/empty-state";
import Link from "next/link";
import { fetchPatientAccount } from "../api-client";
import { billingKeys } from "../query-keys";

type Row = PatientAccountView["invoices"][number];

interface PatientAccountProps {
  first: PatientAccountView;
  today: string;
}

function columns(today: string, account: PatientAccountView): DataColumn<Row>[] {
  const money = (pence: number) => formatMoney(pence).replace("£", "");
  return [
    {
      id: "reference",
      header: "Number",
      rowHeader: true,
      cell: (row) => <Link href={`/billing/invoices/${row.id}`}>{row.reference}</Link>,
      total: "Owed in all",
    },
    { id: "issued", header: "Issued", cell: (row) => shortDate(row.issuedOn, today) },
    { id: "due", header: "Due", cell: (row) => shortDate(row.dueOn, today) },
    { id: "payer", header: "Payer", cell: (row) => row.payerName ?? "patient" },
    { id: "total", header: "Total £", numeric: true, cell: (row) => money(row.totalPence) },
    {
      id: "owed",
      header: "Owed £",
      numeric: true,
      cell: (row) => money(row.owedPence),
      total: money(account.owedPence),
    },
    { id: "state", header: "State", cell: (row) => row.stateWord.toLowerCase() },
  ];
}

/** A patient's money: what is owed, what waits to be invoiced, and every invoice. */
export function PatientAccount({ first, today }: PatientAccountProps) {
  const { data: account } = useQuery({
    queryKey: billingKeys.account(first.patientId),
    queryFn: ({ signal }) => fetchPatientAccount(first.patientId, signal),
    initialData: first,
  });
  const overdue = account.overduePence > 0 ? `, ${formatMoney(account.overduePence)} of it overdue` : "";
  return (
    <section aria-label="Account">
      <p className="num">
        {account.owedPence === 0
          ? "Nothing is owed."
          : `${formatMoney(account.owedPence)} is owed${overdue}.`}{" "}
        {account.toInvoice > 0 && (
          <>
            {account.toInvoice} {account.toInvoice === 1 ? "visit waits" : "visits wait"} to be invoiced.{" "}
            <ButtonLink as={Link} href="/billing/drafts" kind="plain" size="small">
              Go to drafts
            </ButtonLink>
          </>
        )}
      </p>
      <DataTable
        caption="Invoices, newest first"
        columns={columns(today, account)}
        rows={account.invoices}
        rowId={(row) => row.id}
        empty={<EmptyState title="No invoice was issued for this patient." />}
      />
    </section>
  );
}
