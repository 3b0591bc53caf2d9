import { itemSetTime, sessionTime, timesInARound } from "./compute-time";
import type { Programme } from "./programme";

export interface SessionEquation {
  /** Timed items in one round; sides marked "each" count twice. */
  readonly timedItems: number;
  readonly rounds: number;
  /** Work and rest where every item has the same; null where they differ. */
  readonly workSeconds: number | null;
  readonly restSeconds: number | null;
  readonly restBetweenRoundsSeconds: number;
  readonly lastRestDropped: boolean;
  readonly totalSeconds: number;
}

/** The parts of "10 × 2 × (30 + 30) = 20:00", for a timed session. */
export function sessionEquation(programme: Programme): SessionEquation {
  const works = new Set(programme.items.map((item) => item.workSeconds));
  const rests = new Set(programme.items.map((item) => item.restSeconds));
  const only = (values: Set<number>) => (values.size === 1 ? ([...values][0] ?? null) : null);
  return {
    timedItems: programme.items.reduce((sum, item) => sum + timesInARound(item), 0),
    rounds: programme.rounds,
    workSeconds: only(works),
    restSeconds: only(rests),
    restBetweenRoundsSeconds: programme.rounds > 1 ? programme.restBetweenRoundsSeconds : 0,
    lastRestDropped: programme.lastRest === "dropped",
    totalSeconds: sessionTime(programme).elapsedSeconds,
  };
}

/** When each line of the programme starts in the first round, in seconds; the last entry is where it ends. */
export function startTimes(programme: Programme): number[] {
  const starts = [0];
  for (const item of programme.items) {
    const seconds =
      programme.mode === "timed"
        ? (item.workSeconds + item.restSeconds) * timesInARound(item)
        : itemSetTime(item).elapsedSeconds + programme.restBetweenItemsSeconds;
    starts.push((starts.at(-1) ?? 0) + seconds);
  }
  return starts;
}
