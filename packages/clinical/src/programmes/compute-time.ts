import type { LastRest, Programme, ProgrammeItem } from "./programme";

export interface IntervalPlan {
  /** Timed items in one round; a movement done once for each side counts twice. */
  readonly items: number;
  readonly rounds: number;
  readonly workSeconds: number;
  readonly restSeconds: number;
  readonly restBetweenRoundsSeconds?: number;
  readonly lastRest?: LastRest;
}

/**
 * Seconds of an interval session in which every item has the same work and rest.
 * Rule A (the default, "kept"): items × rounds × (work + rest), so the session ends with a rest.
 * Rule B ("dropped"): the same without the very last rest. A rest between rounds comes on top of the item's
 * own rest, once fewer than there are rounds. Common practice; no published source.
 */
export function intervalSeconds(plan: IntervalPlan): number {
  const intervals = plan.items * plan.rounds;
  if (intervals === 0) return 0;
  const between = Math.max(0, plan.rounds - 1) * (plan.restBetweenRoundsSeconds ?? 0);
  const whole = intervals * (plan.workSeconds + plan.restSeconds) + between;
  return plan.lastRest === "dropped" ? whole - plan.restSeconds : whole;
}

/** How many times a line of the programme is done in one round. */
export function timesInARound(item: Pick<ProgrammeItem, "side">): 1 | 2 {
  return item.side === "each" ? 2 : 1;
}

export interface SetPlan {
  readonly sets: number;
  readonly repetitions: number;
  /** Seconds of movement in one repetition: the sum of a tempo such as 3-1-1-0. */
  readonly repetitionSeconds: number;
  readonly holdSeconds?: number;
  readonly restSeconds: number;
  /** Two where the movement is done for each side. */
  readonly sides?: 1 | 2;
}

export interface SetTime {
  readonly underTensionSeconds: number;
  readonly elapsedSeconds: number;
}

/**
 * Time under tension and elapsed seconds of sets: tension is sets × repetitions × (tempo + hold); elapsed adds
 * one rest fewer than there are sets. Each side is a block of its own, so two sides double both. Common practice.
 */
export function setTime(plan: SetPlan): SetTime {
  const sides = plan.sides ?? 1;
  const tension = plan.sets * plan.repetitions * (plan.repetitionSeconds + (plan.holdSeconds ?? 0));
  const rest = Math.max(0, plan.sets - 1) * plan.restSeconds;
  return { underTensionSeconds: tension * sides, elapsedSeconds: (tension + rest) * sides };
}

/** Seconds of one repetition from a tempo of lowering, pause, lifting, pause. */
export function tempoSeconds(tempo: readonly number[]): number {
  return tempo.reduce((sum, part) => sum + part, 0);
}

function timedSeconds(programme: Programme): SetTime {
  const { items, rounds } = programme;
  const last = items.at(-1);
  if (last === undefined || rounds === 0) return { underTensionSeconds: 0, elapsedSeconds: 0 };
  const sum = (of: (item: ProgrammeItem) => number) =>
    items.reduce((total, item) => total + of(item) * timesInARound(item), 0);
  const work = sum((item) => item.workSeconds) * rounds;
  const rest = sum((item) => item.restSeconds) * rounds;
  const between = (rounds - 1) * programme.restBetweenRoundsSeconds;
  const dropped = programme.lastRest === "dropped" ? last.restSeconds : 0;
  return { underTensionSeconds: work, elapsedSeconds: work + rest + between - dropped };
}

export function itemSetTime(item: ProgrammeItem): SetTime {
  return setTime({
    sets: item.sets,
    repetitions: item.repetitions,
    repetitionSeconds: item.repetitionSeconds,
    holdSeconds: item.holdSeconds,
    restSeconds: item.restBetweenSetsSeconds,
    sides: timesInARound(item),
  });
}

/** Seconds of one session, and of work in it. A timed session follows the interval rule item by item. */
export function sessionTime(programme: Programme): SetTime {
  if (programme.mode === "timed") return timedSeconds(programme);
  const times = programme.items.map(itemSetTime);
  const changeOvers = Math.max(0, times.length - 1) * programme.restBetweenItemsSeconds;
  return {
    underTensionSeconds: times.reduce((sum, t) => sum + t.underTensionSeconds, 0),
    elapsedSeconds: times.reduce((sum, t) => sum + t.elapsedSeconds, changeOvers),
  };
}

/** Seconds of a week: each session the same. */
export function weekSeconds(perSession: number, sessionsPerWeek: number): number {
  return perSession * sessionsPerWeek;
}
