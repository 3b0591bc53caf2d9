import { weekdayDate } from "@withy/core/date-words";
import { AppError, isAppError } from "@withy/core/errors";
import { dayOf, timeOf } from "@withy/core/zoned-time";
import { appointments } from "@withy/db/schema";
import type { CourseRhythm, SeriesVisit } from "@withy/diary/series";
import type { Context } from "../context";
import type { AppointmentRow } from "./change-appointment";
import { type NewVisit, newVisit } from "./new-visit";
import { claimPlan, planVisit } from "./plan-visit";
import { recordChange } from "./record-change";

export interface CourseStart {
  /** From 1, in the order of the rhythm. */
  readonly position: number;
  /** As the contract's `startField` takes it. */
  readonly startsAt: string;
  readonly roomId: string | null;
}

export const rhythmOf = (input: { everyDays: number; weekdays: readonly number[] }): CourseRhythm =>
  input.weekdays.length > 0
    ? { kind: "weekdays", weekdays: [...new Set(input.weekdays)].sort() }
    : { kind: "interval", days: input.everyDays };

/** The starts of a rhythm with the desk's own choices in their places. */
export function chosenStarts(
  series: readonly SeriesVisit[],
  time: string,
  changes: readonly CourseStart[],
): CourseStart[] {
  return series.map(
    ({ day }, n) =>
      changes.find(({ position }) => position === n + 1) ?? {
        position: n + 1,
        startsAt: `${day}T${time}`,
        roomId: null,
      },
  );
}

/** Says which visit of the course it is that was refused. */
function atVisit(error: unknown, n: number, when: string): unknown {
  if (!isAppError(error) || error.code !== "refused") return error;
  const message = `Visit ${n}, ${when}: ${error.message} Nothing was changed.`;
  return new AppError("refused", message, {
    kind: error.kind,
    fields: [{ field: `changes.${n}`, message }],
    detail: { ...error.detail, position: n },
  });
}

/** Runs the work on one visit of a course; a refusal of it names the visit. */
export async function onVisit<T>(
  n: number,
  startsAt: string,
  zone: string,
  work: () => Promise<T>,
): Promise<T> {
  try {
    return await work();
  } catch (error) {
    const isLocal = startsAt.length === 16;
    const at = new Date(startsAt);
    const [day, time] = isLocal
      ? [startsAt.slice(0, 10), startsAt.slice(11)]
      : [dayOf(at, zone), timeOf(at, zone)];
    throw atVisit(error, n, `${weekdayDate(day)} ${time}`);
  }
}

/** Books every visit of the list or none, in the caller's transaction. @throws the refusal of the first in the way */
export async function bookVisits(
  ctx: Context,
  visit: NewVisit,
  starts: readonly CourseStart[],
  zone: string,
): Promise<AppointmentRow[]> {
  const rows: AppointmentRow[] = [];
  for (const { position, startsAt, roomId } of starts) {
    const row = await onVisit(position, startsAt, zone, async () => {
      const wish = { startsAt, durationMinutes: null, cleanDownMinutes: null, movingId: null };
      const plan = await planVisit(
        ctx,
        { ...visit, roomId },
        { ...wish, overrideReason: visit.overrideReason },
      );
      const planned = newVisit(ctx, visit, plan);
      await ctx.db.insert(appointments).values(planned);
      await claimPlan(ctx, planned.id, plan);
      return planned;
    });
    await recordChange(ctx, "booked", null, row);
    rows.push(row);
  }
  return rows.sort((a, b) => a.startsAt.getTime() - b.startsAt.getTime());
}
