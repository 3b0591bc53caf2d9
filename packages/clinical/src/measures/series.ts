import { type Change, compareValues, errorAmount, importanceWords } from "./change";
import type { MeasureEntry } from "./entry";
import { bandOf, type MeasuredPerson, readNorm } from "./interpret";
import { type Measure, type Scale, scalesOf } from "./measure";
import { formatScore } from "./rounding";
import { scoreMeasure } from "./score";

/** One filling-in as it is kept, oldest first in a list. */
export interface RecordedEntry {
  readonly recordId: string;
  /** The site's day, "2026-12-01". */
  readonly takenOn: string;
  readonly enteredBy: string;
  readonly entry: MeasureEntry;
}

export interface SeriesPoint {
  readonly recordId: string;
  readonly takenOn: string;
  /** Unrounded; null where the rule gives no score. */
  readonly value: number | null;
  /** As it is shown, or the reason why there is none. */
  readonly shown: string;
}

export interface Series {
  readonly measureKey: string;
  readonly scaleKey: string;
  readonly points: readonly SeriesPoint[];
  /** From the first scored point to the last; null with fewer than two. */
  readonly change: Change | null;
  /** From the one before the last to the last; null with fewer than three. */
  readonly lastStep: Change | null;
  readonly importance: string | null;
  /** The error band's half width around the first value; null where no error is published. */
  readonly errorAmount: number | null;
  /** What the latest value means by published bands or norms; null where none is published. */
  readonly reading: string | null;
}

interface Scored {
  readonly recordId: string;
  readonly takenOn: string;
  readonly enteredBy: string;
  readonly value: number | null;
  readonly comparedBy: string | null;
  readonly shown: string;
}

function scored(measure: Measure, scale: Scale, record: RecordedEntry): Scored {
  const score = scoreMeasure(measure, record.entry).find((s) => s.scale === scale.key);
  const about = { recordId: record.recordId, takenOn: record.takenOn, enteredBy: record.enteredBy };
  if (!score || score.value === null) {
    return {
      ...about,
      value: null,
      comparedBy: null,
      shown: score && score.value === null ? score.reason : "No score",
    };
  }
  return {
    ...about,
    value: score.value,
    comparedBy: score.comparedBy,
    shown: formatScore(score.value, scale.decimals),
  };
}

function between(scale: Scale, first: Scored | undefined, latest: Scored | undefined): Change | null {
  if (!first || !latest || first === latest || first.value === null || latest.value === null) return null;
  return compareValues(
    scale,
    { value: first.value, comparedBy: first.comparedBy },
    { value: latest.value, comparedBy: latest.comparedBy },
    { isSameRater: first.enteredBy === latest.enteredBy },
  );
}

function seriesOf(
  measure: Measure,
  scale: Scale,
  records: readonly RecordedEntry[],
  person: MeasuredPerson,
): Series {
  const all = records.map((record) => scored(measure, scale, record));
  const withValue = all.filter((p) => p.value !== null);
  const first = withValue[0];
  const latest = withValue.at(-1);
  const change = between(scale, first, latest);
  const isSameRater = first !== undefined && latest !== undefined && first.enteredBy === latest.enteredBy;
  const value = latest?.value ?? null;
  return {
    measureKey: measure.key,
    scaleKey: scale.key,
    points: all.map(({ recordId, takenOn, value: v, shown }) => ({ recordId, takenOn, value: v, shown })),
    change,
    lastStep: withValue.length < 3 ? null : between(scale, withValue.at(-2), latest),
    importance: change ? importanceWords(change) : null,
    errorAmount: scale.error ? errorAmount(scale.error, isSameRater) : null,
    reading:
      value === null ? null : (bandOf(scale, value) ?? readNorm(measure, value, person)?.words ?? null),
  };
}

/**
 * The course of one measure: each scale's points with the change from first to last. Scores are reckoned anew from
 * the answers, so that a series never mixes two editions of a rule.
 * @param records of this measure only, oldest first
 */
export function seriesOfMeasure(
  measure: Measure,
  records: readonly RecordedEntry[],
  person: MeasuredPerson,
): Series[] {
  return scalesOf(measure).map((scale) => seriesOf(measure, scale, records, person));
}
