import type { CourseProposal, FreeStart } from "@withy/contracts/diary";
import { shortDate, weekdayDate } from "@withy/core/date-words";
import { isPlainDate } from "@withy/core/plain-date";
import type { CourseRhythm } from "@withy/diary/series";
import type { FieldError } from "@withy/ui/error-summary";
import { readTime } from "./minute-words";

/** A course as it is being typed: kept as it stands, whatever it means. */
export interface CourseWish {
  serviceId: string;
  therapistId: string;
  siteId: string;
  dayText: string;
  day: string | null;
  timeText: string;
  visitsText: string;
  /** Days between visits, "other" for a number typed below it, or "weekdays". */
  every: string;
  everyText: string;
  weekdays: readonly string[];
}

export const everyOptions = [
  { value: "7", label: "Every week" },
  { value: "14", label: "Every 2 weeks" },
  { value: "21", label: "Every 3 weeks" },
  { value: "28", label: "Every 4 weeks" },
  { value: "weekdays", label: "On weekdays" },
  { value: "other", label: "Every so many days" },
];

/** What an address carries: a time that was found, or a patient's record. */
export function readCourseWish(query: URLSearchParams): CourseWish {
  const on = query.get("on");
  const day = on && isPlainDate(on) ? on : null;
  return {
    serviceId: query.get("service") ?? "",
    therapistId: query.get("therapist") ?? "",
    siteId: query.get("site") ?? "",
    dayText: day ? shortDate(day) : "",
    day,
    timeText: query.get("at") ?? "",
    visitsText: "6",
    every: "7",
    everyText: "",
    weekdays: [],
  };
}

const wholeNumber = (text: string): number | null => (/^\s*\d{1,3}\s*$/.test(text) ? Number(text) : null);

function readVisits(text: string): number | null {
  const n = wholeNumber(text);
  return n !== null && n >= 1 && n <= 60 ? n : null;
}

function readEvery(wish: CourseWish): number | null {
  const n = wholeNumber(wish.every === "other" ? wish.everyText : wish.every);
  return n !== null && n >= 1 && n <= 120 ? n : null;
}

/** What is missing, in the words of the fields. */
export function courseErrors(wish: CourseWish, patientId: string | null): FieldError[] {
  const checks: [boolean, string, string][] = [
    [patientId !== null, "patientId", "Choose a patient"],
    [wish.serviceId !== "", "serviceId", "Choose what the visits are for"],
    [wish.therapistId !== "", "therapistId", "Choose a therapist"],
    [wish.siteId !== "", "siteId", "Choose a site"],
    [wish.day !== null, "firstDay", "Enter the first day, such as 8 Dec or next Tuesday"],
    [readTime(wish.timeText) !== null, "startTime", "Enter a time, such as 10:15"],
    [readVisits(wish.visitsText) !== null, "visits", "Enter how many visits, from 1 to 60"],
    [
      wish.every !== "other" || readEvery(wish) !== null,
      "everyDays",
      "Enter how many days lie between visits, from 1 to 120",
    ],
    [wish.every !== "weekdays" || wish.weekdays.length > 0, "weekdays", "Choose at least one weekday"],
  ];
  return checks.filter(([isThere]) => !isThere).map(([, id, message]) => ({ id: `course-${id}`, message }));
}

/** The course as the server reads it, or null while something is missing. */
export function courseQuery(wish: CourseWish, patientId: string | null) {
  const { day: firstDay, serviceId, therapistId, siteId } = wish;
  const [startTime, visits, everyDays] = [
    readTime(wish.timeText),
    readVisits(wish.visitsText),
    readEvery(wish),
  ];
  if (courseErrors(wish, patientId).length > 0 || !patientId || !firstDay || !startTime || !visits)
    return null;
  const who = { patientId, serviceId, therapistId, siteId, firstDay, startTime, visits };
  return wish.every === "weekdays"
    ? { ...who, weekdays: wish.weekdays.map(Number) }
    : { ...who, everyDays: everyDays ?? 7 };
}

/** Another start for some visits, by their place in the course. */
export type Chosen = Readonly<Record<number, FreeStart>>;

export const changesOf = (chosen: Chosen) =>
  Object.entries(chosen).map(([position, { startsAt, roomId }]) => ({
    position: Number(position),
    startsAt,
    roomId,
  }));

/** The visits that still need another time, and two visits that were given the same. */
export function proposalErrors(proposal: CourseProposal, chosen: Chosen): FieldError[] {
  const open = proposal.visits
    .filter((v) => v.state !== "free" && !chosen[v.position])
    .map((v) => ({
      id: `visit-${v.position}`,
      message: `Choose another time for visit ${v.position}, ${weekdayDate(v.day)}`,
    }));
  const starts = Object.entries(chosen);
  const twice = starts
    .filter(([position, a]) =>
      starts.some(([earlier, b]) => Number(earlier) < Number(position) && a.startsAt === b.startsAt),
    )
    .map(([position]) => ({
      id: `visit-${position}`,
      message: `Visit ${position} has the time of an earlier one. Choose another`,
    }));
  return [...open, ...twice];
}

const weekdayWords = ["Mondays", "Tuesdays", "Wednesdays", "Thursdays", "Fridays", "Saturdays", "Sundays"];

/** "every week", "every 10 days", "Tuesdays and Thursdays". */
export function rhythmWords(rhythm: CourseRhythm): string {
  if (rhythm.kind === "weekdays") {
    const days = rhythm.weekdays.map((n) => weekdayWords[n - 1] ?? "");
    return [days.slice(0, -1).join(", "), days.at(-1) ?? ""].filter(Boolean).join(" and ");
  }
  const { days } = rhythm;
  if (days === 1) return "every day";
  if (days % 7 !== 0) return `every ${days} days`;
  return days === 7 ? "every week" : `every ${days / 7} weeks`;
}
