import {
  addDays,
  addMonths,
  datePartsOf,
  isPlainDate,
  type PlainDateText,
  plainDateOf,
  weekdayOf,
} from "./plain-date";

const months = [
  "January",
  "February",
  "March",
  "April",
  "May",
  "June",
  "July",
  "August",
  "September",
  "October",
  "November",
  "December",
];
const weekdays = ["Monday", "Tuesday", "Wednesday", "Thursday", "Friday", "Saturday", "Sunday"];
const monthName = (n: number): string => months[n - 1] ?? "";
const weekdayName = (n: number): string => weekdays[n - 1] ?? "";

/** "Wednesday 6 May 2026": prose and letters. */
export function longDate(day: PlainDateText): string {
  const d = datePartsOf(day);
  return `${weekdayName(weekdayOf(day))} ${d.day} ${monthName(d.month)} ${d.year}`;
}

/** "Tuesday 1 December": a page's title. */
export function titleDate(day: PlainDateText): string {
  const d = datePartsOf(day);
  return `${weekdayName(weekdayOf(day))} ${d.day} ${monthName(d.month)}`;
}

/** "6 May 2026". */
export function plainDateWords(day: PlainDateText): string {
  const d = datePartsOf(day);
  return `${d.day} ${monthName(d.month)} ${d.year}`;
}

/** "6 May" in the same year as `today`, else "6 May 2026"; months cut to three letters. */
export function shortDate(day: PlainDateText, today?: PlainDateText): string {
  const d = datePartsOf(day);
  const base = `${d.day} ${monthName(d.month).slice(0, 3)}`;
  return today !== undefined && datePartsOf(today).year === d.year ? base : `${base} ${d.year}`;
}

/** "Tue 8 Dec". */
export function weekdayDate(day: PlainDateText): string {
  const d = datePartsOf(day);
  return `${weekdayName(weekdayOf(day)).slice(0, 3)} ${d.day} ${monthName(d.month).slice(0, 3)}`;
}

/** "5:30pm", "10:15am", "noon": prose and letters. Takes "17:30". */
export function proseTime(time: string): string {
  const [h = 0, m = 0] = time.split(":").map(Number);
  if (h === 12 && m === 0) return "noon";
  const hour = h % 12 === 0 ? 12 : h % 12;
  return `${hour}${m === 0 ? "" : `:${m.toString().padStart(2, "0")}`}${h < 12 ? "am" : "pm"}`;
}

/** "20:00" from 1200 seconds; hours are shown only from an hour on. */
export function clockDuration(seconds: number): string {
  const whole = Math.round(seconds);
  const h = Math.floor(whole / 3600);
  const m = Math.floor((whole % 3600) / 60);
  const s = (whole % 60).toString().padStart(2, "0");
  return h > 0 ? `${h}:${m.toString().padStart(2, "0")}:${s}` : `${m.toString().padStart(2, "0")}:${s}`;
}

const relative = new Map([
  ["yesterday", -1],
  ["today", 0],
  ["tomorrow", 1],
]);

/** The place, from 1, of the name that begins with this word in small letters; null where none does. */
function placeIn(names: readonly string[], word: string): number | null {
  const i = names.findIndex((name) => name.toLowerCase().startsWith(word));
  return i < 0 ? null : i + 1;
}

function fromWeekday(text: string, today: PlainDateText): PlainDateText | null {
  const match = /^(?:(next|last|this)\s+)?([a-z]{3,9})$/.exec(text);
  if (!match) return null;
  const wanted = placeIn(weekdays, match[2] ?? "");
  if (wanted === null) return null;
  const from = weekdayOf(today);
  if (match[1] === "last") return addDays(today, -(((from - wanted + 6) % 7) + 1));
  const ahead = (wanted - from + 7) % 7;
  if (match[1] === "this") return addDays(today, ahead);
  return addDays(today, ahead === 0 ? 7 : ahead);
}

function fromOffset(text: string, today: PlainDateText): PlainDateText | null {
  const match = /^(?:in\s+)?(\d{1,3})\s*(day|week|month)s?(\s+ago)?$/.exec(text);
  if (!match) return null;
  const n = Number(match[1]) * (match[3] ? -1 : 1);
  if (match[2] === "month") return addMonths(today, n);
  return addDays(today, match[2] === "week" ? n * 7 : n);
}

/** The date of a day, a month and the year as typed: four digits, two or none. */
function withYear(
  day: number,
  month: number,
  typed: string | undefined,
  today: PlainDateText,
  past: boolean,
): PlainDateText | null {
  if (typed?.length === 4) return plainDateOf(Number(typed), month, day);
  const { year } = datePartsOf(today);
  const nearest = typed === undefined ? year : Math.floor(year / 100) * 100 + Number(typed);
  if (!past) return plainDateOf(nearest, month, day);
  const step = typed === undefined ? 1 : 100;
  // The latest leap day may lie eight years back: 1900 and 2100 have none.
  for (let back = 0; back <= 8; back += 1) {
    const date = plainDateOf(nearest - back * step, month, day);
    if (date !== null && date <= today) return date;
  }
  return null;
}

/** "Wed 6 May" without its weekday; any other first word stays, and so the text is no date. */
const withoutWeekday = (text: string): string =>
  text.replace(/^([a-z]{3,9}),? (?=\d)/, (start, word: string) =>
    placeIn(weekdays, word) === null ? start : "",
  );

/**
 * Reads a date as people type it: day, month, year in that order ("6/5/2026", "6 5 26", "6 May 2026", "6may"),
 * an ISO date, or relative words ("tomorrow", "next thu", "in 2 weeks"). Null where it is no date.
 * @param past a two-digit or absent year means the latest one not after `today` (dates of birth)
 */
export function readDate(
  text: string,
  today: PlainDateText,
  options: { past?: boolean } = {},
): PlainDateText | null {
  const clean = text.trim().toLowerCase().replace(/\s+/g, " ");
  const offset = relative.get(clean);
  if (offset !== undefined) return addDays(today, offset);
  const words = fromWeekday(clean, today) ?? fromOffset(clean, today);
  if (words) return words;
  if (/^\d{4}-\d{2}-\d{2}$/.test(clean)) return isPlainDate(clean) ? clean : null;
  const numeric = /^(\d{1,2})[\s/.-]+(\d{1,2})(?:[\s/.-]+(\d{4}|\d{2}))?$/.exec(clean);
  const solid = /^(\d{2})(\d{2})(\d{4})$/.exec(clean);
  const named = /^(\d{1,2})(?:st|nd|rd|th)?[\s/.-]*([a-z]{3,9})[\s/.,-]*(\d{4}|\d{2})?$/.exec(
    withoutWeekday(clean),
  );
  const [, day, middle = "", year] = numeric ?? solid ?? named ?? [];
  const month = named ? placeIn(months, middle) : Number(middle);
  if (day === undefined || month === null) return null;
  return withYear(Number(day), month, year, today, options.past ?? false);
}
