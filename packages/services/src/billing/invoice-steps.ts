import { paymentMethodWords } from "@withy/billing/check-payment";
import { owingStates } from "@withy/billing/invoice-states";
import type { InvoiceStepView } from "@withy/contracts/billing";
import { formatMoney } from "@withy/core/money";
import { dayOf, timeOf } from "@withy/core/zoned-time";
import { auditEvents, payments, refunds, staffMembers } from "@withy/db/schema";
import { and, eq, inArray } from "drizzle-orm";
import type { Context } from "../context";
import type { InvoiceRow } from "./load-invoice";

interface Step {
  readonly id: string;
  readonly at: Date;
  readonly said: string;
  readonly actorId: string | null;
}

type Detail = Readonly<Record<string, unknown>>;

const money = (detail: Detail): string => formatMoney(Number(detail.amountPence ?? 0));

/** Steps that leave no row of their own and are read from the audit. */
const sentences: Record<string, (detail: Detail, invoice: InvoiceRow) => string> = {
  "invoice.edited": () => "Draft changed",
  "invoice.voided": (_, invoice) => `Made void: ${invoice.voidReason ?? ""}`,
  "card-payment.started": (d) => `Card payment of ${money(d)} begun`,
  "card-payment.ended": (d) => `Card payment of ${money(d)} not made`,
};

function ownSteps(invoice: InvoiceRow): Step[] {
  const drafted = { id: "drafted", at: invoice.createdAt, said: "Drafted", actorId: invoice.createdBy };
  if (invoice.issuedAt === null) return [drafted];
  const said = `Issued as ${invoice.reference}, ${formatMoney(invoice.totalPence)}`;
  return [drafted, { id: "issued", at: invoice.issuedAt, said, actorId: invoice.issuedBy }];
}

async function moneySteps(ctx: Context, invoice: InvoiceRow): Promise<Step[]> {
  const taken = await ctx.db
    .select()
    .from(payments)
    .where(and(eq(payments.practiceId, ctx.practiceId), eq(payments.invoiceId, invoice.id)));
  const given = await ctx.db
    .select()
    .from(refunds)
    .where(and(eq(refunds.practiceId, ctx.practiceId), eq(refunds.invoiceId, invoice.id)));
  const inWords = { asked: "to go back by", done: "given back by", failed: "not given back by" };
  return [
    ...taken.map((p) => ({
      id: p.id,
      at: p.receivedAt,
      said: `${formatMoney(p.amountPence)} by ${paymentMethodWords[p.method]}`,
      actorId: p.takenBy,
    })),
    ...given.map((r) => ({
      id: r.id,
      at: r.refundedAt,
      said: `${formatMoney(r.amountPence)} ${inWords[r.state]} ${paymentMethodWords[r.method]}: ${r.reason}`,
      actorId: r.refundedBy,
    })),
  ];
}

async function auditedSteps(ctx: Context, invoice: InvoiceRow): Promise<Step[]> {
  const rows = await ctx.db
    .select()
    .from(auditEvents)
    .where(
      and(
        eq(auditEvents.practiceId, ctx.practiceId),
        eq(auditEvents.subjectKind, "invoice"),
        eq(auditEvents.subjectId, invoice.id),
      ),
    );
  return rows.flatMap((row) => {
    const said = sentences[row.action]?.(row.detail, invoice);
    return said === undefined ? [] : [{ id: row.id, at: row.at, said, actorId: row.actorId }];
  });
}

async function givenNames(ctx: Context, steps: readonly Step[]): Promise<Map<string, string>> {
  const ids = [...new Set(steps.flatMap((s) => (s.actorId === null ? [] : [s.actorId])))];
  if (ids.length === 0) return new Map();
  const rows = await ctx.db
    .select({ id: staffMembers.id, name: staffMembers.givenName })
    .from(staffMembers)
    .where(and(eq(staffMembers.practiceId, ctx.practiceId), inArray(staffMembers.id, ids)));
  return new Map(rows.map((row) => [row.id, row.name]));
}

/** The life of an invoice, oldest first, in the site's own time. */
export async function invoiceSteps(
  ctx: Context,
  invoice: InvoiceRow,
  zone: string,
): Promise<InvoiceStepView[]> {
  const all = [
    ...ownSteps(invoice),
    ...(await moneySteps(ctx, invoice)),
    ...(await auditedSteps(ctx, invoice)),
  ];
  // The sort is stable: what happened in one instant keeps the order of the list above.
  all.sort((a, b) => a.at.getTime() - b.at.getTime());
  const names = await givenNames(ctx, all);
  const steps = all.map(({ id, at, said, actorId }): InvoiceStepView => {
    const by = actorId === null ? null : (names.get(actorId) ?? null);
    return { id, on: dayOf(at, zone), time: timeOf(at, zone), said, by };
  });
  const today = dayOf(ctx.clock.now(), zone);
  const due = invoice.dueOn;
  if (due !== null && due < today && owingStates.includes(invoice.state)) {
    const at = steps.findIndex((step) => step.on > due);
    const fell = { id: "due", on: due, time: null, said: "Fell due", by: null };
    steps.splice(at < 0 ? steps.length : at, 0, fell);
  }
  return steps;
}
