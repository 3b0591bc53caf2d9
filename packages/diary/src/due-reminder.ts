/** Hours before a visit at which a practice that says nothing else sends a reminder. */
export const usualReminderHours: readonly number[] = [48, 24];

/** A reminder earlier than two weeks ahead is forgotten again; four are as many as anyone reads. */
export const reminderBounds = { leastHours: 1, mostHours: 336, mostReminders: 4 } as const;

const hourMs = 3_600_000;

export interface RemindedVisit {
  /** Milliseconds since the epoch. */
  readonly startsAt: number;
  /** When the visit was last given its time: booked, moved, or brought back after a cancellation. */
  readonly placedAt: number;
}

/**
 * Which reminder is due for a visit now, as its hours before the start, or null for none. Hours are elapsed hours,
 * so a change of the clocks moves nothing. Only the latest one due counts: after a standstill nobody gets two at
 * once. Whoever was given the time after the reminder fell due has just been told of it and needs none.
 */
export function dueReminder(visit: RemindedVisit, hours: readonly number[], now: number): number | null {
  if (visit.startsAt <= now) return null;
  const due = hours.filter((h) => visit.startsAt - h * hourMs <= now);
  if (due.length === 0) return null;
  const latest = Math.min(...due);
  return visit.placedAt < visit.startsAt - latest * hourMs ? latest : null;
}
