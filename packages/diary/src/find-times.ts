import { dayClocks } from "./day-clock";
import { explainNone } from "./explain-none";
import { explainTime } from "./explain-time";
import type { Candidate, FindTimesInput, FoundTime, FoundTimes } from "./found-times";
import { searchWeights } from "./rank-time";
import { type Search, searchLane, startsWithRoom } from "./search-lane";
import { wishedHours } from "./time-wishes";

const minuteMs = 60_000;
const noStarts = { fitting: [], other: [] };

/** The free room that the visit fills best: the one whose gap it leaves the least of. */
function tightestRoom(input: FindTimesInput, c: Candidate, needMs: number): string | null {
  let best: { id: string; slack: number } | null = null;
  for (const room of input.rooms) {
    if (room.siteId !== c.siteId || (input.wishes.needsRoom === true && room.meetsNeeds === false)) continue;
    const gap = room.free.find((i) => i.from <= c.startsAt && c.startsAt + needMs <= i.to);
    const slack = gap ? gap.to - gap.from : Number.POSITIVE_INFINITY;
    if (gap && slack < (best?.slack ?? Number.POSITIVE_INFINITY)) best = { id: room.id, slack };
  }
  return best?.id ?? null;
}

/**
 * The best times for a visit across therapists, rooms and sites, ranked by the caller's wishes, the wait,
 * continuity with a therapist and what is left of the day. Times that break one wish are offered too, with less
 * weight; those that break more are not. Each says in words why it ranks where it does.
 */
export function findTimes(input: FindTimesInput): FoundTimes {
  const needMs = (input.durationMinutes + input.cleanDownMinutes) * minuteMs;
  const clockByZone = new Map(
    [...new Set(input.sites.map((x) => x.zone))].map((z) => [z, dayClocks(input.from, input.to, z)] as const),
  );
  const search: Search = {
    input,
    needMs,
    hours: wishedHours(input.wishes),
    clocks: new Map(input.sites.map((x) => [x.id, clockByZone.get(x.zone) ?? []])),
    weights: searchWeights(input),
    tally: { lookedAt: 0, longestFree: 0, byBroken: new Map(), earliestBySite: new Map() },
  };
  const startable = new Map(input.sites.map((x) => [x.id, startsWithRoom(search, x.id)] as const));
  const candidates = input.free.flatMap((lane) =>
    searchLane(search, lane, startable.get(lane.siteId) ?? noStarts),
  );
  candidates.sort(
    (a, b) => b.score - a.score || a.startsAt - b.startsAt || a.therapistId.localeCompare(b.therapistId),
  );
  const times: FoundTime[] = [];
  for (const c of candidates.slice(0, input.limit)) {
    const roomId = tightestRoom(input, c, needMs);
    if (roomId !== null) times.push(explainTime(input, search.tally, c, roomId));
  }
  const meetingEveryWish = search.tally.byBroken.get(0)?.times ?? 0;
  const none = meetingEveryWish > 0 ? null : explainNone(input, search.tally, needMs);
  return { times, lookedAt: search.tally.lookedAt, meetingEveryWish, none };
}
