/** The step of the diary: every start, length and buffer is a multiple of it. */
export const slotMinutes = 5;
const slotMs = slotMinutes * 60_000;

/** Whether an instant lies on the five-minute grid. Offsets of all zones in use are multiples of 15 minutes. */
export function isOnGrid(at: Date): boolean {
  return at.getTime() % slotMs === 0;
}

/** Whether a length in minutes is a positive multiple of five. */
export function isWholeSlots(minutes: number): boolean {
  return Number.isInteger(minutes) && minutes > 0 && minutes % slotMinutes === 0;
}

/**
 * The five-minute slots that a visit takes of its therapist and its room: from its start up to, and without, its
 * end. Pass the end with the clean-down buffer included.
 * @throws RangeError when either end is off the grid or the end is not after the start
 */
export function slotsOf(startsAt: Date, endsAt: Date): Date[] {
  if (!isOnGrid(startsAt) || !isOnGrid(endsAt))
    throw new RangeError("A visit starts and ends on five minutes.");
  if (endsAt.getTime() <= startsAt.getTime()) throw new RangeError("A visit ends after it starts.");
  const slots: Date[] = [];
  for (let at = startsAt.getTime(); at < endsAt.getTime(); at += slotMs) slots.push(new Date(at));
  return slots;
}
