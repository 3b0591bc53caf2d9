/** A calendar date "2026-12-01" with no time and no zone. */
export type PlainDateText = string;

// No zone comes into a plain date, so counting days in UTC is exact; and a page that only shows dates stays light.
const dayMs = 86_400_000;
const textOf = (dayNumber: number): PlainDateText => new Date(dayNumber * dayMs).toISOString().slice(0, 10);

export function isPlainDate(text: string): boolean {
  if (!/^\d{4}-\d{2}-\d{2}$/.test(text)) return false;
  const at = Date.parse(`${text}T00:00:00Z`);
  return !Number.isNaN(at) && textOf(at / dayMs) === text;
}

/** Days since 1 January 1970. @throws RangeError for what is no date */
function dayNumber(day: PlainDateText): number {
  if (!isPlainDate(day)) throw new RangeError(`"${day}" is not a date of the form 2026-12-01.`);
  return Date.parse(`${day}T00:00:00Z`) / dayMs;
}

/** Year, month (1 to 12) and day of the month. @throws RangeError for what is no date */
export function datePartsOf(day: PlainDateText): { year: number; month: number; day: number } {
  dayNumber(day);
  return { year: Number(day.slice(0, 4)), month: Number(day.slice(5, 7)), day: Number(day.slice(8)) };
}

/** The date of these parts, or null where the calendar has none such. */
export function plainDateOf(year: number, month: number, day: number): PlainDateText | null {
  const text = `${String(year).padStart(4, "0")}-${String(month).padStart(2, "0")}-${String(day).padStart(2, "0")}`;
  return isPlainDate(text) ? text : null;
}

/** ISO weekday: 1 Monday to 7 Sunday. */
export function weekdayOf(day: PlainDateText): number {
  const fromThursday = dayNumber(day) % 7;
  return ((fromThursday + 10) % 7) + 1;
}

export const addDays = (day: PlainDateText, days: number): PlainDateText => textOf(dayNumber(day) + days);

/** The same day so many months on; where that month is shorter, its last day. */
export function addMonths(day: PlainDateText, months: number): PlainDateText {
  const from = datePartsOf(day);
  const index = from.year * 12 + from.month - 1 + months;
  const [year, month] = [Math.floor(index / 12), (index % 12) + 1];
  const lastDay = new Date(Date.UTC(2000 + (year % 400), month, 0)).getUTCDate();
  return plainDateOf(year, month, Math.min(from.day, lastDay)) ?? day;
}

export const daysBetween = (from: PlainDateText, to: PlainDateText): number =>
  dayNumber(to) - dayNumber(from);

/** @param month "2026-12" */
export function monthBounds(month: string): { firstOn: PlainDateText; nextOn: PlainDateText } {
  const firstOn = `${month}-01`;
  return { firstOn, nextOn: addMonths(firstOn, 1) };
}

/**
 * Whole years lived on a day. Someone born on 29 February has their birthday on 1 March in common years (the
 * reading taken in UK law; from memory).
 */
export function ageOn(bornOn: PlainDateText, day: PlainDateText): number {
  const [born, on] = [datePartsOf(bornOn), datePartsOf(day)];
  const hadBirthday = on.month > born.month || (on.month === born.month && on.day >= born.day);
  return on.year - born.year - (hadBirthday ? 0 : 1);
}
