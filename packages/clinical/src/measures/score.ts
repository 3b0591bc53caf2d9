import type { ActivityAnswer, Answer, MeasureEntry } from "./entry";
import type {
  ActivityMeasure,
  ItemScale,
  Measure,
  PerformanceTest,
  Questionnaire,
  Transform,
} from "./measure";

/** A scale's value, unrounded, or the reason why there is none. */
export type ScaleScore =
  | {
      readonly scale: string;
      readonly value: number;
      /** Two results are comparable only where these are equal (activities named, stairs used). Null: always. */
      readonly comparedBy: string | null;
    }
  | { readonly scale: string; readonly value: null; readonly reason: string };

const total = (answers: readonly number[]): number => answers.reduce((sum, a) => sum + a, 0);

function transformed(transform: Transform, answered: readonly number[], items: number): number {
  const sum = total(answered);
  const n = answered.length;
  switch (transform.kind) {
    case "sum":
      return sum;
    case "mean":
      return sum / n;
    case "prorated-sum":
      return (sum * items) / n;
    case "reversed-hundred":
      return 100 - (sum * 100) / (n * transform.highest);
    case "hundred":
      return ((sum - n * transform.lowest) * 100) / (n * (transform.highest - transform.lowest));
    case "table":
      return transform.byRawSum[sum] ?? Number.NaN;
  }
}

function reasonForNone(scale: Pick<ItemScale, "missing" | "items">, answered: number): string | null {
  const { missing, items } = scale;
  if (missing.kind === "blank-is-zero") return null;
  const needed = missing.kind === "all-needed" ? items : missing.answered;
  if (answered >= needed) return null;
  return needed === items
    ? `No score: all ${items} items are needed and ${answered} ${answered === 1 ? "was" : "were"} answered.`
    : `No score: at least ${needed} of ${items} items are needed and ${answered} ${answered === 1 ? "was" : "were"} answered.`;
}

/**
 * Scores one scale from its own answers, in item order; null is a blank.
 * @returns the value in the scale's unit, unrounded, or the reason for none. Source: the measure's `scoring`.
 */
export function scoreScale(
  scale: Pick<ItemScale, "key" | "missing" | "items" | "transform">,
  answers: readonly Answer[],
): ScaleScore {
  const filled = scale.missing.kind === "blank-is-zero" ? answers.map((a) => a ?? 0) : answers;
  const answered = filled.filter((a): a is number => a !== null);
  const reason = reasonForNone(scale, answered.length);
  if (reason !== null) return { scale: scale.key, value: null, reason };
  return { scale: scale.key, value: transformed(scale.transform, answered, scale.items), comparedBy: null };
}

/** Which activities count, whatever the order in which they were typed. */
function activitiesKey(activities: readonly ActivityAnswer[]): string {
  return activities
    .filter((a) => a.score !== null)
    .map((a) => a.name.trim().toLowerCase().replace(/\s+/g, " "))
    .sort()
    .join(" | ");
}

function scoreActivities(measure: ActivityMeasure, activities: readonly ActivityAnswer[]): ScaleScore {
  const scored = activities.map((a) => a.score).filter((s): s is number => s !== null);
  const scale = measure.scale.key;
  if (scored.length === 0)
    return { scale, value: null, reason: "No score: none of the activities was scored." };
  return { scale, value: total(scored) / scored.length, comparedBy: activitiesKey(activities) };
}

function scoreReading(
  measure: PerformanceTest,
  entry: Extract<MeasureEntry, { form: "reading" }>,
): ScaleScore {
  const scale = measure.scale.key;
  if (measure.convert === "chair-stands")
    return { scale, value: entry.usedArms === true ? 0 : entry.value, comparedBy: null };
  if (measure.convert === "forty-metres") return { scale, value: 40 / entry.value, comparedBy: null };
  const comparedBy = measure.conditions.includes("steps") ? `${entry.steps ?? 0} steps` : null;
  return { scale, value: entry.value, comparedBy };
}

function scoreQuestionnaire(measure: Questionnaire, answers: readonly Answer[]): ScaleScore[] {
  return measure.scales.map((scale) => {
    const from = scale.firstItem - 1;
    return scoreScale(scale, answers.slice(from, from + scale.items));
  });
}

/**
 * Scores every scale of a measure. Call `checkEntry` first: this trusts that the form and the ranges are right.
 * @throws RangeError where the entry is of another form than the measure
 */
export function scoreMeasure(measure: Measure, entry: MeasureEntry): ScaleScore[] {
  if (measure.form === "items" && entry.form === "items") return scoreQuestionnaire(measure, entry.answers);
  if (measure.form === "activities" && entry.form === "activities")
    return [scoreActivities(measure, entry.activities)];
  if (measure.form === "reading" && entry.form === "reading") return [scoreReading(measure, entry)];
  if (measure.form === "total" && entry.form === "total")
    return [{ scale: measure.scale.key, value: entry.value, comparedBy: null }];
  throw new RangeError(`an entry of form ${entry.form} cannot be scored as ${measure.key}`);
}

/** What must be acted on whatever the total, in words; null where there is nothing. */
export function alarmOf(measure: Measure, entry: MeasureEntry): string | null {
  if (measure.form !== "items" || entry.form !== "items" || !measure.alarm) return null;
  const answer = entry.answers[measure.alarm.item - 1] ?? null;
  if (answer === null) return measure.alarm.ifBlank;
  return answer > measure.alarm.above ? measure.alarm.words : null;
}

/**
 * The other direction of a short form whose guide allows both (0 as none, 100 as extreme): 100 minus the value.
 * Source: HOOS-PS User's Guide, koos.nu.
 */
export function inOtherDirection(value: number): number {
  return 100 - value;
}

/** Kept with every record: which edition of these rules reckoned its scores. */
export const scoringEdition = "2026-12";
