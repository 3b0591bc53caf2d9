import { type Refusal, refusal } from "@withy/core/refusal";
import type { ActivityMeasure, Measure, PerformanceTest, Questionnaire } from "./measure";

export type Answer = number | null;

/** One of the patient's own activities and how well it goes; null where it was not scored this time. */
export interface ActivityAnswer {
  readonly name: string;
  readonly score: Answer;
}

/** What was typed for one measure on one day, before scoring. */
export type MeasureEntry =
  | { readonly form: "items"; readonly answers: readonly Answer[] }
  | { readonly form: "activities"; readonly activities: readonly ActivityAnswer[] }
  | {
      readonly form: "reading";
      readonly value: number;
      readonly usedArms?: boolean;
      readonly steps?: number;
      readonly walkingAid?: string;
    }
  | { readonly form: "total"; readonly value: number };

const within = (n: number, min: number, max: number): boolean => Number.isFinite(n) && n >= min && n <= max;
const wrong = (message: string, field: string): Refusal => refusal("measure-entry", message, field);

function checkItems(measure: Questionnaire, answers: readonly Answer[]): Refusal | null {
  if (answers.length !== measure.items) {
    return wrong(
      `${measure.shortLabel} has ${measure.items} items. Enter each one, and leave a blank where none was given.`,
      "answers",
    );
  }
  const { min, max } = measure.answer;
  const at = answers.findIndex((a) => a !== null && !(Number.isInteger(a) && within(a, min, max)));
  if (at < 0) return null;
  const what = measure.items === 1 ? measure.shortLabel : `Item ${at + 1}`;
  return wrong(`${what} must be a whole number from ${min} to ${max}.`, `answers.${at}`);
}

function checkActivities(measure: ActivityMeasure, activities: readonly ActivityAnswer[]): Refusal | null {
  if (activities.length < measure.fewest || activities.length > measure.most) {
    return wrong(`Name ${measure.fewest} to ${measure.most} activities.`, "activities");
  }
  const unnamed = activities.findIndex((a) => a.name.trim() === "");
  if (unnamed >= 0)
    return wrong(`Name activity ${unnamed + 1} in the patient's own words.`, `activities.${unnamed}.name`);
  const names = activities.map((a) => a.name.trim().toLowerCase());
  const twice = names.findIndex((name, i) => names.indexOf(name) !== i);
  if (twice >= 0)
    return wrong(`Activity ${twice + 1} is named twice. Change one of them.`, `activities.${twice}.name`);
  const { min, max } = measure.answer;
  const bad = activities.findIndex(
    (a) => a.score !== null && !(Number.isInteger(a.score) && within(a.score, min, max)),
  );
  return bad < 0
    ? null
    : wrong(`Activity ${bad + 1} must be a whole number from ${min} to ${max}.`, `activities.${bad}.score`);
}

function checkReading(
  measure: PerformanceTest,
  entry: Extract<MeasureEntry, { form: "reading" }>,
): Refusal | null {
  const { label, min, max, isWhole } = measure.reading;
  if (!within(entry.value, min, max) || (isWhole && !Number.isInteger(entry.value))) {
    return wrong(`${label} must be a ${isWhole ? "whole " : ""}number from ${min} to ${max}.`, "value");
  }
  if (!measure.conditions.includes("steps")) return null;
  if (entry.steps === undefined) return wrong("Enter how many steps the stairs have.", "steps");
  if (Number.isInteger(entry.steps) && within(entry.steps, 3, 30)) return null;
  return wrong("The number of steps must be a whole number from 3 to 30.", "steps");
}

/** Why an entry cannot be scored at all (out of range, wrong form), or null. Blanks are not a fault: scoring has its rules for them. */
export function checkEntry(measure: Measure, entry: MeasureEntry): Refusal | null {
  if (measure.form === "items" && entry.form === "items") return checkItems(measure, entry.answers);
  if (measure.form === "activities" && entry.form === "activities")
    return checkActivities(measure, entry.activities);
  if (measure.form === "reading" && entry.form === "reading") return checkReading(measure, entry);
  if (measure.form === "total" && entry.form === "total") {
    const { min, max } = measure.scale;
    if (max !== null && within(entry.value, min, max)) return null;
    return wrong(`The total must be a number from ${min} to ${max}.`, "value");
  }
  return wrong(`These answers do not belong to ${measure.label}.`, "measure");
}
