import { newId } from "@withy/core/ids";
import { appointmentChanges, type appointments } from "@withy/db/schema";
import { writeTogether } from "@withy/db/write-together";
import type { SQLWrapper } from "drizzle-orm";
import { auditWrite } from "../audit";
import type { Context } from "../context";

type Row = typeof appointments.$inferSelect;
export type ChangeKind = (typeof appointmentChanges.$inferSelect)["kind"];

/** What "recent changes" and undo need to know of a visit. */
const shotOf = (row: Row): Record<string, unknown> => ({
  state: row.state,
  startsAt: row.startsAt.toISOString(),
  endsAt: row.endsAt.toISOString(),
  siteId: row.siteId,
  therapistId: row.therapistId,
  roomId: row.roomId,
});

const actions: Record<ChangeKind, string> = {
  booked: "appointment.booked",
  moved: "appointment.moved",
  cancelled: "appointment.cancelled",
  marked: "appointment.marked",
  undone: "appointment.undone",
};

/**
 * Writes down what was done to a visit, for the desk and for the audit, in the caller's transaction. A move between
 * sites is told at both.
 * @param byLink where a patient did it behind a private link: the audit then names the offer and nobody of the staff
 */
export async function recordChange(
  ctx: Context,
  kind: ChangeKind,
  before: Row | null,
  after: Row,
  byLink: { readonly offerId: string } | null = null,
): Promise<void> {
  await writeTogether(ctx.db, changeWrites(ctx, kind, before, after, byLink));
}

/** The statements that `recordChange` runs, to run with others. */
export function changeWrites(
  ctx: Context,
  kind: ChangeKind,
  before: Row | null,
  after: Row,
  byLink: { readonly offerId: string } | null = null,
): SQLWrapper[] {
  const changedAt = ctx.clock.now();
  const change = {
    practiceId: ctx.practiceId,
    appointmentId: after.id,
    kind,
    before: before ? shotOf(before) : null,
    after: shotOf(after),
    changedBy: ctx.staffMemberId,
    changedAt,
  };
  const siteIds = new Set([before?.siteId ?? after.siteId, after.siteId]);
  const changes = [...siteIds].map((siteId) => ({ ...change, id: newId(), siteId }));
  const isMoved = before !== null && before.startsAt.getTime() !== after.startsAt.getTime();
  const entry = {
    action: actions[kind],
    subjectKind: "appointment",
    subjectId: after.id,
    patientId: after.patientId,
    siteId: after.siteId,
    detail: {
      ...byLink,
      state: after.state,
      startsAt: after.startsAt.toISOString(),
      ...(before && before.state !== after.state ? { stateBefore: before.state } : {}),
      ...(isMoved ? { startsAtBefore: before.startsAt.toISOString() } : {}),
      ...(after.overrideReason !== null && kind !== "marked" ? { outsideHours: true } : {}),
    },
  };
  return [
    ctx.db.insert(appointmentChanges).values(changes),
    auditWrite(byLink ? { ...ctx, staffMemberId: null } : ctx, [entry]),
  ];
}
