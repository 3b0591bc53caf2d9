import { dayClocks } from "@withy/diary/day-clock";
import { findTimes } from "@withy/diary/find-times";
import type { FindTimesInput, FoundTime } from "@withy/diary/found-times";
import { type Interval, subtract } from "@withy/diary/interval";
import { usualWeights, type Weights } from "@withy/diary/rank-time";
import { type Course, demandOf } from "./finding-demand";

/** Twelve weeks from Monday 5 January 2026, booked twice from the same demand: by first-available, and as ranked. */
const start = Date.parse("2026-01-05T00:00:00Z");
const minute = 60_000;
const day = 1440 * minute;
const end = start + 84 * day;
const zone = "Europe/London";
const sites = ["saltgate", "tollhouse"].map((id) => ({ id, name: id, zone }));
const therapists = Array.from({ length: 8 }, (_, n) => ({ id: `t${n}`, name: `Therapist ${n}` }));
const siteOf = (n: number): string => (n < 5 ? "saltgate" : "tollhouse");
const always = [{ from: start, to: end + 60 * day }];
// A room for everyone who works there: the therapists' time is what is short.
const rooms = sites.map(({ id }) => ({ id: `room ${id}`, name: "Room", siteId: id, free: always }));

type Lane = { therapistId: string; siteId: string; intervals: Interval[] };

function emptyDiary(): Lane[] {
  const days = dayClocks(new Date(start), new Date(end), zone).filter((c) => c.weekday <= 5);
  return therapists.map(({ id }, n) => ({
    therapistId: id,
    siteId: siteOf(n),
    intervals: days.flatMap((c) => [
      { from: c.instantOf(480), to: c.instantOf(720) },
      { from: c.instantOf(780), to: c.instantOf(1020) },
    ]),
  }));
}

interface Call {
  readonly course: Course;
  readonly visit: number;
  readonly at: number;
  /** Not before; for a follow-up, so many days after the last visit. */
  readonly from: number;
}

interface Way {
  readonly name: string;
  readonly weights: Weights;
}

interface Tally {
  minutes: number;
  visits: number;
  waited: number;
  followUps: number;
  same: number;
  lost: number;
}

const lookAhead = 28 * day;

function ask(call: Call, lanes: readonly Lane[], seen: Map<string, number>, last: string | null, way: Way) {
  const to = Math.min(call.from + lookAhead, end);
  const free = lanes.map((lane) => ({
    ...lane,
    intervals: lane.intervals
      .filter((i) => i.to > call.from && i.from < to)
      .map((i) => ({ from: Math.max(i.from, call.from), to: i.to })),
  }));
  const input: FindTimesInput = {
    ...{ now: new Date(call.at), from: new Date(call.from), to: new Date(to) },
    ...{ durationMinutes: call.visit === 0 ? 45 : 30, cleanDownMinutes: 5, shortestSellableMinutes: 35 },
    ...{ sites, therapists, free, rooms, wishes: call.course.wishes, weights: way.weights, limit: 20 },
    seenBy: [...seen].map(([therapistId, visits]) => ({ therapistId, visits, isLast: therapistId === last })),
  };
  return findTimes(input).times.find((t) => t.meetsEveryWish);
}

function book(lanes: readonly Lane[], time: FoundTime): void {
  const lane = lanes.find((l) => l.therapistId === time.therapistId);
  const taken = [{ from: time.startsAt.getTime(), to: time.endsAt.getTime() + 5 * minute }];
  if (lane) lane.intervals = subtract(lane.intervals, taken);
}

/** Answers every call in the order in which it comes; a patient whose wishes nothing meets goes elsewhere. */
function simulate(courses: readonly Course[], way: Way): Tally {
  const tally = { minutes: 0, visits: 0, waited: 0, followUps: 0, same: 0, lost: 0 };
  const lanes = emptyDiary();
  const known = new Map<number, { seen: Map<string, number>; last: string | null }>();
  const calls: Call[] = courses.map((course) => {
    const at = start + course.calledAt * minute;
    return { course, visit: 0, at, from: at };
  });
  for (let n = 0; n < calls.length; n += 1) {
    const call = calls[n];
    if (!call || call.from >= end) continue;
    const file = known.get(call.course.patient) ?? { seen: new Map<string, number>(), last: null };
    known.set(call.course.patient, file);
    const time = ask(call, lanes, file.seen, file.last, way);
    if (!time) {
      tally.lost += 1;
      continue;
    }
    book(lanes, time);
    tally.minutes += (time.endsAt.getTime() - time.startsAt.getTime()) / minute;
    tally.visits += 1;
    tally.waited += (time.startsAt.getTime() - call.from) / day;
    if (call.visit > 0) tally.followUps += 1;
    if (call.visit > 0 && time.therapistId === file.last) tally.same += 1;
    file.seen.set(time.therapistId, (file.seen.get(time.therapistId) ?? 0) + 1);
    file.last = time.therapistId;
    if (call.visit < call.course.followUps) {
      const next = time.startsAt.getTime() + call.course.everyDays * day;
      const later = { ...call, visit: call.visit + 1, at: time.endsAt.getTime(), from: next - (next % day) };
      const place = calls.findIndex((c, k) => k > n && c.at > later.at);
      calls.splice(place < 0 ? calls.length : place, 0, later);
    }
  }
  return tally;
}

// The soonest of the times that meet every wish: a met wish outweighs any wait, and nothing else counts.
const firstAvailable: Way = { name: "first available", weights: { wish: 1000, wait: 1, knows: 0, day: 0 } };
const weights = process.env.WITHY_WEIGHTS ? (JSON.parse(process.env.WITHY_WEIGHTS) as Weights) : usualWeights;
const ranked: Way = { name: "ranked", weights };

let isMet = true;
for (const [seed, newPatients] of [
  [1, 12],
  [2, 18],
  [3, 24],
] as const) {
  const courses = demandOf(seed, newPatients);
  console.log(`\nSeed ${seed}, ${newPatients} new patients a day, ${courses.length} courses`);
  const [plain, best] = [firstAvailable, ranked].map((way) => {
    const t = simulate(courses, way);
    const continuity = t.same / t.followUps;
    console.log(
      `  ${way.name.padEnd(16)} ${String(t.minutes).padStart(7)} minutes sold, mean wait ${(t.waited / t.visits).toFixed(2)} days, continuity ${(continuity * 100).toFixed(1)} %, ${t.visits} visits, ${t.lost} turned away`,
    );
    return { minutes: t.minutes, continuity };
  });
  if (!plain || !best) continue;
  const ratio = best.continuity / plain.continuity;
  const isGood = best.minutes >= plain.minutes && ratio >= 1.5;
  isMet &&= isGood;
  console.log(
    `  ${isGood ? "met" : "MISSED"}: minutes ${((best.minutes / plain.minutes) * 100).toFixed(2)} %, continuity ${ratio.toFixed(2)} x`,
  );
}
process.exitCode = isMet ? 0 : 1;
