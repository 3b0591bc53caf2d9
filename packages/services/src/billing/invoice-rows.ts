import { daysPastDue } from "@withy/billing/ageing";
import { invoiceStateWords } from "@withy/billing/invoice-states";
import type { InvoiceRowView, InvoiceSumsView } from "@withy/contracts/billing";
import type { PlainDateText } from "@withy/core/zoned-time";
import { invoices, patients, payers, sites } from "@withy/db/schema";
import { and, asc, desc, eq, type SQL, sql } from "drizzle-orm";
import type { Context } from "../context";
import { owedColumn } from "./invoice-filter";

const ofPatient = and(eq(patients.practiceId, invoices.practiceId), eq(patients.id, invoices.patientId));

interface Slice {
  readonly isOldestDueFirst: boolean;
  readonly limit: number;
  readonly offset: number;
}

/** One slice of a list of issued invoices: oldest due first where money is owed, otherwise newest first. */
export async function invoiceRows(
  ctx: Context,
  where: SQL | undefined,
  today: PlainDateText,
  slice: Slice,
): Promise<InvoiceRowView[]> {
  const order = slice.isOldestDueFirst
    ? [asc(invoices.dueOn), asc(invoices.number)]
    : [desc(invoices.issuedOn), desc(invoices.number)];
  const rows = await ctx.db
    .select({
      invoice: invoices,
      givenName: patients.givenName,
      familyName: patients.familyName,
      payerName: payers.name,
      siteName: sites.name,
      owedPence: owedColumn,
    })
    .from(invoices)
    .innerJoin(patients, ofPatient)
    .innerJoin(sites, and(eq(sites.practiceId, invoices.practiceId), eq(sites.id, invoices.siteId)))
    .leftJoin(payers, and(eq(payers.practiceId, invoices.practiceId), eq(payers.id, invoices.payerId)))
    .where(where)
    .orderBy(...order)
    .limit(slice.limit)
    .offset(slice.offset);
  return rows.map(({ invoice, givenName, familyName, payerName, siteName, owedPence }) => {
    const { id, patientId, totalPence, paidPence, state } = invoice;
    const issuedOn = invoice.issuedOn ?? today;
    const dueOn = invoice.dueOn ?? today;
    const names = { patientName: `${givenName} ${familyName}`, payerName, siteName };
    const sums = { totalPence, paidPence, owedPence, daysPastDue: daysPastDue(dueOn, today) };
    const stateWord =
      owedPence > 0 && dueOn < today && state === "issued" ? "Overdue" : invoiceStateWords[state];
    return {
      id,
      reference: invoice.reference ?? "",
      issuedOn,
      dueOn,
      patientId,
      ...names,
      ...sums,
      state,
      stateWord,
    };
  });
}

/** Count and sums of the whole filter. */
export async function invoiceSums(ctx: Context, where: SQL | undefined): Promise<InvoiceSumsView> {
  const [row] = await ctx.db
    .select({
      count: sql<string>`count(*)`,
      total: sql<string | null>`sum(${invoices.totalPence})`,
      paid: sql<string | null>`sum(${invoices.paidPence})`,
      owed: sql<string | null>`sum(${owedColumn})`,
    })
    .from(invoices)
    .innerJoin(patients, ofPatient)
    .where(where);
  return {
    count: Number(row?.count ?? 0),
    totalPence: Number(row?.total ?? 0),
    paidPence: Number(row?.paid ?? 0),
    owedPence: Number(row?.owed ?? 0),
  };
}
