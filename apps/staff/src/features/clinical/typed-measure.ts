import type { Answer, MeasureEntry } from "@withy/clinical/measures/entry";
import type { Measure } from "@withy/clinical/measures/measure";

export interface TypedActivity {
  readonly name: string;
  readonly score: string;
}

/** What stands in the fields, as typed: nothing is lost while it is not yet a number. */
export interface TypedMeasure {
  readonly items: readonly string[];
  readonly activities: readonly TypedActivity[];
  readonly value: string;
  readonly usedArms: boolean;
  readonly steps: string;
  readonly walkingAid: string;
}

/** Empty fields for a measure, with the activities of last time to score again. */
export function emptyFields(measure: Measure, lastActivities: readonly string[] = []): TypedMeasure {
  const count = measure.form === "activities" ? Math.max(measure.fewest, lastActivities.length) : 0;
  return {
    items: measure.form === "items" ? Array.from({ length: measure.items }, () => "") : [],
    activities: Array.from({ length: count }, (_, i) => ({ name: lastActivities[i] ?? "", score: "" })),
    value: "",
    usedArms: false,
    steps: "",
    walkingAid: "",
  };
}

/** A blank is null; what is no number is NaN, which the rule refuses by name. A comma counts as a point. */
function numberIn(text: string): Answer {
  const bare = text.trim().replace(",", ".");
  if (bare === "") return null;
  return /^-?\d+(\.\d+)?$/.test(bare) ? Number(bare) : Number.NaN;
}

/** The fields as an entry of the measure. */
export function entryFrom(measure: Measure, typed: TypedMeasure): MeasureEntry {
  switch (measure.form) {
    case "items":
      return { form: "items", answers: typed.items.map(numberIn) };
    case "activities":
      return {
        form: "activities",
        activities: typed.activities.map(({ name, score }) => ({
          name: name.trim(),
          score: numberIn(score),
        })),
      };
    case "total":
      return { form: "total", value: numberIn(typed.value) ?? Number.NaN };
    case "reading": {
      const steps = numberIn(typed.steps);
      return {
        form: "reading",
        value: numberIn(typed.value) ?? Number.NaN,
        ...(measure.conditions.includes("used-arms") ? { usedArms: typed.usedArms } : {}),
        ...(measure.conditions.includes("steps") && steps !== null ? { steps } : {}),
        ...(typed.walkingAid.trim() === "" ? {} : { walkingAid: typed.walkingAid.trim() }),
      };
    }
  }
}

/** True where nothing at all was answered. */
export function isBlank(measure: Measure, typed: TypedMeasure): boolean {
  if (measure.form === "items") return typed.items.every((item) => item.trim() === "");
  if (measure.form === "activities") return typed.activities.every(({ score }) => score.trim() === "");
  return typed.value.trim() === "";
}
