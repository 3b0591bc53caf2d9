import { plainDateWords } from "@withy/core/date-words";
import { dayOf, timeOf } from "@withy/core/wall-clock";

export interface EntryTimes {
  /** Entered after the site's day of the visit had ended. */
  readonly isLate: boolean;
  /** Both times in words, for the printed note. */
  readonly words: string;
}

/**
 * When the visit was and when the note was entered. A note is due before the end of the site's working day, so one
 * that is entered on a later day says so. Source: CSP Quality Assurance Standards, section 6.1.1.
 * @param zone the site's IANA zone
 */
export function readEntryTimes(visitAt: Date, enteredAt: Date, zone: string): EntryTimes {
  const visitDay = dayOf(visitAt, zone);
  const entryDay = dayOf(enteredAt, zone);
  const isLate = entryDay > visitDay;
  const visit = `Visit ${plainDateWords(visitDay)} at ${timeOf(visitAt, zone)}`;
  const entry =
    entryDay === visitDay
      ? timeOf(enteredAt, zone)
      : `${plainDateWords(entryDay)} at ${timeOf(enteredAt, zone)}`;
  return { isLate, words: isLate ? `${visit}. Late entry, written ${entry}` : `${visit}, written ${entry}` };
}

/** A state of the text that stood this long was read by someone's eyes, so it is kept. */
export const keptAfterSeconds = 10;
/** While someone writes without a pause, one state a minute is kept. */
export const keptEverySeconds = 60;

/**
 * Whether the state that is about to be overwritten goes into the note's history. Autosave runs every few seconds,
 * and a row for each would bury the changes that matter. The signed state is always kept.
 */
export function isStateKept(times: { savedAt: Date; lastKeptAt: Date | null; now: Date }): boolean {
  const seconds = (from: Date): number => (times.now.getTime() - from.getTime()) / 1000;
  if (seconds(times.savedAt) >= keptAfterSeconds) return true;
  return times.lastKeptAt === null || seconds(times.lastKeptAt) >= keptEverySeconds;
}
