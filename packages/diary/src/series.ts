import type { Refusal } from "@withy/core/refusal";
import { addDays, type PlainDateText, type PlainTimeText } from "@withy/core/zoned-time";
import { readStart } from "./check-booking";

export interface SeriesRequest {
  readonly firstDay: PlainDateText;
  /** The clock time at the site, kept over changes of the clocks. */
  readonly time: PlainTimeText;
  readonly zone: string;
  readonly visits: number;
  /** 1 weekly, 2 every other week. */
  readonly everyWeeks: number;
}

export type SeriesVisit =
  | { readonly day: PlainDateText; readonly startsAt: Date }
  | { readonly day: PlainDateText; readonly refusal: Refusal };

/**
 * The starts of a course of visits, weekly or every so many weeks at one clock time. A day on which that time does
 * not happen carries its refusal, so that the caller can propose another time for that visit alone.
 * @throws RangeError for fewer than 1 or more than 52 visits, or fewer than 1 week between them
 */
export function seriesOf(request: SeriesRequest): SeriesVisit[] {
  const { visits, everyWeeks } = request;
  if (!Number.isInteger(visits) || visits < 1 || visits > 52)
    throw new RangeError("A course has 1 to 52 visits.");
  if (!Number.isInteger(everyWeeks) || everyWeeks < 1) throw new RangeError("Visits are whole weeks apart.");
  return Array.from({ length: visits }, (_, n) => {
    const day = addDays(request.firstDay, n * 7 * everyWeeks);
    const start = readStart(day, request.time, request.zone);
    return start instanceof Date ? { day, startsAt: start } : { day, refusal: start };
  });
}
