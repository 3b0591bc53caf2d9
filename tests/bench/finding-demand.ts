import type { TimeWishes } from "@withy/diary/time-wishes";

/** One patient's course of treatment as it is asked for, the same for every way of booking. */
export interface Course {
  readonly patient: number;
  /** Minutes after the first midnight at which the first call comes. */
  readonly calledAt: number;
  readonly followUps: number;
  /** Days from one visit to the next. */
  readonly everyDays: number;
  readonly wishes: TimeWishes;
}

/** Mulberry32, a small published generator: the same seed gives the same demand on every machine. */
export function seeded(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let t = Math.imul(state ^ (state >>> 15), 1 | state);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) / 4_294_967_296;
  };
}

const someDays = [[1, 3, 5], [2, 4], [1, 2], [4, 5], [3]] as const;

function wishesOf(random: () => number): TimeWishes {
  const weekdays = random() < 0.3 ? someDays[Math.floor(random() * someDays.length)] : undefined;
  const roll = random();
  const partsOfDay = roll < 0.2 ? (["morning"] as const) : roll < 0.4 ? (["afternoon"] as const) : undefined;
  const siteIds = random() < 0.5 ? [random() < 0.6 ? "saltgate" : "tollhouse"] : undefined;
  return { weekdays, partsOfDay, siteIds };
}

/** Twelve weeks of new patients, on working days from eight to five, in the order in which they call. */
export function demandOf(seed: number, newPatientsADay: number): Course[] {
  const random = seeded(seed);
  const courses: Course[] = [];
  for (let day = 0; day < 84; day += 1) {
    if (day % 7 > 4) continue;
    for (let n = 0; n < newPatientsADay; n += 1)
      courses.push({
        patient: courses.length,
        calledAt: day * 1440 + 480 + Math.floor(random() * 540),
        followUps: 2 + Math.floor(random() * 5),
        everyDays: random() < 0.7 ? 7 : 14,
        wishes: wishesOf(random),
      });
  }
  return courses;
}
