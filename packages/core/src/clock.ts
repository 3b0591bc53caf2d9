/** Where "now" comes from. Rules and verbs never read the machine's clock themselves. */
export interface Clock {
  now(): Date;
}

export const systemClock: Clock = { now: () => new Date() };

/** A clock that stands still until it is told to move. For tests and for the seed. */
export function fixedClock(
  start: Date | string,
): Clock & { set(to: Date | string): void; advance(minutes: number): void } {
  let at = new Date(start);
  return {
    now: () => new Date(at),
    set: (to) => {
      at = new Date(to);
    },
    advance: (minutes) => {
      at = new Date(at.getTime() + minutes * 60_000);
    },
  };
}
