import { proseTime, weekdayDate } from "@withy/core/date-words";
import type { Candidate, FindTimesInput, FoundTime, Tally } from "./found-times";
import { type GapLeft, marksOf, wastedMinutes } from "./rank-time";
import { brokenWishes, partOfDay, type TimeWishes, type WishKind } from "./time-wishes";

const minuteMs = 60_000;

/** "45 minutes", "1 hour", "1 h 30". */
export function lengthWords(minutes: number): string {
  if (minutes === 1) return "1 minute";
  if (minutes < 60) return `${minutes} minutes`;
  const rest = minutes % 60;
  const hours = Math.floor(minutes / 60);
  if (rest !== 0) return `${hours} h ${rest}`;
  return hours === 1 ? "1 hour" : `${hours} hours`;
}

const hasAnyWish = (w: TimeWishes): boolean =>
  [w.weekdays, w.partsOfDay, w.siteIds, w.therapistIds].some((l) => (l?.length ?? 0) > 0) ||
  w.fromTime !== undefined ||
  w.untilTime !== undefined ||
  w.latestOn !== undefined ||
  (w.windows?.length ?? 0) > 0 ||
  w.needsRoom === true;

const wallText = (minutes: number): string =>
  `${String(Math.floor(minutes / 60)).padStart(2, "0")}:${String(minutes % 60).padStart(2, "0")}`;

function missedHours(input: FindTimesInput, c: Candidate): string {
  const { fromTime, untilTime } = input.wishes;
  const start = c.clock.wallOf(c.startsAt);
  const wall = (time: string): number => Number(time.slice(0, 2)) * 60 + Number(time.slice(3, 5));
  if (fromTime !== undefined && start < wall(fromTime))
    return `Starts ${lengthWords(wall(fromTime) - start)} before ${proseTime(fromTime)}`;
  const over = untilTime === undefined ? 0 : start + input.durationMinutes - wall(untilTime);
  if (untilTime !== undefined && over > 0) return `Ends ${lengthWords(over)} after ${proseTime(untilTime)}`;
  return `In the ${partOfDay(start)}, which was not asked for`;
}

function missedWish(input: FindTimesInput, c: Candidate, wish: WishKind): string {
  const name = (list: readonly { id: string; name: string }[], id: string): string =>
    list.find((x) => x.id === id)?.name ?? "";
  if (wish === "hours") return missedHours(input, c);
  if (wish === "site") return `At ${name(input.sites, c.siteId)}, which was not asked for`;
  if (wish === "therapist") return `With ${name(input.therapists, c.therapistId)}, who was not asked for`;
  if (wish === "latest") return "Later than was asked for";
  if (wish === "windows") return "Outside the windows that were asked for";
  return `${weekdayDate(c.clock.day).slice(0, 3)} was not asked for`;
}

function gapWords(
  left: GapLeft,
  shortest: number,
  startWall: number,
): { reason?: string; drawback?: string } {
  if (left.before === 0 && left.after === 0) return { reason: "Fills a gap exactly" };
  if (wastedMinutes(left, shortest) === 0) {
    if (left.before === 0 || left.after === 0) return { reason: "Leaves no gap too short to sell" };
    return {
      drawback: `Splits a free stretch into ${lengthWords(left.before)} and ${lengthWords(left.after)}`,
    };
  }
  const isBefore = left.before > 0 && left.before < shortest;
  const minutes = isBefore ? left.before : left.after;
  const side = isBefore ? `before ${wallText(startWall)}` : "after it";
  return { drawback: `Leaves ${lengthWords(minutes)} ${side}, too short to sell` };
}

function earliestWords(input: FindTimesInput, tally: Tally, c: Candidate): string | null {
  if (c.broken !== 0) return null;
  if (tally.byBroken.get(0)?.first === c.startsAt)
    return input.sites.length > 1 ? "Earliest of all" : "Earliest";
  if (tally.earliestBySite.get(c.siteId) !== c.startsAt) return null;
  return `Earliest at ${input.sites.find((s) => s.id === c.siteId)?.name ?? "this site"}`;
}

function knowsWords(input: FindTimesInput, c: Candidate): { reason?: string; drawback?: string } {
  if (input.seenBy.length === 0) return {};
  const known = input.seenBy.find((k) => k.therapistId === c.therapistId);
  if (!known) return { drawback: "New therapist" };
  const visits = known.visits === 1 ? "1 visit" : `${known.visits} visits`;
  if (known.isLast) return { reason: `Same therapist as last time, ${visits} so far` };
  return { reason: `Has seen this patient before, ${visits}` };
}

function laterWords(tally: Tally, c: Candidate): string | null {
  const first = tally.byBroken.get(0)?.first;
  if (first === undefined) return null;
  const days = Math.floor((c.startsAt - first) / (1440 * minuteMs));
  if (days < 2) return null;
  return `${days} days later than the first`;
}

/** A candidate with its room and the reasons for its rank, good ones first. */
export function explainTime(input: FindTimesInput, tally: Tally, c: Candidate, roomId: string): FoundTime {
  const gap = gapWords(c.left, input.shortestSellableMinutes, c.clock.wallOf(c.startsAt));
  const knows = knowsWords(input, c);
  const meetsEveryWish = c.broken === 0;
  const reasons = [
    meetsEveryWish && hasAnyWish(input.wishes) ? "Meets every wish" : null,
    earliestWords(input, tally, c),
    knows.reason,
    gap.reason,
  ];
  const missed = brokenWishes(c.broken).map((wish) => missedWish(input, c, wish));
  const drawbacks = [...missed, knows.drawback, gap.drawback, laterWords(tally, c)];
  const isWord = (x: string | null | undefined): x is string => typeof x === "string";
  return {
    startsAt: new Date(c.startsAt),
    endsAt: new Date(c.startsAt + input.durationMinutes * minuteMs),
    therapistId: c.therapistId,
    siteId: c.siteId,
    roomId,
    meetsEveryWish,
    score: c.score,
    marks: {
      wish: marksOf(c.scores.wish),
      wait: marksOf(c.scores.wait),
      knows: input.seenBy.length === 0 ? null : marksOf(c.scores.knows),
      day: marksOf(c.scores.day),
    },
    reasons: reasons.filter(isWord),
    drawbacks: drawbacks.filter(isWord),
  };
}
