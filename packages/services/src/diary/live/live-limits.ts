/** A question to the database about once a second for each practice, whatever the number of streams. */
export const roundMs = 900;

/**
 * How far back each round reads again. A change is seen at its commit but its id is made before: a transaction that
 * waits for a lock may commit an earlier id after a later one was read. A lock wait ends after 50 seconds at the most.
 */
export const overlapMs = 60_000;

/** After this long a stream that comes back is told to read everything again. */
export const replayMs = 10 * 60_000;

/** Who was not heard of for this long has closed the appointment. */
export const presenceSeconds = 60;

/** A time is held for this long after the last sign of the person who is booking it. */
export const holdMinutes = 5;
