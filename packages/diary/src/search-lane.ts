import type { DayClock } from "./day-clock";
import type { Candidate, FindTimesInput, Tally } from "./found-times";
import { type Interval, intersect, subtract, union } from "./interval";
import {
  dayScore,
  knowsScore,
  type RankConcern,
  type Scores,
  totalScore,
  waitScore,
  wishScore,
} from "./rank-time";
import {
  dayBits,
  isAtMostOne,
  minutesOutside,
  partOfDay,
  siteBits,
  therapistBits,
  type WishedHours,
  windowBits,
  wishBit,
} from "./time-wishes";

const minuteMs = 60_000;
const quarterMs = 15 * minuteMs;
const gridMs = 5 * minuteMs;

/** What stays the same over one search. */
export interface Search {
  readonly input: FindTimesInput;
  readonly hours: WishedHours;
  readonly needMs: number;
  readonly clocks: ReadonlyMap<string, readonly DayClock[]>;
  readonly weights: Readonly<Record<RankConcern, number>>;
  readonly tally: Tally;
}

/** Starts worth trying between two instants: both edges and every quarter of an hour between. */
function startsBetween(lo: number, hi: number): number[] {
  const first = Math.ceil(lo / gridMs) * gridMs;
  const last = Math.floor(hi / gridMs) * gridMs;
  if (first > last) return [];
  const starts = [first];
  for (let at = Math.floor(first / quarterMs) * quarterMs + quarterMs; at < last; at += quarterMs)
    starts.push(at);
  if (last > first) starts.push(last);
  return starts;
}

/** When a visit may start for the rooms' sake: in one that meets the patient's needs, or only in another. */
export interface RoomStarts {
  readonly fitting: readonly Interval[];
  readonly other: readonly Interval[];
}

/**
 * When some room of the site can take a visit's start: one interval per run of starts, its end just possible. The two
 * kinds of rooms are kept apart whether or not they are asked for, so that the same starts are looked at either way.
 */
export function startsWithRoom(s: Search, siteId: string): RoomStarts {
  const here = s.input.rooms.filter((r) => r.siteId === siteId);
  const fitting = startsIn(
    s,
    here.filter((r) => r.meetsNeeds !== false),
  );
  const rest = here.filter((r) => r.meetsNeeds === false);
  return { fitting, other: rest.length === 0 ? [] : subtract(startsIn(s, rest), fitting) };
}

function startsIn(s: Search, rooms: FindTimesInput["rooms"]): Interval[] {
  const ranges = rooms.flatMap((r) => r.free.map((i) => ({ from: i.from, to: i.to - s.needMs + 1 })));
  const window = [{ from: s.input.from.getTime(), to: s.input.to.getTime() }];
  return intersect(union(ranges), window);
}

function makeCandidate(
  s: Search,
  lane: FindTimesInput["free"][number],
  laneBits: number,
  knows: number,
  clock: DayClock,
  startsAt: number,
  gap: Interval,
): Candidate | null {
  const { wishes, durationMinutes } = s.input;
  const off = minutesOutside(s.hours, clock.wallOf(startsAt), durationMinutes);
  const inWindow = windowBits(wishes, { from: startsAt, to: startsAt + durationMinutes * minuteMs });
  const broken = laneBits | dayBits(wishes, clock) | inWindow | (off > 0 ? wishBit.hours : 0);
  s.tally.lookedAt += 1;
  if (!isAtMostOne(broken)) return null;
  const seen = s.tally.byBroken.get(broken);
  if (!seen) s.tally.byBroken.set(broken, { times: 1, first: startsAt, siteId: lane.siteId });
  else {
    seen.times += 1;
    if (startsAt < seen.first) Object.assign(seen, { first: startsAt, siteId: lane.siteId });
  }
  // A room that the patient cannot use is no offer; it only tells what giving up the need would bring.
  if ((broken & wishBit.needs) !== 0) return null;
  if (broken === 0 && startsAt < (s.tally.earliestBySite.get(lane.siteId) ?? Number.POSITIVE_INFINITY))
    s.tally.earliestBySite.set(lane.siteId, startsAt);
  const left = { before: (startsAt - gap.from) / minuteMs, after: (gap.to - startsAt - s.needMs) / minuteMs };
  const scores: Scores = {
    wish: wishScore(broken, wishBit.hours, off),
    wait: waitScore((startsAt - s.input.from.getTime()) / minuteMs),
    knows,
    day: dayScore(left, s.input.shortestSellableMinutes),
  };
  const { therapistId, siteId } = lane;
  return { startsAt, therapistId, siteId, clock, broken, left, scores, score: totalScore(scores, s.weights) };
}

/** The best start of each part of the day in every gap of one therapist at one site. */
export function searchLane(s: Search, lane: FindTimesInput["free"][number], starts: RoomStarts): Candidate[] {
  const needs = s.input.wishes.needsRoom === true ? wishBit.needs : 0;
  const best: Candidate[] = [];
  scanLane(s, lane, starts.fitting, 0, best);
  if (starts.other.length > 0) scanLane(s, lane, starts.other, needs, best);
  return best;
}

function scanLane(
  s: Search,
  lane: FindTimesInput["free"][number],
  startable: readonly Interval[],
  roomBits: number,
  found: Candidate[],
): void {
  const laneBits =
    roomBits | siteBits(s.input.wishes, lane.siteId) | therapistBits(s.input.wishes, lane.therapistId);
  const clocks = s.clocks.get(lane.siteId) ?? [];
  const known = s.input.seenBy.find((k) => k.therapistId === lane.therapistId);
  const knows = knowsScore(known?.visits ?? 0, known?.isLast ?? false, s.input.seenBy.length > 0);
  let day = 0;
  let run = 0;
  for (const gap of lane.intervals) {
    s.tally.longestFree = Math.max(s.tally.longestFree, gap.to - gap.from);
    const last = gap.to - s.needMs;
    if (last < gap.from) continue;
    const best = new Map<string, Candidate>();
    while (run > 0 && (startable[run - 1]?.to ?? 0) > gap.from) run -= 1;
    for (let r = startable[run]; r !== undefined && r.from <= last; run += 1, r = startable[run]) {
      for (const at of startsBetween(Math.max(gap.from, r.from), Math.min(last, r.to - 1))) {
        while ((clocks[day]?.endsAt ?? Number.POSITIVE_INFINITY) <= at) day += 1;
        const clock = clocks[day];
        if (!clock) continue;
        const c = makeCandidate(s, lane, laneBits, knows, clock, at, gap);
        if (!c) continue;
        const key = `${clock.day}${partOfDay(clock.wallOf(at))}`;
        if (c.score > (best.get(key)?.score ?? -1)) best.set(key, c);
      }
    }
    found.push(...best.values());
  }
}
