import { type DraftedView, draftInvoicesInput } from "@withy/contracts/billing";
import { newId } from "@withy/core/ids";
import { isDuplicate } from "@withy/db/database-error";
import { invoiceLines, invoices } from "@withy/db/schema";
import { and, eq, isNull, max } from "drizzle-orm";
import { recordAudit } from "../audit";
import type { Context } from "../context";
import { loadRecord } from "../load-record";
import { inTransaction } from "../transaction";
import { verb } from "../verb";
import { billToOf } from "./bill-to";
import type { InvoiceRow } from "./load-invoice";
import { loadPractice } from "./load-practice";
import { reckonDraft } from "./reckon-draft";
import { type VisitToInvoice, visitsToInvoice } from "./visits-to-invoice";

/**
 * Puts every attended visit that waits onto a draft: one for each patient, payer and site, the open one if there
 * is one. Running it again, or twice at once, adds nothing: a visit stands on one line only.
 */
export const draftInvoicesFromVisits = verb(
  "billing.draft",
  draftInvoicesInput,
  async (ctx, wish): Promise<DraftedView> => {
    const visits = await visitsToInvoice(ctx, wish);
    const priced = visits.filter((v) => v.price !== null);
    const groups = new Map<string, VisitToInvoice[]>();
    for (const visit of priced) {
      const key = `${visit.patientId} ${visit.payerId} ${visit.siteId}`;
      groups.set(key, [...(groups.get(key) ?? []), visit]);
    }
    const invoiceIds: string[] = [];
    let visitsDrafted = 0;
    for (const group of groups.values()) {
      const id = await draftOne(ctx, group);
      if (id === null) continue;
      invoiceIds.push(id);
      visitsDrafted += group.length;
    }
    return { invoiceIds, visitsDrafted, visitsWithoutPrice: visits.length - priced.length };
  },
);

async function draftOne(ctx: Context, visits: readonly VisitToInvoice[]): Promise<string | null> {
  try {
    return await inTransaction(ctx, (tx) => writeDraft(tx, visits));
  } catch (error) {
    // Someone else drafted one of these visits meanwhile; what is left waits for the next run.
    if (isDuplicate(error, "invoice_lines_visit_once")) return null;
    throw error;
  }
}

async function writeDraft(tx: Context, visits: readonly VisitToInvoice[]): Promise<string | null> {
  const [first] = visits;
  if (!first) return null;
  const draft = await openDraft(tx, first);
  const [last] = await tx.db
    .select({ position: max(invoiceLines.position) })
    .from(invoiceLines)
    .where(and(eq(invoiceLines.practiceId, tx.practiceId), eq(invoiceLines.invoiceId, draft.id)));
  const from = (last?.position ?? 0) + 1;
  await tx.db.insert(invoiceLines).values(
    visits.flatMap((visit, i) => {
      if (!visit.price) return [];
      return {
        practiceId: tx.practiceId,
        id: newId(),
        invoiceId: draft.id,
        position: from + i,
        kind: "visit" as const,
        appointmentId: visit.appointmentId,
        description: `${visit.serviceName}, ${visit.minutes} minutes`,
        unitPence: visit.price.amountPence,
        vatTreatment: visit.price.vatTreatment,
        vatBasisPoints: 0,
        netPence: 0,
        vatPence: 0,
        totalPence: 0,
      };
    }),
  );
  await reckonDraft(tx, draft);
  await recordAudit(tx, {
    action: "invoice.drafted",
    subjectKind: "invoice",
    subjectId: draft.id,
    patientId: draft.patientId,
    siteId: draft.siteId,
    detail: { visits: visits.length },
  });
  return draft.id;
}

async function openDraft(tx: Context, visit: VisitToInvoice): Promise<InvoiceRow> {
  const [open] = await tx.db
    .select()
    .from(invoices)
    .where(
      and(
        eq(invoices.practiceId, tx.practiceId),
        eq(invoices.patientId, visit.patientId),
        eq(invoices.siteId, visit.siteId),
        eq(invoices.state, "draft"),
        visit.payerId === null ? isNull(invoices.payerId) : eq(invoices.payerId, visit.payerId),
      ),
    )
    .limit(1)
    .for("update");
  if (open) return open;
  const practice = await loadPractice(tx);
  const now = tx.clock.now();
  const id = newId();
  await tx.db.insert(invoices).values({
    practiceId: tx.practiceId,
    id,
    patientId: visit.patientId,
    payerId: visit.payerId,
    siteId: visit.siteId,
    billTo: await billToOf(tx, visit),
    vatRounding: practice.vatRounding,
    vatNumber: practice.vatNumber,
    createdAt: now,
    createdBy: tx.staffMemberId,
    updatedAt: now,
  });
  return loadRecord(tx, invoices, id, "invoice");
}
