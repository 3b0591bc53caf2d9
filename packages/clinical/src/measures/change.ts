import type { ErrorThreshold, ImportanceThreshold, Scale } from "./measure";
import { formatScore, reaches, roundForDisplay } from "./rounding";

/** One recorded value of a scale, unrounded, with what it may be compared by. */
export interface RecordedValue {
  readonly value: number;
  readonly comparedBy: string | null;
}

export interface ImportanceReading {
  readonly label: string;
  readonly met: "yes" | "no" | "within-range";
  readonly isGuidanceOnly: boolean;
  readonly population: string;
  readonly source: string;
}

export type Change =
  | {
      readonly kind: "compared";
      /** Latest minus first, unrounded. */
      readonly difference: number;
      readonly direction: "better" | "worse" | "same";
      /** Size as a share of the first value, in percent; null where the first value is 0. */
      readonly percent: number | null;
      /** Null where no measurement error is published. */
      readonly isBeyondError: boolean | null;
      readonly errorAmount: number | null;
      /** Read for a change for the better only; empty otherwise. */
      readonly importance: readonly ImportanceReading[];
      readonly words: string;
    }
  | { readonly kind: "not-comparable"; readonly words: string };

/** The error that holds: the smaller one only where the same person measured both times. */
export function errorAmount(error: ErrorThreshold, isSameRater: boolean): number {
  return isSameRater ? (error.sameRaterAmount ?? error.amount) : error.amount;
}

function readImportance(rule: ImportanceThreshold, size: number, percent: number | null): ImportanceReading {
  const reached = rule.of === "points" ? size : percent;
  const met =
    reached === null || !reaches(reached, rule.amount)
      ? "no"
      : rule.upTo === undefined || reaches(reached, rule.upTo)
        ? "yes"
        : "within-range";
  return {
    label: rule.label,
    met,
    isGuidanceOnly: rule.isGuidanceOnly ?? false,
    population: rule.population,
    source: rule.source.citation,
  };
}

/** Shown with one more decimal where rounding alone would make a change look as large as the error. */
function sizeWords(size: number, amount: number | null, decimals: number): string {
  const places = Math.max(decimals, Number.isInteger(roundForDisplay(size, 3)) ? decimals : 1);
  const misleads =
    amount !== null &&
    !reaches(size, amount) &&
    roundForDisplay(size, places) >= roundForDisplay(amount, places);
  return formatScore(size, misleads ? places + 1 : places);
}

function plain(amount: number): string {
  return Number.isInteger(amount) ? amount.toFixed(1) : String(amount);
}

function words(scale: Scale, direction: "better" | "worse", size: number, amount: number | null): string {
  const by = `${direction === "better" ? "Better" : "Worse"} by ${sizeWords(size, amount, scale.decimals)}`;
  if (amount === null) return `${by}.`;
  return reaches(size, amount)
    ? `${by}, beyond measurement error (${plain(amount)}).`
    : `${by}, within measurement error (${plain(amount)}).`;
}

/**
 * Compares two values of one scale. The difference is taken from the unrounded values; a change of at least the
 * published error is beyond it. Importance is read only for a change for the better, as it was published.
 * @param options.isSameRater true only where one person measured both times
 */
export function compareValues(
  scale: Scale,
  first: RecordedValue,
  latest: RecordedValue,
  options: { isSameRater?: boolean } = {},
): Change {
  if (first.comparedBy !== latest.comparedBy) {
    return { kind: "not-comparable", words: notComparable(scale) };
  }
  const difference = latest.value - first.value;
  const size = Math.abs(difference);
  const percent = first.value === 0 ? null : (size * 100) / Math.abs(first.value);
  const amount = scale.error ? errorAmount(scale.error, options.isSameRater ?? false) : null;
  if (size < 1e-9) {
    return {
      kind: "compared",
      difference: 0,
      direction: "same",
      percent: percent === null ? null : 0,
      isBeyondError: amount === null ? null : false,
      errorAmount: amount,
      importance: [],
      words: "No change.",
    };
  }
  const direction = difference > 0 === (scale.better === "higher") ? "better" : "worse";
  return {
    kind: "compared",
    difference,
    direction,
    percent,
    isBeyondError: amount === null ? null : reaches(size, amount),
    errorAmount: amount,
    importance:
      direction === "better" ? scale.importance.map((rule) => readImportance(rule, size, percent)) : [],
    words: words(scale, direction, size, amount),
  };
}

function notComparable(scale: Scale): string {
  return scale.unit === "seconds"
    ? "Not compared: the stairs were not the same. Use the same ones next time."
    : "Not compared: the activities scored were not the same. Score the same ones next time.";
}

/**
 * The change in one of the patient's own activities alone, whose error is larger than that of the mean.
 * Source: Stratford and others 1995.
 */
export function isActivityChangeBeyondError(error: ErrorThreshold, before: number, after: number): boolean {
  return reaches(Math.abs(after - before), error.amount);
}

/** What the published differences say about a change for the better: which rule is met and which is not. Null where there is none to say. */
export function importanceWords(change: Change): string | null {
  if (change.kind !== "compared" || change.importance.length === 0) return null;
  const deciding = change.importance.filter((rule) => !rule.isGuidanceOnly);
  if (deciding.length === 0) return null;
  const met = deciding.filter((rule) => rule.met === "yes").map((rule) => rule.label);
  const partly = deciding.filter((rule) => rule.met === "within-range").map((rule) => rule.label);
  const unmet = deciding.filter((rule) => rule.met === "no").map((rule) => rule.label);
  const share = change.percent === null ? "" : ` (${formatScore(change.percent, 1)}% of the first value)`;
  const parts = [
    met.length > 0 ? `reaches the published difference that matters: ${met.join(" and ")}` : "",
    partly.length > 0 ? `lies inside the published range ${partly.join(" and ")}` : "",
    unmet.length > 0 ? `does not reach ${unmet.join(" or ")}` : "",
  ].filter((part) => part !== "");
  return `It ${parts.join("; ")}${share}.`;
}

/** True where any deciding rule is met ("either rule"); null where there is none to decide by. */
export function isImportant(change: Change): boolean | null {
  if (change.kind !== "compared") return null;
  const deciding = change.importance.filter((rule) => !rule.isGuidanceOnly);
  if (deciding.length === 0) return change.direction === "better" ? null : false;
  return deciding.some((rule) => rule.met === "yes");
}
