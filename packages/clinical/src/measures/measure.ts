/** Where a figure comes from and how far it may be trusted. */
export interface Source {
  readonly citation: string;
  /** read: seen in the named source. secondary: seen in a work that quotes it. memory: to be confirmed. */
  readonly standing: "read" | "secondary" | "memory" | "common practice";
}

export type Better = "higher" | "lower";

/** The smallest change that is more than measurement error, in the scale's own unit. */
export interface ErrorThreshold {
  /** A change of at least this much is beyond error. */
  readonly amount: number;
  /** The smaller figure that holds where one and the same person measured both times. */
  readonly sameRaterAmount?: number;
  readonly label: string;
  readonly population: string;
  readonly source: Source;
}

/** A published change for the better that matters to people. Several may stand side by side; each is reported. */
export interface ImportanceThreshold {
  readonly amount: number;
  /** Where a range is published: at or over `upTo` is above all published values. */
  readonly upTo?: number;
  /** points: in the scale's unit. percent: of the first value. */
  readonly of: "points" | "percent";
  readonly label: string;
  readonly population: string;
  readonly source: Source;
  /** A figure that a later study could not confirm, or that comes from memory: shown, never used to decide. */
  readonly isGuidanceOnly?: boolean;
}

/** A named part of the range, ends included, in rounded values. */
export interface Band {
  readonly from: number;
  readonly to: number;
  readonly words: string;
}

export interface Scale {
  readonly key: string;
  readonly label: string;
  readonly unit: "points" | "stands" | "seconds" | "metres a second" | "ticks";
  readonly min: number;
  /** Null where no upper end exists (times and counts). */
  readonly max: number | null;
  /** Decimal places that are shown. Values are kept unrounded. */
  readonly decimals: 0 | 1 | 2;
  readonly better: Better;
  readonly error: ErrorThreshold | null;
  readonly importance: readonly ImportanceThreshold[];
  readonly bands?: readonly Band[];
  readonly bandSource?: Source;
}

/** How blanks are treated. */
export type MissingRule =
  | { readonly kind: "all-needed" }
  | { readonly kind: "at-least"; readonly answered: number }
  | { readonly kind: "blank-is-zero" };

/** How answers become the scale's value. */
export type Transform =
  | { readonly kind: "sum" }
  | { readonly kind: "mean" }
  /** Sum with each blank taken as the mean of the answered. */
  | { readonly kind: "prorated-sum" }
  /** 100 minus the mean's share of the highest answer, times 100. */
  | { readonly kind: "reversed-hundred"; readonly highest: number }
  /** (mean minus lowest) over the range, times 100. */
  | { readonly kind: "hundred"; readonly lowest: number; readonly highest: number }
  | { readonly kind: "table"; readonly byRawSum: readonly number[] };

/** One scale's share of the numbered items. */
export interface ItemScale extends Scale {
  readonly firstItem: number;
  readonly items: number;
  readonly missing: MissingRule;
  readonly transform: Transform;
}

interface MeasureBase {
  readonly key: string;
  readonly label: string;
  readonly shortLabel: string;
  /** Printed wherever the result is shown to someone else. */
  readonly credit: string;
  readonly scoring: Source;
  /** Said beside the entry. Our own words. */
  readonly advice: readonly string[];
}

/** Numbered items, each a whole number in a range. The published sentences are loaded by the practice. */
export interface Questionnaire extends MeasureBase {
  readonly form: "items";
  readonly items: number;
  readonly answer: { readonly min: number; readonly max: number };
  /** Our own wording of each item, where the measure is a generic one without an owner. */
  readonly ownWording?: readonly string[];
  readonly scales: readonly ItemScale[];
  /** An item that must be acted on whatever the total. */
  readonly alarm?: {
    readonly item: number;
    readonly above: number;
    readonly words: string;
    readonly ifBlank: string;
  };
}

/** Three to five activities named by the patient, each 0 to 10. */
export interface ActivityMeasure extends MeasureBase {
  readonly form: "activities";
  readonly fewest: number;
  readonly most: number;
  readonly answer: { readonly min: number; readonly max: number };
  readonly scale: Scale;
  /** The error of one activity alone, larger than that of the mean. */
  readonly oneActivityError: ErrorThreshold;
}

/** A performance test: one reading, and the conditions that decide whether two readings may be compared. */
export interface PerformanceTest extends MeasureBase {
  readonly form: "reading";
  readonly reading: {
    readonly label: string;
    readonly min: number;
    readonly max: number;
    readonly isWhole: boolean;
  };
  readonly scale: Scale;
  readonly convert: "as-read" | "chair-stands" | "forty-metres";
  readonly conditions: readonly ("used-arms" | "steps" | "walking-aid")[];
}

/** A licensed instrument: the practice works from its own licensed form and types the total. */
export interface LicensedTotal extends MeasureBase {
  readonly form: "total";
  readonly scale: Scale;
  readonly licence: string;
}

export type Measure = Questionnaire | ActivityMeasure | PerformanceTest | LicensedTotal;

/** All scales of a measure, in order. */
export function scalesOf(measure: Measure): readonly Scale[] {
  return measure.form === "items" ? measure.scales : [measure.scale];
}

/** One scale by its key, or null. */
export function findScale(measure: Measure, key: string): Scale | null {
  return scalesOf(measure).find((scale) => scale.key === key) ?? null;
}
