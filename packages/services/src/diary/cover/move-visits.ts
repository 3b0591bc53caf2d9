import { addMinutes } from "@withy/core/zoned-time";
import { appointments } from "@withy/db/schema";
import { and, asc, eq, inArray } from "drizzle-orm";
import type { Context } from "../../context";
import { type AppointmentRow, saveAppointment } from "../change-appointment";
import { claimSlots, releaseSlots } from "../claim-slots";
import type { PlacedMove } from "./cover-rows";

export interface Target {
  readonly move: PlacedMove;
  readonly before: AppointmentRow;
  readonly to: { startsAt: string; siteId: string; therapistId: string; roomId: string };
  readonly state: AppointmentRow["state"];
}

/** The visits of the moves, taken for this transaction in one order for everyone. */
export async function takeVisits(
  tx: Context,
  moves: readonly PlacedMove[],
): Promise<Map<string, AppointmentRow>> {
  const ids = moves.map((m) => m.appointmentId);
  if (ids.length === 0) return new Map();
  const rows = await tx.db
    .select()
    .from(appointments)
    .where(and(eq(appointments.practiceId, tx.practiceId), inArray(appointments.id, ids)))
    .orderBy(asc(appointments.id))
    .for("update");
  return new Map(rows.map((r) => [r.id, r] as const));
}

/**
 * Gives all the visits their new places at once: every old time is given back before any new one is taken, so that
 * visits may change places with each other.
 * @returns the moves whose place somebody else has, or null where every visit has moved
 */
export async function moveVisits(
  tx: Context,
  targets: readonly Target[],
  moved: (target: Target, after: AppointmentRow) => Promise<void>,
): Promise<PlacedMove | null> {
  for (const { before } of targets) await releaseSlots(tx, before.id);
  for (const target of targets) {
    const { before, to, move, state } = target;
    const startsAt = new Date(to.startsAt);
    const endsAt = new Date(startsAt.getTime() + before.endsAt.getTime() - before.startsAt.getTime());
    const { siteId, therapistId, roomId } = to;
    const until = addMinutes(endsAt, before.cleanDownMinutes);
    if (!(await claimSlots(tx, { appointmentId: before.id, therapistId, roomId, startsAt, until })))
      return move;
    const after = await saveAppointment(tx, before, { siteId, therapistId, roomId, startsAt, endsAt, state });
    await moved(target, after);
  }
  return null;
}
