import { foldName } from "@withy/core/names";
import { aerobicIndoors } from "./data/aerobic-indoors";
import { aerobicWalking } from "./data/aerobic-walking";
import { ankleFoot } from "./data/ankle-foot";
import { backMobility } from "./data/back-mobility";
import { backPlanks } from "./data/back-planks";
import { backStrength } from "./data/back-strength";
import { backTurning } from "./data/back-turning";
import { balanceMoving } from "./data/balance-moving";
import { balanceStanding } from "./data/balance-standing";
import { calf } from "./data/calf";
import { hipHinging } from "./data/hip-hinging";
import { hipLying } from "./data/hip-lying";
import { hipMobility } from "./data/hip-mobility";
import { hipStanding } from "./data/hip-standing";
import { kneeEarly } from "./data/knee-early";
import { kneeSteps } from "./data/knee-steps";
import { kneeStrength } from "./data/knee-strength";
import { kneeThigh } from "./data/knee-thigh";
import { neck } from "./data/neck";
import { shoulderMobility } from "./data/shoulder-mobility";
import { shoulderRotators } from "./data/shoulder-rotators";
import { shoulderStrength } from "./data/shoulder-strength";
import {
  type Equipment,
  type Exercise,
  type ExerciseForm,
  equipmentWords,
  type Region,
  regionWords,
  type TrainingKind,
} from "./exercise";

/** Every exercise, grouped by region in the order of the regions list. */
export const exerciseLibrary: readonly Exercise[] = [
  ...hipLying,
  ...hipStanding,
  ...hipHinging,
  ...hipMobility,
  ...kneeStrength,
  ...kneeSteps,
  ...kneeEarly,
  ...kneeThigh,
  ...backStrength,
  ...backPlanks,
  ...backMobility,
  ...backTurning,
  ...shoulderStrength,
  ...shoulderRotators,
  ...shoulderMobility,
  ...balanceStanding,
  ...balanceMoving,
  ...ankleFoot,
  ...calf,
  ...neck,
  ...aerobicWalking,
  ...aerobicIndoors,
];

const byKey = new Map(exerciseLibrary.map((e) => [e.key, e]));

export function findExercise(key: string): Exercise | null {
  return byKey.get(key) ?? null;
}

export function findForm(exerciseKey: string, formKey: string): ExerciseForm | null {
  return findExercise(exerciseKey)?.forms.find((f) => f.key === formKey) ?? null;
}

/** The form that a new item starts with. */
export function standardForm(exercise: Exercise): ExerciseForm {
  const found = exercise.forms.find((f) => f.key === exercise.standard);
  if (!found) throw new Error(`exercise ${exercise.key} names a standard form that it does not have`);
  return found;
}

export interface LibraryFilter {
  readonly words?: string;
  readonly region?: Region;
  readonly kind?: TrainingKind;
  /** Only exercises with a form that needs nothing beyond this equipment. */
  readonly equipmentAtHand?: readonly Equipment[];
}

function searchText(e: Exercise): string {
  const forms = e.forms.map((f) => `${f.name} ${f.needs.map((n) => equipmentWords[n]).join(" ")}`);
  return foldName([e.name, regionWords[e.region], ...e.kinds, ...e.muscles, e.purpose, ...forms].join(" "));
}

const searchTexts = new Map(exerciseLibrary.map((e) => [e.key, searchText(e)]));

/**
 * Exercises that hold every typed word, in any order, accents and case forgiven; those whose name starts
 * with the words come first. An empty filter gives the whole library.
 */
export function searchExercises(filter: LibraryFilter): Exercise[] {
  const typed = foldName(filter.words ?? "");
  const words = typed.split(" ").filter((w) => w !== "");
  const hand = filter.equipmentAtHand;
  const matches = exerciseLibrary.filter(
    (e) =>
      (filter.region === undefined || e.region === filter.region) &&
      (filter.kind === undefined || e.kinds.includes(filter.kind)) &&
      (hand === undefined || e.forms.some((f) => f.needs.every((n) => hand.includes(n)))) &&
      words.every((w) => searchTexts.get(e.key)?.includes(w)),
  );
  const rank = (e: Exercise) => {
    const name = foldName(e.name);
    if (name.startsWith(typed)) return 0;
    return words.every((w) => name.includes(w)) ? 1 : 2;
  };
  return words.length === 0 ? matches : matches.toSorted((a, b) => rank(a) - rank(b));
}
