import { addDays, addMonths, datePartsOf, type PlainDateText, plainDateOf, weekdayOf } from "./plain-date";

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

const relative: Record<string, number> = { yesterday: -1, today: 0, tomorrow: 1 };

function monthFromWord(word: string): number | null {
  if (word.length < 3) return null;
  const i = months.findIndex((m) => m.toLowerCase().startsWith(word));
  return i < 0 ? null : i + 1;
}

function fromWeekday(text: string, today: PlainDateText): PlainDateText | null {
  const match = /^(?:(next|last|this)\s+)?([a-z]{3,9})$/.exec(text);
  if (!match) return null;
  const wanted = weekdays.findIndex((w) => w.toLowerCase().startsWith(match[2] ?? "-")) + 1;
  if (wanted === 0) return null;
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

function fullYear(
  text: string | undefined,
  month: number,
  day: number,
  today: PlainDateText,
  past: boolean,
): number {
  const { year } = datePartsOf(today);
  if (text === undefined) {
    const sameYear = plainDateOf(year, month, Math.min(day, 28)) ?? today;
    return past && sameYear > today ? year - 1 : year;
  }
  const y = Number(text);
  if (text.length === 4) return y;
  const century = Math.floor(year / 100) * 100;
  return past && century + y > year ? century - 100 + y : century + y;
}

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
  const offset = relative[clean];
  if (offset !== undefined) return addDays(today, offset);
  const words = fromWeekday(clean, today) ?? fromOffset(clean, today);
  if (words) return words;
  const iso = /^(\d{4})-(\d{2})-(\d{2})$/.exec(clean);
  const numeric = /^(\d{1,2})[\s/.-]+(\d{1,2})(?:[\s/.-]+(\d{4}|\d{2}))?$/.exec(clean);
  const solid = /^(\d{2})(\d{2})(\d{4})$/.exec(clean);
  const named =
    /^(?:[a-z]{3,9},? )?(\d{1,2})(?:st|nd|rd|th)?[\s/.-]*([a-z]{3,9})[\s/.,-]*(\d{4}|\d{2})?$/.exec(clean);
  const parts = numeric ?? solid;
  const day = iso ? Number(iso[3]) : Number((parts ?? named)?.[1]);
  const month = iso
    ? Number(iso[2])
    : parts
      ? Number(parts[2])
      : named
        ? monthFromWord(named[2] ?? "")
        : null;
  if (month === null || !Number.isInteger(month) || month < 1 || month > 12 || !(day >= 1)) return null;
  const year = iso
    ? Number(iso[1])
    : fullYear((parts ?? named)?.[3], month, day, today, options.past ?? false);
  return plainDateOf(year, month, day);
}
