/** A session ends after this long without a request. */
export const idleMinutes = 120;

/** And in any case after this long: one working day. */
export const absoluteHours = 12;
