import type { MeasureEntry } from "@withy/clinical/measures/entry";
import type { Measure } from "@withy/clinical/measures/measure";
import type { MeasureAnswers } from "@withy/db/schema";

/** An entry as the row keeps it. */
export function answersOf(entry: MeasureEntry): MeasureAnswers {
  switch (entry.form) {
    case "items":
      return { items: [...entry.answers] };
    case "activities":
      return { items: entry.activities.map((a) => a.score), labels: entry.activities.map((a) => a.name) };
    case "total":
      return { items: [entry.value] };
    case "reading": {
      const details: Record<string, string | number | boolean> = {};
      if (entry.usedArms !== undefined) details.usedArms = entry.usedArms;
      if (entry.steps !== undefined) details.steps = entry.steps;
      if (entry.walkingAid !== undefined && entry.walkingAid !== "") details.walkingAid = entry.walkingAid;
      return { items: [entry.value], details };
    }
  }
}

/** The row's answers as an entry of its measure. */
export function entryOf(measure: Measure, answers: MeasureAnswers): MeasureEntry {
  const { items, labels = [], details = {} } = answers;
  switch (measure.form) {
    case "items":
      return { form: "items", answers: items };
    case "activities":
      return { form: "activities", activities: items.map((score, i) => ({ name: labels[i] ?? "", score })) };
    case "total":
      return { form: "total", value: items[0] ?? 0 };
    case "reading": {
      const { usedArms, steps, walkingAid } = details;
      return {
        form: "reading",
        value: items[0] ?? 0,
        ...(typeof usedArms === "boolean" ? { usedArms } : {}),
        ...(typeof steps === "number" ? { steps } : {}),
        ...(typeof walkingAid === "string" ? { walkingAid } : {}),
      };
    }
  }
}
