import type { addWaitingEntryInput, waitingWishesField } from "@withy/contracts/diary";
import { can } from "@withy/core/access/can";
import { notFound, refused, stale } from "@withy/core/errors";
import { refusal } from "@withy/core/refusal";
import { appointments, services, sites, staffMembers, waitingEntries } from "@withy/db/schema";
import { stateFacts } from "@withy/diary/appointment-states";
import type { WaitingWishes } from "@withy/diary/waiting-match";
import { and, eq, inArray } from "drizzle-orm";
import type { z } from "zod";
import { recordAudit } from "../audit";
import type { Context } from "../context";
import { loadRecord } from "../load-record";

export type EntryRow = typeof waitingEntries.$inferSelect;
type Fields = Omit<z.output<typeof addWaitingEntryInput>, "patientId">;

/** The wishes without those that are empty, as they are kept. */
function keptWishes(w: z.output<typeof waitingWishesField>): WaitingWishes {
  return {
    ...(w.weekdays.length > 0 ? { weekdays: [...new Set(w.weekdays)].sort() } : {}),
    ...(w.partsOfDay.length > 0 ? { partsOfDay: [...new Set(w.partsOfDay)] } : {}),
    ...(w.siteIds.length > 0 ? { siteIds: [...new Set(w.siteIds)] } : {}),
    ...(w.therapistIds.length > 0 ? { therapistIds: [...new Set(w.therapistIds)] } : {}),
    ...(w.latestOn === null ? {} : { latestOn: w.latestOn }),
    ...(w.noticeHours > 0 ? { noticeHours: w.noticeHours } : {}),
  };
}

async function requireAll(
  ctx: Context,
  table: typeof sites | typeof staffMembers,
  ids: readonly string[],
  what: string,
): Promise<void> {
  if (ids.length === 0) return;
  const found = await ctx.db
    .select({ id: table.id })
    .from(table)
    .where(and(eq(table.practiceId, ctx.practiceId), inArray(table.id, [...ids])));
  if (found.length < new Set(ids).size) throw notFound(what);
}

async function requireInsteadOf(ctx: Context, patientId: string, id: string | null): Promise<void> {
  if (id === null) return;
  const visit = await loadRecord(ctx, appointments, id, "appointment");
  if (visit.patientId !== patientId) throw notFound("appointment");
  if (stateFacts[visit.state].isOpen && visit.startsAt > ctx.clock.now()) return;
  const message = "That visit is over or cancelled already. Choose one that is still to come, or none.";
  throw refused(refusal("wrong-state", message, "insteadOfId"));
}

/** The columns behind the form, with every id of it looked up inside the practice. */
export async function checkedFields(ctx: Context, patientId: string, input: Fields) {
  const { serviceId, urgency, insteadOfId, deskNote } = input;
  const service = await loadRecord(ctx, services, serviceId, "service");
  if (!service.isActive || service.kind === "class") {
    const message = `Nobody can wait for ${service.name}. Choose another service.`;
    throw refused(refusal("service-ended", message, "serviceId"));
  }
  await requireAll(ctx, sites, input.wishes.siteIds, "site");
  await requireAll(ctx, staffMembers, input.wishes.therapistIds, "therapist");
  requireSomeSite(ctx, input.wishes.siteIds);
  await requireInsteadOf(ctx, patientId, insteadOfId);
  return { serviceId, urgency, insteadOfId, deskNote, wishes: keptWishes(input.wishes) };
}

/** Whoever waits for certain sites is the business of the desks there; the others of every desk. */
function requireSomeSite(ctx: Context, siteIds: readonly string[]): void {
  if (siteIds.length > 0 && !siteIds.some((id) => can(ctx.roles, "diary.book", id))) throw notFound("site");
}

/** Takes an entry for this transaction, within reach and as the screen saw it. @throws not-found, stale, refused */
export async function takeEntry(
  ctx: Context,
  input: { entryId: string; version: number },
): Promise<EntryRow> {
  const row = await loadRecord(ctx, waitingEntries, input.entryId, "waiting entry", { lock: true });
  const siteIds = row.wishes.siteIds ?? [];
  if (siteIds.length > 0 && !siteIds.some((id) => can(ctx.roles, "diary.book", id)))
    throw notFound("waiting entry");
  if (row.version !== input.version) throw stale("waiting entry");
  if (row.state === "waiting") return row;
  const message =
    row.state === "booked"
      ? "They have taken a time already, so they no longer wait. Reload the list."
      : "They are off the list already. Reload the list.";
  throw refused(refusal("wrong-state", message));
}

/** Writes the changed columns with the next version. */
export async function saveEntry(
  ctx: Pick<Context, "db" | "clock">,
  before: EntryRow,
  change: Partial<Omit<EntryRow, "practiceId" | "id" | "version">>,
): Promise<void> {
  const [result] = await ctx.db
    .update(waitingEntries)
    .set({ ...change, version: before.version + 1, updatedAt: ctx.clock.now() })
    .where(
      and(
        eq(waitingEntries.practiceId, before.practiceId),
        eq(waitingEntries.id, before.id),
        eq(waitingEntries.version, before.version),
      ),
    );
  if (result.affectedRows !== 1) throw stale("waiting entry");
}

export function auditEntry(
  ctx: Parameters<typeof recordAudit>[0],
  entry: Pick<EntryRow, "id" | "patientId">,
  what: "added" | "edited" | "withdrawn" | "booked",
  detail: Record<string, unknown> = {},
): Promise<void> {
  const { id: subjectId, patientId } = entry;
  return recordAudit(ctx, {
    action: `waiting-entry.${what}`,
    subjectKind: "waiting-entry",
    subjectId,
    patientId,
    detail,
  });
}
