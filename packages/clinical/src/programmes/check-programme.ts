import { type Refusal, refusal } from "@withy/core/refusal";
import { equipmentWords } from "../exercises/exercise";
import { findExercise, findForm } from "../exercises/library";
import type { Programme, ProgrammeItem } from "./programme";
import { missingFor } from "./swap-for-equipment";

/** Widest values that a programme may hold. Seconds unless named otherwise; common practice. */
export const programmeLimits = {
  items: 30,
  rounds: [1, 10],
  sessionsPerWeek: [1, 14],
  workSeconds: [5, 1800],
  restSeconds: [0, 300],
  restBetweenRoundsSeconds: [0, 600],
  restBetweenItemsSeconds: [0, 300],
  sets: [1, 10],
  repetitions: [1, 100],
  repetitionSeconds: [1, 60],
  holdSeconds: [0, 120],
  restBetweenSetsSeconds: [0, 300],
} as const;

type Limited = Exclude<keyof typeof programmeLimits, "items">;

const limitWords: Record<Limited, string> = {
  rounds: "rounds",
  sessionsPerWeek: "sessions a week",
  workSeconds: "seconds of work",
  restSeconds: "seconds of rest",
  restBetweenRoundsSeconds: "seconds between rounds",
  restBetweenItemsSeconds: "seconds between exercises",
  sets: "sets",
  repetitions: "repetitions",
  repetitionSeconds: "seconds a repetition",
  holdSeconds: "seconds of hold",
  restBetweenSetsSeconds: "seconds between sets",
};

function checkNumber(name: Limited, value: number, field: string, where: string): Refusal | null {
  const [low, high] = programmeLimits[name];
  if (Number.isInteger(value) && value >= low && value <= high) return null;
  return refusal("programme-number", `${where}: give ${limitWords[name]} from ${low} to ${high}.`, field);
}

function checkSide(item: ProgrammeItem, index: number, where: string): Refusal | null {
  const sides = findExercise(item.exercise)?.sides;
  const field = `items.${index}.side`;
  if (sides === "together" && item.side !== "both") {
    return refusal("side-not-wanted", `${where} works both sides together. Remove the side.`, field);
  }
  if (sides === "one-at-a-time" && item.side === "both") {
    return refusal(
      "side-missing",
      `${where} is done one side at a time. Choose left, right or each side.`,
      field,
    );
  }
  return null;
}

const itemNumbers = {
  timed: ["workSeconds", "restSeconds"],
  sets: ["sets", "repetitions", "repetitionSeconds", "holdSeconds", "restBetweenSetsSeconds"],
} as const;

function checkItem(programme: Programme, item: ProgrammeItem, index: number): Refusal | null {
  const exercise = findExercise(item.exercise);
  if (!exercise || !findForm(item.exercise, item.form)) {
    return refusal(
      "exercise-unknown",
      `Line ${index + 1} is not in the exercise library. Remove it or choose another exercise.`,
      `items.${index}.exercise`,
    );
  }
  const where = `${index + 1}. ${exercise.name}`;
  const numbers = itemNumbers[programme.mode].map((name) =>
    checkNumber(name, item[name], `items.${index}.${name}`, where),
  );
  return checkSide(item, index, where) ?? numbers.find((r) => r !== null) ?? null;
}

/** Whether a programme may be saved: known exercises, a side where one is needed, numbers within limits. */
export function checkProgramme(programme: Programme): Refusal | null {
  if (programme.items.length > programmeLimits.items) {
    return refusal(
      "programme-too-long",
      `Keep to ${programmeLimits.items} lines or fewer. Remove some.`,
      "items",
    );
  }
  const names = ["rounds", "sessionsPerWeek", "restBetweenRoundsSeconds", "restBetweenItemsSeconds"] as const;
  const numbers = names.map((name) => checkNumber(name, programme[name], name, "This programme"));
  const items = programme.items.map((item, index) => checkItem(programme, item, index));
  return [...numbers, ...items].find((r) => r !== null) ?? null;
}

/** Whether it may be given to the patient: it can be saved, is not empty, and can be done at home. */
export function checkIssue(programme: Programme): Refusal | null {
  const unsound = checkProgramme(programme);
  if (unsound) return unsound;
  if (programme.items.length === 0) {
    return refusal(
      "programme-empty",
      "Add at least one exercise before you give this to the patient.",
      "items",
    );
  }
  for (const [index, item] of programme.items.entries()) {
    const lacking = missingFor(item, programme.equipmentMissing)[0];
    if (lacking) {
      const name = findExercise(item.exercise)?.name ?? "This exercise";
      return refusal(
        "equipment-missing",
        `${index + 1}. ${name} uses what is not at home (${equipmentWords[lacking]}). Swap it for its alternative.`,
        `items.${index}.form`,
      );
    }
  }
  return null;
}
