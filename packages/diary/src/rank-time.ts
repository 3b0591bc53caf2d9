/** What counts when times are ranked; the caller puts them in order. */
export const rankConcerns = ["wish", "wait", "knows", "day"] as const;
export type RankConcern = (typeof rankConcerns)[number];

/** How good a time is in each respect, from 0 to 1. */
export type Scores = Readonly<Record<RankConcern, number>>;

/** What the rest of a therapist's gap looks like once a visit is put into it, in minutes. */
export interface GapLeft {
  readonly before: number;
  readonly after: number;
}

/** What comes first counts four times as much as what comes last. */
export function weightsOf(order: readonly RankConcern[]): Readonly<Record<RankConcern, number>> {
  const full = [...order, ...rankConcerns.filter((c) => !order.includes(c))];
  const weight = (c: RankConcern): number => (rankConcerns.length - full.indexOf(c)) / 10;
  return { wish: weight("wish"), wait: weight("wait"), knows: weight("knows"), day: weight("day") };
}

export type Weights = Readonly<Record<RankConcern, number>>;

/** What a practice starts with, in parts of a hundred; the simulation in tests/bench keeps them honest. */
export const usualWeights: Weights = { wish: 40, wait: 15, knows: 30, day: 15 };

export const urgencies = ["routine", "soon", "urgent"] as const;
export type Urgency = (typeof urgencies)[number];
const waitTimes: Record<Urgency, number> = { routine: 1, soon: 2, urgent: 5 };

/**
 * The weights of one search, which add up to 1: the caller's order where there is one, else the practice's own; the
 * more urgent, the more the wait counts.
 */
export function searchWeights(choice: {
  readonly order?: readonly RankConcern[] | undefined;
  readonly weights?: Weights | undefined;
  readonly urgency?: Urgency | undefined;
}): Weights {
  const hasOrder = (choice.order?.length ?? 0) > 0;
  const base = hasOrder ? weightsOf(choice.order ?? []) : (choice.weights ?? usualWeights);
  const pressed = { ...base, wait: base.wait * waitTimes[choice.urgency ?? "routine"] };
  const sum = rankConcerns.reduce((all, c) => all + pressed[c], 0);
  if (!(sum > 0)) return weightsOf([]);
  const share = (c: RankConcern): number => pressed[c] / sum;
  return { wish: share("wish"), wait: share("wait"), knows: share("knows"), day: share("day") };
}

export function totalScore(scores: Scores, weights: Weights): number {
  return (
    scores.wish * weights.wish +
    scores.wait * weights.wait +
    scores.knows * weights.knows +
    scores.day * weights.day
  );
}

/** 1 for now, falling by a twelfth a day at first; always strictly less for a later time. */
export function waitScore(minutes: number): number {
  return Math.exp(-Math.max(0, minutes) / (12 * 1440));
}

/**
 * No time that many minutes on or later can score more than this, however good it is otherwise.
 * @param wish the best wish score that such a time can have
 */
export function bestScoreAfter(minutes: number, weights: Weights, wish = 1): number {
  return totalScore({ wish, wait: waitScore(minutes), knows: 1, day: 1 }, weights);
}

/** @param visits with this therapist; @param isLast whether they gave the patient's last visit */
export function knowsScore(visits: number, isLast: boolean, hasHistory: boolean): number {
  if (!hasHistory) return 0.5;
  if (isLast) return 1;
  return visits > 0 ? 0.6 : 0.2;
}

/** Minutes that a visit leaves in gaps too short for any service to be sold in. */
export function wastedMinutes(left: GapLeft, shortest: number): number {
  const lost = (minutes: number): number => (minutes > 0 && minutes < shortest ? minutes : 0);
  return lost(left.before) + lost(left.after);
}

/** 1 fills a gap exactly; a visit at one edge is nearly as good; splitting a gap costs; wasting minutes costs most. */
export function dayScore(left: GapLeft, shortest: number): number {
  const wasted = wastedMinutes(left, shortest);
  if (wasted > 0) return Math.max(0.1, 0.7 - (0.4 * wasted) / shortest);
  if (left.before > 0 && left.after > 0) return 0.75;
  return left.before + left.after === 0 ? 1 : 0.95;
}

/** 1 where every wish is met; a near miss by hours is forgiven more than another day, site or therapist. */
export function wishScore(brokenBits: number, hoursBit: number, minutesOff: number): number {
  if (brokenBits === 0) return 1;
  if (brokenBits === hoursBit) return Math.max(0.15, 0.65 - minutesOff / 400);
  return 0.35;
}

/** A score as marks out of five, as shown beside a time. */
export const marksOf = (score: number): number => Math.max(0, Math.min(5, Math.round(score * 5)));
