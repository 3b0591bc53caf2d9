import { draftKey } from "@withy/billing/draft-groups";
import { notFound } from "@withy/core/errors";
import { newId } from "@withy/core/ids";
import { type InvoiceAddress, invoiceLines, invoices } from "@withy/db/schema";
import { and, eq } from "drizzle-orm";
import { recordAudits } from "../audit";
import type { Context } from "../context";
import { billTosOf } from "./bill-to";
import type { InvoiceRow } from "./load-invoice";
import type { PracticeRow } from "./load-practice";
import { drafted, linesByDraft, lockOpenDrafts, visitLine } from "./open-drafts";
import { type LineRow, reckonLines, writeLineSums } from "./reckon-draft";
import type { PricedVisit } from "./visits-to-invoice";

export interface WrittenDrafts {
  readonly invoiceIds: readonly string[];
  readonly visitsDrafted: number;
}

/** One draft as it shall stand. `open` is the row that was there, or null for a new one. */
interface Plan {
  readonly id: string;
  readonly visit: PricedVisit;
  readonly open: InvoiceRow | null;
  readonly before: readonly LineRow[];
  readonly added: number;
  readonly reckoned: ReturnType<typeof reckonLines<LineRow>>;
}

/**
 * Puts groups of visits on their drafts in a handful of statements, however many groups there are. A visit that
 * stands on a line by now is left out; one that somebody else is writing at this moment makes the unique key
 * `invoice_lines_visit_once` fail, and with it the whole transaction.
 * @param groups one for each draft, none empty
 */
export async function writeDrafts(
  tx: Context,
  practice: PracticeRow,
  groups: readonly (readonly PricedVisit[])[],
): Promise<WrittenDrafts> {
  const open = await lockOpenDrafts(tx, groups.flat());
  const lines = await linesByDraft(tx, [...open.values()]);
  const done = await drafted(
    tx,
    groups.flat().map((v) => v.appointmentId),
  );
  const plans = groups.flatMap((group) => {
    const waiting = group.filter((v) => !done.has(v.appointmentId));
    const [visit] = waiting;
    if (!visit) return [];
    return [planDraft(tx, practice, waiting, visit, open.get(draftKey(visit)) ?? null, lines)];
  });
  await writeInvoices(tx, plans);
  const added = plans.flatMap((p) => p.reckoned.lines.slice(p.before.length));
  if (added.length > 0) await tx.db.insert(invoiceLines).values(added);
  await recordAudits(
    tx,
    plans.map(({ id, visit, added: visits }) => ({
      action: "invoice.drafted",
      subjectKind: "invoice",
      subjectId: id,
      patientId: visit.patientId,
      siteId: visit.siteId,
      detail: { visits },
    })),
  );
  return { invoiceIds: plans.map((p) => p.id), visitsDrafted: added.length };
}

function planDraft(
  tx: Context,
  practice: PracticeRow,
  visits: readonly PricedVisit[],
  visit: PricedVisit,
  open: InvoiceRow | null,
  lines: ReadonlyMap<string, readonly LineRow[]>,
): Plan {
  const id = open?.id ?? newId();
  const before = lines.get(id) ?? [];
  const from = (before.at(-1)?.position ?? 0) + 1;
  const added = visits.map((v, i) => visitLine(tx, id, from + i, v, v.price));
  const reckoned = reckonLines([...before, ...added], practice);
  return { id, visit, open, before, added: added.length, reckoned };
}

async function writeInvoices(tx: Context, plans: readonly Plan[]): Promise<void> {
  const now = tx.clock.now();
  const fresh = plans.filter((p) => p.open === null);
  const billTos = await billTosOf(
    tx,
    fresh.map((p) => p.visit),
  );
  const made = { createdAt: now, createdBy: tx.staffMemberId, updatedAt: now };
  const rows = fresh.map(({ id, visit: { patientId, payerId, siteId }, reckoned }) => {
    const billTo = addressIn(billTos, payerId ?? patientId);
    return {
      practiceId: tx.practiceId,
      id,
      patientId,
      payerId,
      siteId,
      billTo,
      ...reckoned.invoice,
      ...made,
    };
  });
  if (rows.length > 0) await tx.db.insert(invoices).values(rows);
  for (const { open, before, reckoned } of plans) {
    if (!open) continue;
    await writeLineSums(tx, before, reckoned.lines.slice(0, before.length));
    await tx.db
      .update(invoices)
      .set({ ...reckoned.invoice, version: open.version + 1, updatedAt: now })
      .where(and(eq(invoices.practiceId, tx.practiceId), eq(invoices.id, open.id)));
  }
}

function addressIn(billTos: ReadonlyMap<string, InvoiceAddress>, id: string): InvoiceAddress {
  const address = billTos.get(id);
  if (!address) throw notFound("payer");
  return address;
}
