import { type PaymentMethod, paymentMethodWords } from "@withy/billing/check-payment";
import { owingStates } from "@withy/billing/invoice-states";
import type { InvoiceStepView } from "@withy/contracts/billing";
import { formatMoney } from "@withy/core/money";
import { dayOf, timeOf } from "@withy/core/zoned-time";
import { auditEvents, staffMembers } from "@withy/db/schema";
import { and, asc, eq } from "drizzle-orm";
import type { Context } from "../context";
import type { InvoiceRow } from "./load-invoice";

type Detail = Readonly<Record<string, unknown>>;

const count = (n: unknown, one: string): string => `${n} ${one}${n === 1 ? "" : "s"}`;
const money = (detail: Detail): string => formatMoney(Number(detail.amountPence ?? 0));
const way = (detail: Detail): string => paymentMethodWords[detail.method as PaymentMethod] ?? "";

/** Each step in words, from the audit row that was written with it. Steps that are not listed are not shown. */
const sentences: Record<string, (detail: Detail, invoice: InvoiceRow) => string> = {
  "invoice.drafted": (d) => `Drafted from ${count(d.visits, "visit")}`,
  "invoice.edited": () => "Draft changed",
  "invoice.issued": (d) => `Issued as ${d.reference}`,
  "invoice.voided": (_, invoice) => `Made void: ${invoice.voidReason ?? ""}`,
  "payment.taken": (d) => `${money(d)} by ${way(d)}`,
  "card-payment.started": (d) => `Card payment of ${money(d)} begun`,
  "card-payment.ended": (d) => `Card payment of ${money(d)} not made`,
  "refund.asked": (d) => (d.method === "card" ? `${money(d)} to go back to the card` : ""),
  "refund.given": (d) => `${money(d)} given back by ${way(d)}`,
  "refund.failed": (d) => `${money(d)} could not go back to the card`,
};

/** The life of an invoice, oldest first, in the site's own time. */
export async function invoiceSteps(
  ctx: Context,
  invoice: InvoiceRow,
  zone: string,
): Promise<InvoiceStepView[]> {
  const rows = await ctx.db
    .select({
      id: auditEvents.id,
      at: auditEvents.at,
      action: auditEvents.action,
      detail: auditEvents.detail,
      by: staffMembers.givenName,
    })
    .from(auditEvents)
    .leftJoin(
      staffMembers,
      and(eq(staffMembers.practiceId, auditEvents.practiceId), eq(staffMembers.id, auditEvents.actorId)),
    )
    .where(
      and(
        eq(auditEvents.practiceId, ctx.practiceId),
        eq(auditEvents.subjectKind, "invoice"),
        eq(auditEvents.subjectId, invoice.id),
      ),
    )
    .orderBy(asc(auditEvents.at), asc(auditEvents.id));
  const steps = rows.flatMap((row): InvoiceStepView[] => {
    const said = sentences[row.action]?.(row.detail, invoice) ?? "";
    if (said === "") return [];
    return [{ id: row.id, on: dayOf(row.at, zone), time: timeOf(row.at, zone), said, by: row.by }];
  });
  const today = dayOf(ctx.clock.now(), zone);
  if (invoice.dueOn !== null && invoice.dueOn < today && owingStates.includes(invoice.state)) {
    const due = invoice.dueOn;
    const at = steps.findIndex((step) => step.on > due);
    steps.splice(at < 0 ? steps.length : at, 0, {
      id: "due",
      on: due,
      time: null,
      said: "Fell due",
      by: null,
    });
  }
  return steps;
}
