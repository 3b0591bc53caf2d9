import type { SlotTakenDetail } from "@withy/contracts/diary";
import { shortDate } from "@withy/core/date-words";
import type { FieldError } from "@withy/ui/error-summary";
import { ApiError } from "@/api/request";
import { readTime } from "./minute-words";

/** A time as it is being typed: kept as it stands, whatever it means. */
export interface WantedTime {
  dayText: string;
  day: string | null;
  timeText: string;
  siteId: string;
  therapistId: string;
  /** Empty: any free room of the right kind. */
  roomId: string;
}

export function wantedTime(
  start: Partial<Omit<WantedTime, "dayText" | "timeText">> & { time?: string | undefined },
): WantedTime {
  const { day = null, time = "", siteId = "", therapistId = "", roomId = "" } = start;
  return { dayText: day ? shortDate(day) : "", day, timeText: time, siteId, therapistId, roomId };
}

/** What the site's clock should show, as the server reads it, or null while something is missing. */
export function startsAtText(wanted: WantedTime): string | null {
  const time = readTime(wanted.timeText);
  return wanted.day && time ? `${wanted.day}T${time}` : null;
}

/** What is missing, in the words of the fields. */
export function timeErrors(wanted: WantedTime, prefix: string): FieldError[] {
  const errors: FieldError[] = [];
  if (!wanted.day)
    errors.push({ id: `${prefix}-day`, message: "Enter a day, such as 8 Dec or next Tuesday" });
  if (!readTime(wanted.timeText))
    errors.push({ id: `${prefix}-time`, message: "Enter a time, such as 10:15" });
  if (!wanted.therapistId) errors.push({ id: `${prefix}-therapistId`, message: "Choose a therapist" });
  if (!wanted.siteId) errors.push({ id: `${prefix}-siteId`, message: "Choose a site" });
  return errors;
}

/** What the refusal "slot-taken" brings with it, where this error is one. */
export function slotTaken(error: unknown): SlotTakenDetail | null {
  if (!(error instanceof ApiError) || error.problem.kind !== "slot-taken") return null;
  const more = error.problem.more as Partial<SlotTakenDetail>;
  return { takenBy: more.takenBy ?? null, nextFree: more.nextFree ?? [] };
}

/** Whether a reason would let it through all the same. */
export function givesWayToReason(error: unknown): boolean {
  return (
    error instanceof ApiError && ["outside-hours", "blocked", "too-far-apart"].includes(error.problem.kind)
  );
}
