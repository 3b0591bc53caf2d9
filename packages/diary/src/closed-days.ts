import type { PlainDateText } from "@withy/core/zoned-time";
import { bankHolidays, type Nation } from "./bank-holidays";

/**
 * The days on which a site stays shut although its hours say open, each with its reason: the bank holidays of its
 * nation and its own closures, whose words go first.
 * @param firstDay @param lastDay both are looked at
 */
export function closedDays(
  nation: Nation,
  closures: readonly { readonly on: PlainDateText; readonly reason: string }[],
  firstDay: PlainDateText,
  lastDay: PlainDateText,
): Map<PlainDateText, string> {
  const closed = new Map<PlainDateText, string>();
  for (let year = Number(firstDay.slice(0, 4)); year <= Number(lastDay.slice(0, 4)); year += 1)
    for (const { on, name } of bankHolidays(nation, year))
      if (on >= firstDay && on <= lastDay) closed.set(on, name);
  for (const { on, reason } of closures) if (on >= firstDay && on <= lastDay) closed.set(on, reason);
  return closed;
}
