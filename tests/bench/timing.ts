export interface Timed {
  readonly name: string;
  /** Milliseconds, in the order in which they were taken. */
  readonly taken: number[];
}

const sorted = (taken: readonly number[]) => [...taken].sort((a, b) => a - b);

export function percentile(taken: readonly number[], share: number): number {
  const ordered = sorted(taken);
  return ordered[Math.min(ordered.length - 1, Math.floor(ordered.length * share))] ?? Number.NaN;
}

export const p50 = (timed: Timed): number => percentile(timed.taken, 0.5);

/**
 * Times several pieces of work turn by turn, so that whatever else the machine does falls on all of them alike.
 * The first rounds are not counted.
 */
export async function timeInTurn(
  works: Readonly<Record<string, (round: number) => Promise<unknown>>>,
  rounds: number,
  warmUp: number,
): Promise<Record<string, Timed>> {
  const timed = Object.fromEntries(Object.keys(works).map((name) => [name, { name, taken: [] as number[] }]));
  for (let round = 0; round < rounds + warmUp; round += 1) {
    for (const [name, work] of Object.entries(works)) {
      const from = performance.now();
      await work(round);
      if (round >= warmUp) timed[name]?.taken.push(performance.now() - from);
    }
  }
  return timed;
}
