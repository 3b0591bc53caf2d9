import { longDate } from "@withy/core/date-words";
import { type Refusal, refusal } from "@withy/core/refusal";
import { dayOf } from "@withy/core/zoned-time";
import { type AppointmentState, canMove, stateFacts } from "./appointment-states";

export interface MarkFacts {
  readonly from: AppointmentState;
  readonly to: AppointmentState;
  readonly startsAt: Date;
  readonly now: Date;
  readonly zone: string;
}

/** Whether a visit may be marked so now: by the table of moves, and never before its day or, missed, its start. */
export function checkMark({ from, to, startsAt, now, zone }: MarkFacts): Refusal | null {
  const [was, becomes] = [stateFacts[from].word.toLowerCase(), stateFacts[to].word.toLowerCase()];
  if (!canMove(from, to))
    return refusal(
      "wrong-state",
      `This visit is ${was} and cannot be marked ${becomes}. Undo the last mark first, or reload to see what changed.`,
    );
  if (to === "noshow" && now < startsAt)
    return refusal("too-early", "This visit has not begun. Mark it as missed once its time has come.");
  const day = dayOf(startsAt, zone);
  if (to !== "confirmed" && to !== "cancelled" && dayOf(now, zone) < day)
    return refusal("too-early", `This visit is on ${longDate(day)}. It can be marked ${becomes} on the day.`);
  return null;
}

/** Whether a visit in this state may still be given another time. */
export function canBeMoved(state: AppointmentState): boolean {
  return state === "booked" || state === "confirmed";
}

export interface CancellationFacts {
  readonly by: "patient" | "clinic";
  readonly startsAt: Date;
  readonly now: Date;
  /** Hours of notice that the practice asks for. */
  readonly noticeHours: number;
}

/** Whether a cancellation is late: the patient's doing, with less notice than asked for. The clinic's never is. */
export function isLateCancellation({ by, startsAt, now, noticeHours }: CancellationFacts): boolean {
  return by === "patient" && startsAt.getTime() - now.getTime() < noticeHours * 3_600_000;
}
