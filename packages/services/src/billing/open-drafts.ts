import { type DraftGroupKey, draftKey } from "@withy/billing/draft-groups";
import { newId } from "@withy/core/ids";
import { invoiceLines, invoices } from "@withy/db/schema";
import { and, asc, eq, inArray } from "drizzle-orm";
import type { Context } from "../context";
import type { InvoiceRow } from "./load-invoice";
import type { LineRow } from "./reckon-draft";

/** The open drafts that these visits may go on, locked, by the rule's key. */
export async function lockOpenDrafts(
  tx: Context,
  visits: readonly DraftGroupKey[],
): Promise<Map<string, InvoiceRow>> {
  const patientIds = [...new Set(visits.map((v) => v.patientId))];
  const rows = await tx.db
    .select()
    .from(invoices)
    .where(
      and(
        eq(invoices.practiceId, tx.practiceId),
        eq(invoices.state, "draft"),
        inArray(invoices.patientId, patientIds),
      ),
    )
    .orderBy(asc(invoices.id))
    .for("update");
  const open = new Map<string, InvoiceRow>();
  // Where there are two, the older one grows.
  for (const row of rows) if (!open.has(draftKey(row))) open.set(draftKey(row), row);
  return open;
}

/** The lines that stand on these drafts already, by draft, in their order. */
export async function linesByDraft(
  tx: Context,
  drafts: readonly InvoiceRow[],
): Promise<Map<string, LineRow[]>> {
  const found = new Map<string, LineRow[]>(drafts.map(({ id }) => [id, []]));
  if (drafts.length === 0) return found;
  const ofThese = and(
    eq(invoiceLines.practiceId, tx.practiceId),
    inArray(invoiceLines.invoiceId, [...found.keys()]),
  );
  const rows = await tx.db.select().from(invoiceLines).where(ofThese).orderBy(asc(invoiceLines.position));
  for (const row of rows) found.get(row.invoiceId)?.push(row);
  return found;
}

/** Which of these visits stand on a line by now. */
export async function drafted(tx: Context, appointmentIds: readonly string[]): Promise<Set<string>> {
  const rows = await tx.db
    .select({ appointmentId: invoiceLines.appointmentId })
    .from(invoiceLines)
    .where(
      and(
        eq(invoiceLines.practiceId, tx.practiceId),
        inArray(invoiceLines.appointmentId, [...appointmentIds]),
      ),
    );
  return new Set(rows.flatMap((row) => row.appointmentId ?? []));
}

/** A finished line but for its sums. */
export function visitLine(
  tx: Context,
  invoiceId: string,
  position: number,
  visit: { appointmentId: string; serviceName: string; minutes: number },
  price: { amountPence: number; vatTreatment: string },
): LineRow {
  return {
    practiceId: tx.practiceId,
    id: newId(),
    invoiceId,
    position,
    kind: "visit",
    appointmentId: visit.appointmentId,
    productId: null,
    description: `${visit.serviceName}, ${visit.minutes} minutes`,
    quantity: 1,
    unitPence: price.amountPence,
    discountBasisPoints: 0,
    vatTreatment: price.vatTreatment,
    vatBasisPoints: 0,
    netPence: 0,
    vatPence: 0,
    totalPence: 0,
  };
}
