import { withCleanDown } from "../availability";
import { type DayClock, dayClocks } from "../day-clock";
import { contains, type Interval, overlaps, subtract, union } from "../interval";
import { coverCost, coverPoints } from "./cover-cost";
import {
  type CandidatePlace,
  type CoverLane,
  type CoverProblem,
  type CoverRoom,
  type CoverVisit,
  visitNeedMs,
} from "./cover-problem";

const minuteMs = 60_000;
const dayMs = 24 * 60 * minuteMs;
const gridMs = 5 * minuteMs;
const quarterMs = 15 * minuteMs;

/** Rooms tried for one start: more add nothing but size. They differ from therapist to therapist. */
const roomsEach = 3;

/** Candidate places of one visit. */
export interface FoundPlaces {
  /** Cheapest first. */
  readonly places: readonly CandidatePlace[];
  /** Whether there are more, dearer than these. */
  readonly isCut: boolean;
  /** Why there is none; null where there is one. */
  readonly problem: string | null;
}

/** Starts to try in a gap: its edges, every quarter of an hour, and the visit's own time of day. */
function startsIn(from: number, last: number, own: number): number[] {
  const lo = Math.ceil(from / gridMs) * gridMs;
  const hi = Math.floor(last / gridMs) * gridMs;
  if (lo > hi) return [];
  const starts = new Set([lo, hi]);
  for (let at = Math.ceil(lo / quarterMs) * quarterMs; at < hi; at += quarterMs) starts.add(at);
  if (own >= lo && own <= hi) starts.add(own);
  return [...starts];
}

/** Free time of a lane for a visit, clean-down included: cleaning may run into a break, treating may not. */
export function laneFree(lane: CoverLane, cleanDownMinutes: number): Interval[] {
  return subtract(withCleanDown(lane.working, cleanDownMinutes), union(lane.taken));
}

const suits = (room: CoverRoom, visit: CoverVisit): boolean =>
  room.kind === visit.roomKind && visit.needsEquipment.every((code) => room.equipment.includes(code));

const isHeldUp = (problem: CoverProblem, visit: CoverVisit, at: Interval): boolean =>
  visit.patientIds.some((id) => (problem.patientBusy.get(id) ?? []).some((busy) => overlaps(busy, at)));

const isSoonEnough = (problem: CoverProblem, visit: CoverVisit, startsAt: number): boolean =>
  startsAt === visit.startsAt
    ? startsAt > problem.now
    : startsAt >= problem.now + problem.noticeMinutes * minuteMs;

interface Start {
  readonly startsAt: number;
  readonly lane: CoverLane;
  readonly laneNumber: number;
  readonly days: number;
  readonly minutes: number;
  readonly least: number;
}

/** One lane as one visit sees it: its days, and what is free for a visit of that length. */
interface LaneSearch {
  readonly lane: CoverLane;
  readonly laneNumber: number;
  readonly clocks: readonly DayClock[];
  readonly free: readonly Interval[];
}

const zoneOf = (problem: CoverProblem, siteId: string): string =>
  problem.sites.find((s) => s.id === siteId)?.zone ?? "UTC";

function clocksIn(problem: CoverProblem, visit: CoverVisit, zone: string): DayClock[] {
  return dayClocks(new Date(visit.startsAt), new Date(visit.startsAt + problem.daysAfter * dayMs), zone);
}

function lanesFor(problem: CoverProblem, visit: CoverVisit): LaneSearch[] {
  const zones = new Map(
    [...new Set(problem.sites.map((s) => s.zone))].map((z) => [z, clocksIn(problem, visit, z)] as const),
  );
  return problem.lanes.flatMap((lane, laneNumber) => {
    if (!visit.therapistIds.includes(lane.therapistId)) return [];
    const clocks = zones.get(zoneOf(problem, lane.siteId)) ?? [];
    return [{ lane, laneNumber, clocks, free: laneFree(lane, visit.cleanDownMinutes) }];
  });
}

/** Every start of one lane on one day that the therapist could give, priced as if the room were the same. */
function startsOn(
  problem: CoverProblem,
  visit: CoverVisit,
  { lane, laneNumber, clocks, free }: LaneSearch,
  days: number,
  ownWall: number,
): Start[] {
  const clock = clocks[days];
  if (!clock) return [];
  const need = visitNeedMs(visit);
  const { therapistId, siteId } = lane;
  const own = days === 0 ? visit.startsAt : clock.instantOf(ownWall);
  const found: Start[] = [];
  for (const gap of free) {
    if (gap.to <= clock.startsAt || gap.from >= clock.endsAt) continue;
    const last = Math.min(gap.to, clock.endsAt) - need;
    for (const startsAt of startsIn(Math.max(gap.from, clock.startsAt), last, own)) {
      if (!isSoonEnough(problem, visit, startsAt)) continue;
      const treated = { from: startsAt, to: startsAt + visit.durationMinutes * minuteMs };
      if (isHeldUp(problem, visit, treated)) continue;
      const minutes = days === 0 ? (startsAt - visit.startsAt) / minuteMs : clock.wallOf(startsAt) - ownWall;
      const { cost } = coverCost(visit, { therapistId, siteId, roomId: visit.roomId, days, minutes });
      found.push({ startsAt, lane, laneNumber, days, minutes, least: cost });
    }
  }
  return found;
}

/** Rooms free for a start: the visit's own first, then the others from another place in the row for each therapist. */
function roomsFor(rooms: readonly CoverRoom[], visit: CoverVisit, start: Start): CoverRoom[] {
  const at = { from: start.startsAt, to: start.startsAt + visitNeedMs(visit) };
  const free = rooms.filter((r) => r.siteId === start.lane.siteId && r.free.some((i) => contains(i, at)));
  const own = free.filter((r) => r.id === visit.roomId);
  const others = free.filter((r) => r.id !== visit.roomId);
  const turn = others.length === 0 ? 0 : start.laneNumber % others.length;
  return [...own, ...others.slice(turn), ...others.slice(0, turn)].slice(0, roomsEach);
}

function whyNone(problem: CoverProblem, visit: CoverVisit, starts: number, rooms: number): string {
  const lanes = problem.lanes.filter((l) => visit.therapistIds.includes(l.therapistId));
  if (lanes.length === 0) return "Nobody who gives this service works at a site within reach in these days.";
  if (rooms === 0) return "No site within reach has a room of the kind that this service needs.";
  if (starts === 0)
    return `Nobody who gives this service has ${visit.durationMinutes} minutes free within ${problem.daysAfter} days at a time when the patient has no other visit.`;
  return "Whenever a therapist is free, no room of the kind that this service needs is.";
}

function placesOf(rooms: readonly CoverRoom[], visit: CoverVisit, start: Start): CandidatePlace[] {
  const { startsAt, days, minutes } = start;
  const { therapistId, siteId } = start.lane;
  return roomsFor(rooms, visit, start).map(({ id: roomId }) => ({
    ...{ startsAt, therapistId, siteId, roomId },
    ...coverCost(visit, { therapistId, siteId, roomId, days, minutes }),
  }));
}

/** What any place so many days later costs at the least, for whoever bears it. */
const leastOn = (visit: CoverVisit, days: number): number =>
  days === 0
    ? 0
    : (coverPoints.otherDay + (days - 1) * coverPoints.furtherDay) * Math.max(1, visit.patientIds.length);

/**
 * Where a visit could go: with whoever gives the service, at any site given, on its own day or one of the days
 * after, in a room of the right kind; never over anything that stands.
 * @param most so many places at most, the cheapest
 */
export function coverPlaces(problem: CoverProblem, visit: CoverVisit, most: number): FoundPlaces {
  const lanes = lanesFor(problem, visit);
  const rooms = problem.rooms.filter((r) => suits(r, visit));
  const ownClock = clocksIn(problem, visit, zoneOf(problem, visit.siteId))[0];
  const ownWall = ownClock?.wallOf(visit.startsAt) ?? 0;
  let places: CandidatePlace[] = [];
  let tried = 0;
  let isCut = false;
  for (let days = 0; days <= problem.daysAfter && !isCut; days += 1) {
    // A later day cannot give anything cheaper than what is there: the rest need not be looked at.
    if ((places[most - 1]?.cost ?? Number.POSITIVE_INFINITY) <= leastOn(visit, days)) isCut = true;
    else {
      const starts = lanes.flatMap((lane) => startsOn(problem, visit, lane, days, ownWall));
      tried += starts.length;
      places.push(...starts.flatMap((start) => placesOf(rooms, visit, start)));
      places.sort((a, b) => a.cost - b.cost || a.startsAt - b.startsAt);
    }
  }
  if (places.length > most) {
    places = places.slice(0, most);
    isCut = true;
  }
  return { places, isCut, problem: places.length > 0 ? null : whyNone(problem, visit, tried, rooms.length) };
}

/** Whether a place is one where the visit could go, whatever it costs. */
export function placeFits(
  problem: CoverProblem,
  visit: CoverVisit,
  place: Pick<CandidatePlace, "startsAt" | "therapistId" | "siteId" | "roomId">,
): boolean {
  const at = { from: place.startsAt, to: place.startsAt + visitNeedMs(visit) };
  const lane = problem.lanes.find((l) => l.therapistId === place.therapistId && l.siteId === place.siteId);
  const room = problem.rooms.find((r) => r.id === place.roomId && r.siteId === place.siteId);
  const treated = { from: at.from, to: at.from + visit.durationMinutes * minuteMs };
  return (
    lane !== undefined &&
    room !== undefined &&
    visit.therapistIds.includes(place.therapistId) &&
    suits(room, visit) &&
    isSoonEnough(problem, visit, place.startsAt) &&
    laneFree(lane, visit.cleanDownMinutes).some((i) => contains(i, at)) &&
    room.free.some((i) => contains(i, at)) &&
    !isHeldUp(problem, visit, treated)
  );
}
