import { chairStandNorms, chairStandSource } from "./catalogue/chair-stand";
import { fiveTimesFallCut, fiveTimesNormSource, fiveTimesNorms } from "./catalogue/five-times-sit-to-stand";
import { timedUpAndGoFlag } from "./catalogue/timed-up-and-go";
import type { Measure, Scale, Source } from "./measure";
import { formatScore, roundForDisplay } from "./rounding";

/** Who was measured. Published norms know men and women only; anything else has no norm. */
export interface MeasuredPerson {
  /** Whole years on the day of measuring. */
  readonly age: number;
  readonly sex: "male" | "female" | null;
}

/** A comparison with published values for people of that age. */
export interface NormReading {
  readonly standing: "below" | "not-below" | "flagged" | "no-norm";
  readonly words: string;
  readonly source: Source | null;
}

const none = (words: string): NormReading => ({ standing: "no-norm", words, source: null });

/** The named band of a value, by its rounded value so that the word and the number never disagree; null where none is published. */
export function bandOf(scale: Scale, value: number): string | null {
  const shown = roundForDisplay(value, scale.decimals);
  return scale.bands?.find((band) => shown >= band.from && shown <= band.to)?.words ?? null;
}

/**
 * 30-second chair stand against the age band: fewer than the band's number is below average.
 * Source: CDC STEADI, as quoted. Ages 60 to 94, men and women.
 */
export function readChairStand(stands: number, { age, sex }: MeasuredPerson): NormReading {
  const row = chairStandNorms.find((r) => age >= r.from && age <= r.to);
  if (!row) return none("No published value for this age (60 to 94 only).");
  if (sex === null) return none("No published value without a recorded sex.");
  const expected = row[sex];
  const who = `${sex === "male" ? "men" : "women"} ${row.from} to ${row.to}`;
  return stands < expected
    ? {
        standing: "below",
        words: `Below average for ${who}: ${expected} or more expected.`,
        source: chairStandSource,
      }
    : {
        standing: "not-below",
        words: `Not below average for ${who}: ${expected} or more expected.`,
        source: chairStandSource,
      };
}

/** Timed up and go: 12 seconds or more raises the flag (CDC STEADI, from memory; the end is included). */
export function readTimedUpAndGo(seconds: number): NormReading {
  const { source } = timedUpAndGoFlag;
  return seconds >= timedUpAndGoFlag.seconds
    ? { standing: "flagged", words: "12 seconds or more: think about the risk of falling.", source }
    : { standing: "not-below", words: "Under 12 seconds.", source };
}

/**
 * Five times sit to stand: over 15 seconds goes with repeated falls (Buatois 2008, as quoted); else against the age
 * band, where more seconds than the band's number is worse than average (Bohannon 2006). Ages 60 to 89.
 */
export function readFiveTimes(seconds: number, { age }: Pick<MeasuredPerson, "age">): NormReading {
  if (seconds > fiveTimesFallCut.seconds) {
    return {
      standing: "flagged",
      words: "Over 15 seconds: think about the risk of falling again.",
      source: fiveTimesFallCut.source,
    };
  }
  const row = fiveTimesNorms.find((r) => age >= r.from && age <= r.to);
  if (!row) return none("No published value for this age (60 to 89 only).");
  const expected = `${formatScore(row.seconds, 1)} seconds or less expected at ${row.from} to ${row.to}`;
  return seconds > row.seconds
    ? { standing: "below", words: `Worse than average: ${expected}.`, source: fiveTimesNormSource }
    : { standing: "not-below", words: `Not worse than average: ${expected}.`, source: fiveTimesNormSource };
}

/** The published comparison for a performance test; null where the measure has none. */
export function readNorm(measure: Measure, value: number, person: MeasuredPerson): NormReading | null {
  if (measure.key === "chair-stand-30") return readChairStand(value, person);
  if (measure.key === "timed-up-and-go") return readTimedUpAndGo(value);
  if (measure.key === "five-times-sit-to-stand") return readFiveTimes(value, person);
  return null;
}
