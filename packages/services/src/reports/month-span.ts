import { addDays, addMonths, dayBounds, monthBounds, type PlainDateText } from "@withy/core/zoned-time";

/** A month of the practice's clock: its days, and its instants from the first to without the last. */
export interface MonthSpan {
  readonly month: string;
  readonly firstOn: PlainDateText;
  readonly lastOn: PlainDateText;
  readonly from: Date;
  readonly to: Date;
}

export function monthSpan(month: string, zone: string): MonthSpan {
  const { firstOn, nextOn } = monthBounds(month);
  return {
    month,
    firstOn,
    lastOn: addDays(nextOn, -1),
    from: dayBounds(firstOn, zone).from,
    to: dayBounds(nextOn, zone).from,
  };
}

export function monthBefore(month: string): string {
  return addMonths(`${month}-01`, -1).slice(0, 7);
}
