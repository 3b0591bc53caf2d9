/** Minutes to wait after each failed try: quick at first, for a server that restarts; a day and a half in all. */
const waits = [1, 5, 15, 60, 240, 720, 1440] as const;

/** When to try again after this many tries, or null where it is time to give up. */
export function nextTry(attempts: number, now: Date): Date | null {
  const minutes = waits[attempts - 1];
  return minutes === undefined ? null : new Date(now.getTime() + minutes * 60_000);
}

/** A claim older than this belongs to a worker that was killed; sending one message takes seconds. */
export const claimMinutes = 5;

export function claimsLostBefore(now: Date): Date {
  return new Date(now.getTime() - claimMinutes * 60_000);
}
