import { formatInvoiceNumber, usualDigits } from "@withy/billing/invoice-number";
import { invoiceTotals, usualVatRounding } from "@withy/billing/invoice-totals";
import { vatBasisPoints } from "@withy/billing/vat";
import { addDays, instantAt } from "@withy/core/zoned-time";
import type { Connection } from "mysql2/promise";
import { invoiceCounters, invoiceLines, invoices, payments, refunds } from "../schema";
import { insertRows } from "./insert-rows";
import { type InvoicePlan, planInvoices } from "./plan-invoices";
import { type House, notAfterNow, type Stage } from "./stage";
import type { Course } from "./visit";

type InvoiceRow = typeof invoices.$inferInsert;

export interface Books {
  drafts: InvoiceRow[];
  issued: InvoiceRow[];
  lines: (typeof invoiceLines.$inferInsert)[];
  payments: (typeof payments.$inferInsert)[];
  refunds: (typeof refunds.$inferInsert)[];
}

/** Adds up the planned invoices, numbers them in the order of their issue, and lets most of them be paid. */
export function planBooks(stage: Stage, house: House, courses: readonly Course[]): Books {
  const books: Books = { drafts: [], issued: [], lines: [], payments: [], refunds: [] };
  const plans = planInvoices(stage, house, courses).sort((a, b) =>
    (a.issuedOn ?? "9").localeCompare(b.issuedOn ?? "9"),
  );
  let number = 0;
  for (const plan of plans) {
    const draft = draftOf(stage, house, plan);
    books.drafts.push(draft);
    books.lines.push(...linesOf(stage, house, plan, draft));
    if (plan.issuedOn === null) continue;
    number += 1;
    books.issued.push(issue(stage, house, plan, draft, number, books));
  }
  const counter = stage.rows.of(invoiceCounters).find((row) => row.practiceId === house.practiceId);
  if (counter) counter.nextNumber = number + 1;
  return books;
}

/** Lines go onto drafts only, so an invoice is written as a draft, then its lines, then issued and paid. */
export async function writeBooks(connection: Connection, books: Books): Promise<void> {
  await insertRows(connection, invoices, books.drafts);
  await insertRows(connection, invoiceLines, books.lines);
  await insertRows(connection, invoices, books.issued, [
    "number",
    "reference",
    "state",
    "issuedOn",
    "dueOn",
    "issuedAt",
    "issuedBy",
    "paidPence",
    "creditedPence",
    "version",
    "updatedAt",
  ]);
  await insertRows(connection, payments, books.payments);
  await insertRows(connection, refunds, books.refunds);
}

const isRegistered = (house: House) => house.plan.vatNumber !== null;

function totalsOf(house: House, plan: InvoicePlan) {
  const lines = plan.lines.map((line) => ({
    quantity: 1,
    unitPricePence: line.unitPence,
    isVatInclusive: false,
    discount: null,
    vatTreatment: line.vatTreatment,
  }));
  return invoiceTotals(lines, usualVatRounding, isRegistered(house));
}

function draftOf(stage: Stage, house: House, plan: InvoicePlan): InvoiceRow {
  const totals = totalsOf(house, plan);
  const payer = house.payers.find((row) => row.id === plan.payerId);
  const { patient } = plan;
  const at = instantAt(plan.issuedOn ?? stage.today, "17:30", stage.zone) ?? stage.now;
  const createdAt = notAfterNow(stage, at);
  return {
    practiceId: house.practiceId,
    id: stage.newId(),
    patientId: patient.id,
    payerId: plan.payerId,
    siteId: plan.siteId,
    state: "draft",
    billTo: payer
      ? {
          name: payer.name,
          addressLines: payer.addressLines,
          postcode: payer.postcode,
          email: payer.email ?? null,
        }
      : {
          name: `${patient.givenName} ${patient.familyName}`,
          addressLines: patient.addressLines,
          postcode: patient.postcode ?? null,
          email: patient.email ?? null,
        },
    netPence: totals.netPence,
    vatPence: totals.vatPence,
    totalPence: totals.grossPence,
    vatRounding: "line-nearest",
    vatNumber: house.plan.vatNumber,
    createdAt,
    createdBy: stage.random.pick(house.desk).id,
    updatedAt: createdAt,
  };
}

function linesOf(stage: Stage, house: House, plan: InvoicePlan, invoice: InvoiceRow) {
  const totals = totalsOf(house, plan);
  return plan.lines.map((line, i) => ({
    practiceId: house.practiceId,
    id: stage.newId(),
    invoiceId: invoice.id,
    position: i + 1,
    kind: line.visit ? ("visit" as const) : ("product" as const),
    appointmentId: line.visit?.id ?? null,
    productId: line.productId,
    description: line.description,
    unitPence: line.unitPence,
    vatTreatment: line.vatTreatment,
    vatBasisPoints: isRegistered(house) ? vatBasisPoints[line.vatTreatment] : 0,
    netPence: totals.lines[i]?.netPence ?? 0,
    vatPence: totals.lines[i]?.vatPence ?? 0,
    totalPence: totals.lines[i]?.grossPence ?? 0,
  }));
}

function issue(
  stage: Stage,
  house: House,
  plan: InvoicePlan,
  draft: InvoiceRow,
  number: number,
  books: Books,
): InvoiceRow {
  const issuedOn = plan.issuedOn ?? stage.today;
  const issued: InvoiceRow = {
    ...draft,
    state: "issued",
    number,
    reference: formatInvoiceNumber({ prefix: house.plan.invoicePrefix, digits: usualDigits }, number),
    issuedOn,
    dueOn: addDays(issuedOn, plan.paymentDays),
    issuedAt: draft.createdAt,
    issuedBy: draft.createdBy,
    version: 2,
  };
  const total = draft.totalPence ?? 0;
  const paidOn = whenPaid(stage, plan, issuedOn);
  if (paidOn === null) return issued;
  const isPart = stage.random.chance(0.03) && total > 2_000;
  const amountPence = isPart ? Math.floor(total / 200) * 100 : total;
  const at = instantAt(paidOn, "17:35", stage.zone) ?? stage.now;
  const receivedAt = notAfterNow(stage, at);
  const payment = {
    practiceId: house.practiceId,
    id: stage.newId(),
    invoiceId: draft.id,
    siteId: plan.siteId,
    amountPence,
    method: plan.payerId
      ? ("bank" as const)
      : stage.random.pick(["terminal", "terminal", "terminal", "cash", "bank"] as const),
    reference: plan.payerId ? `REM ${stage.random.int(10_000, 99_999)}` : null,
    receivedAt,
    takenBy: stage.random.pick(house.desk).id,
    refundedPence: 0,
  };
  books.payments.push(payment);
  if (!isPart && plan.payerId === null && stage.random.chance(0.006)) {
    payment.refundedPence = amountPence;
    books.refunds.push({
      practiceId: house.practiceId,
      id: stage.newId(),
      paymentId: payment.id,
      invoiceId: draft.id,
      amountPence,
      reason: "Visit cut short, good will",
      method: payment.method,
      state: "done",
      refundedAt: receivedAt,
      refundedBy: payment.takenBy,
    });
    return { ...issued, state: "refunded", paidPence: 0, creditedPence: amountPence, version: 4 };
  }
  return {
    ...issued,
    state: isPart ? "part-paid" : "paid",
    paidPence: amountPence,
    version: 3,
    updatedAt: receivedAt,
  };
}

/** Most people pay at the desk, most payers within their time; the rest is what accounts chase. */
function whenPaid({ random, today }: Stage, plan: InvoicePlan, issuedOn: string): string | null {
  const wanted =
    plan.payerId === null
      ? random.chance(0.86)
        ? issuedOn
        : addDays(issuedOn, random.int(4, 60))
      : addDays(issuedOn, random.int(14, 75));
  if (random.chance(plan.payerId === null ? 0.02 : 0.12)) return null;
  return wanted <= today ? wanted : null;
}
