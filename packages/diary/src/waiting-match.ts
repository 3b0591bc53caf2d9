import { weekdayDate } from "@withy/core/date-words";
import { dayOf, type PlainDateText } from "@withy/core/zoned-time";
import { dayClock } from "./day-clock";
import { lengthWords } from "./explain-time";
import { type Interval, overlaps } from "./interval";
import { type PartOfDay, partOfDay } from "./time-wishes";
import { type Urgency, weekdayNames } from "./waiting-words";

const minuteMs = 60_000;
const dayMs = 1440 * minuteMs;

/** What someone who waits would take. An absent or empty wish means any. */
export interface WaitingWishes {
  /** 1 Monday to 7 Sunday. */
  readonly weekdays?: readonly number[];
  readonly partsOfDay?: readonly PartOfDay[];
  readonly siteIds?: readonly string[];
  readonly therapistIds?: readonly string[];
  readonly latestOn?: PlainDateText;
  /** Hours between the offer and the start that the patient needs to get there. */
  readonly noticeHours?: number;
}

/** A time that someone could have, from its start for as long as nothing is in the way. */
export interface FreedTime {
  readonly startsAt: Date;
  /** The therapist's working time ends here; a visit must be over by then, its clean-down need not. */
  readonly workUntil: Date;
  /** The next visit, class, leave or block begins here. */
  readonly freeUntil: Date;
  readonly zone: string;
  readonly site: { readonly id: string; readonly name: string };
  readonly therapist: { readonly id: string; readonly name: string };
}

/** Someone on the list, with what the diary knows of them at that time. */
export interface Waiting {
  readonly entryId: string;
  readonly wishes: WaitingWishes;
  readonly urgency: Urgency;
  readonly since: Date;
  readonly service: {
    readonly name: string;
    readonly durationMinutes: number;
    readonly cleanDownMinutes: number;
  };
  readonly isGivenByTherapist: boolean;
  /** Whether a room of the service's kind is free for the whole visit. */
  readonly hasRoom: boolean;
  /** The visit that an acceptance gives up, where it is still to come. */
  readonly insteadOfAt: Date | null;
  /** The patient's other visits around that time. */
  readonly busy: readonly Interval[];
  /** Whether another offer of theirs is still open. */
  readonly hasOffer: boolean;
}

export interface WaitingMatch {
  readonly entryId: string;
  readonly score: number;
  /** Why they stand where they stand, most weighty first. Short phrases without a full stop. */
  readonly reasons: readonly string[];
}

const wants = <T>(list: readonly T[] | undefined, value: T): boolean =>
  list === undefined || list.length === 0 || list.includes(value);

function missingLength(freed: FreedTime, { service }: Waiting): string | null {
  const from = freed.startsAt.getTime();
  const until = from + service.durationMinutes * minuteMs;
  const withCleanDown = until + service.cleanDownMinutes * minuteMs;
  if (until <= freed.workUntil.getTime() && withCleanDown <= freed.freeUntil.getTime()) return null;
  const free = (Math.min(freed.workUntil.getTime(), freed.freeUntil.getTime()) - from) / minuteMs;
  return `${service.name} takes ${lengthWords(service.durationMinutes)}, and ${lengthWords(free)} are free`;
}

function brokenWish(freed: FreedTime, wishes: WaitingWishes): string | null {
  const clock = dayClock(dayOf(freed.startsAt, freed.zone), freed.zone);
  const part = partOfDay(clock.wallOf(freed.startsAt.getTime()));
  if (!wants(wishes.siteIds, freed.site.id)) return `Would not come to ${freed.site.name}`;
  if (!wants(wishes.therapistIds, freed.therapist.id)) return "Asks for another therapist";
  if (!wants(wishes.weekdays, clock.weekday)) return `Cannot come on a ${weekdayNames[clock.weekday - 1]}`;
  if (!wants(wishes.partsOfDay, part)) return `Cannot come in the ${part}`;
  if (wishes.latestOn !== undefined && clock.day > wishes.latestOn)
    return `Wanted to come by ${weekdayDate(wishes.latestOn)}`;
  return null;
}

/** What keeps someone from this time, in words; null where nothing does. */
export function whyNoMatch(freed: FreedTime, entry: Waiting, now: Date): string | null {
  const at = freed.startsAt.getTime();
  const { service, wishes, insteadOfAt } = entry;
  if (!entry.isGivenByTherapist) return `${freed.therapist.name} does not give ${service.name}`;
  const cause = missingLength(freed, entry) ?? brokenWish(freed, wishes);
  if (cause !== null) return cause;
  const notice = wishes.noticeHours ?? 0;
  if (at - now.getTime() < notice * 60 * minuteMs)
    return `Needs ${notice === 1 ? "an hour" : `${notice} hours`} to get here`;
  if (insteadOfAt !== null && insteadOfAt.getTime() <= at) return "Comes sooner than this already";
  const visit = { from: at, to: at + service.durationMinutes * minuteMs };
  if (entry.busy.some((b) => overlaps(b, visit))) return "Has another visit at that time";
  if (entry.hasOffer) return "Has another offer open";
  return entry.hasRoom ? null : "No room of the kind is free";
}

const urgencyPoints: Record<Urgency, number> = { urgent: 60, soon: 30, routine: 0 };
const daysWaited = (entry: Waiting, now: Date): number =>
  Math.max(0, Math.floor((now.getTime() - entry.since.getTime()) / dayMs));

function daysSooner(freed: FreedTime, entry: Waiting): number {
  if (entry.insteadOfAt === null) return 0;
  return Math.floor((entry.insteadOfAt.getTime() - freed.startsAt.getTime()) / dayMs);
}

/** Minutes of the free time that the visit would leave over. */
function minutesLeft(freed: FreedTime, { service }: Waiting): number {
  const until = Math.min(freed.workUntil.getTime(), freed.freeUntil.getTime());
  const used = service.durationMinutes * minuteMs;
  const left = until - freed.startsAt.getTime() - used;
  return left <= service.cleanDownMinutes * minuteMs ? 0 : left / minuteMs;
}

/**
 * Urgency counts most, a day of waiting one point up to sixty, so that a long wait outgrows it; who asked for this
 * very therapist, fills the time or gains many days comes before their equals.
 */
function scoreOf(freed: FreedTime, entry: Waiting, now: Date): number {
  const named = (entry.wishes.therapistIds ?? []).length > 0 ? 8 : 0;
  const fills = 10 - Math.min(10, minutesLeft(freed, entry) / 6);
  const sooner = Math.min(20, daysSooner(freed, entry)) / 2;
  return urgencyPoints[entry.urgency] + Math.min(60, daysWaited(entry, now)) + named + fills + sooner;
}

function reasonsOf(freed: FreedTime, entry: Waiting, now: Date): string[] {
  const days = daysWaited(entry, now);
  const sooner = daysSooner(freed, entry);
  const left = minutesLeft(freed, entry);
  const reasons = [
    entry.urgency === "urgent" ? "Urgent" : entry.urgency === "soon" ? "Should come soon" : null,
    days === 0 ? "Waits since today" : days === 1 ? "Waits 1 day" : `Waits ${days} days`,
    (entry.wishes.therapistIds ?? []).length > 0 ? `Asks for ${freed.therapist.name}` : null,
    left === 0 ? "Fills the time" : `Leaves ${lengthWords(left)} over`,
    sooner > 0 ? `Comes ${sooner === 1 ? "1 day" : `${sooner} days`} sooner` : null,
  ];
  return reasons.filter((reason) => reason !== null);
}

/** Everyone whom the time suits, best first; equals by who waits longer, then by the order in which they were put down. */
export function rankWaiting(freed: FreedTime, entries: readonly Waiting[], now: Date): WaitingMatch[] {
  const since = new Map(entries.map((e) => [e.entryId, e.since.getTime()]));
  const sinceOf = (m: WaitingMatch): number => since.get(m.entryId) ?? 0;
  return entries
    .filter((entry) => whyNoMatch(freed, entry, now) === null)
    .map((entry) => ({
      entryId: entry.entryId,
      score: scoreOf(freed, entry, now),
      reasons: reasonsOf(freed, entry, now),
    }))
    .sort((a, b) => b.score - a.score || sinceOf(a) - sinceOf(b) || (a.entryId < b.entryId ? -1 : 1));
}
