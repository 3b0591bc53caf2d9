import type { SlotTakenDetail } from "@withy/contracts/diary";
import { proseTime } from "@withy/core/date-words";
import { type AppError, refused } from "@withy/core/errors";
import { refusal } from "@withy/core/refusal";
import { addDays, dayOf, timeOf } from "@withy/core/zoned-time";
import { type Interval, intersect, overlaps } from "@withy/diary/interval";
import { type RoomNeeds, roomSuits } from "@withy/diary/room-suits";
import { sql } from "drizzle-orm";
import type { Context } from "../context";
import { type Claim, findHolder } from "./claim-slots";
import { rowsOf, utc } from "./raw-rows";
import { freeTime, readClaimed, readTherapistDays } from "./therapist-day";

export interface Wanted extends Claim {
  readonly site: { readonly id: string; readonly zone: string };
  readonly needs: RoomNeeds;
  readonly durationMinutes: number;
  readonly cleanDownMinutes: number;
}

const daysAhead = 14;

interface HolderRow {
  starts_at: string;
  ends_at: string;
  patient_name: string;
  therapist_id: string;
  therapist_name: string;
  room_name: string;
}

async function describeHolder(
  ctx: Context,
  id: string,
  zone: string,
): Promise<{ row: HolderRow; takenBy: SlotTakenDetail["takenBy"] } | null> {
  const [row] = await rowsOf<HolderRow>(
    ctx.db,
    sql`select a.starts_at, a.ends_at, concat(p.given_name, ' ', p.family_name) as patient_name, a.therapist_id,
        concat(t.given_name, ' ', t.family_name) as therapist_name, r.name as room_name
      from appointments a
        join patients p on p.practice_id = a.practice_id and p.id = a.patient_id
        join staff_members t on t.practice_id = a.practice_id and t.id = a.therapist_id
        join rooms r on r.practice_id = a.practice_id and r.id = a.room_id
      where a.practice_id = ${ctx.practiceId} and a.id = ${id}`,
  );
  if (!row) return null;
  const takenBy = {
    appointmentId: id,
    patientName: row.patient_name,
    therapistName: row.therapist_name,
    roomName: row.room_name,
    startTime: timeOf(new Date(utc(row.starts_at)), zone),
    endTime: timeOf(new Date(utc(row.ends_at)), zone),
  };
  return { row, takenBy };
}

/**
 * The next three starts of the same therapist at the site for which a room of the kind is free too.
 * @param spokenFor stretches of the therapist's time that are free but meant for something else
 */
export async function nextFree(
  ctx: Context,
  w: Wanted,
  spokenFor: readonly Interval[] = [],
): Promise<SlotTakenDetail["nextFree"]> {
  const now = ctx.clock.now();
  const from = new Date(Math.max(w.startsAt.getTime(), now.getTime()));
  const days = await readTherapistDays(
    ctx,
    w.therapistId,
    w.site,
    dayOf(from, w.site.zone),
    daysAhead,
    w.appointmentId,
  );
  if (!days) return [];
  const until = new Date(`${addDays(dayOf(from, w.site.zone), daysAhead + 1)}T00:00:00Z`);
  const rooms = days.frame.rooms.filter((r) => roomSuits(r, w.needs));
  const claimed = await readClaimed(
    ctx,
    [w.therapistId, ...rooms.map((r) => r.id)],
    from,
    until,
    w.appointmentId,
  );
  const window = [{ from: from.getTime(), to: until.getTime() }];
  const taken = [...(claimed.get(w.therapistId) ?? []), ...spokenFor];
  const free = intersect(freeTime(days, taken, w.cleanDownMinutes), window);
  const need = (w.durationMinutes + w.cleanDownMinutes) * 60_000;
  const found: { startsAt: string; day: string; startTime: string; roomId: string }[] = [];
  for (const gap of free)
    for (let at = Math.ceil(gap.from / 300_000) * 300_000; at + need <= gap.to && found.length < 3; ) {
      const visit = { from: at, to: at + need };
      const clash = (id: string): boolean =>
        [...(claimed.get(id) ?? []), ...days.frame.absences.filter((a) => a.roomId === id)].some((c) =>
          overlaps(c, visit),
        );
      const room = rooms.find((r) => !clash(r.id));
      const start = new Date(at);
      if (room)
        found.push({
          startsAt: start.toISOString(),
          day: dayOf(start, w.site.zone),
          startTime: timeOf(start, w.site.zone),
          roomId: room.id,
        });
      at += room ? need : 300_000;
    }
  return found;
}

/** The refusal of a time that someone else has: who, until when, and what is free instead. */
export async function slotTaken(ctx: Context, wanted: Wanted): Promise<AppError> {
  const holder = await findHolder(ctx, wanted);
  const known = holder === null ? null : await describeHolder(ctx, holder, wanted.site.zone);
  const detail: SlotTakenDetail = { takenBy: known?.takenBy ?? null, nextFree: await nextFree(ctx, wanted) };
  const whose = known && known.row.therapist_id !== wanted.therapistId ? "The room" : "The therapist";
  const until = known?.takenBy ? ` until ${proseTime(known.takenBy.endTime)}` : "";
  const message = `${whose} is already booked for that time${until}. Choose another time.`;
  return refused(refusal("slot-taken", message, "startsAt"), { ...detail });
}
