import { type Refusal, refusal } from "@withy/core/refusal";
import type { Exercise, ExerciseForm, FormRef } from "../exercises/exercise";
import { exerciseLibrary, findExercise } from "../exercises/library";

export type LadderStep =
  | { readonly ok: true; readonly to: FormRef }
  | { readonly ok: false; readonly why: Refusal };

export interface LadderPlace {
  /** Counted from the easiest, from 1. */
  readonly rung: number;
  readonly rungs: number;
}

const unknown = refusal(
  "exercise-unknown",
  "This exercise is no longer in the library. Choose another one.",
  "exercise",
);

function placed(ref: FormRef): { exercise: Exercise; index: number; form: ExerciseForm } | null {
  const exercise = findExercise(ref.exercise);
  if (!exercise) return null;
  const index = exercise.forms.findIndex((f) => f.key === ref.form);
  const form = exercise.forms[index];
  return form ? { exercise, index, form } : null;
}

export function ladderPlace(ref: FormRef): LadderPlace | null {
  const at = placed(ref);
  return at ? { rung: at.index + 1, rungs: at.exercise.forms.length } : null;
}

const to = (exercise: Exercise, form: ExerciseForm): LadderStep => ({
  ok: true,
  to: { exercise: exercise.key, form: form.key },
});

/**
 * One rung up. Past the top rung the ladder goes on in the exercise that this one leads to, at its first form
 * of a higher level. Only a movement with the same sidedness follows, so that the clock stays as it was.
 */
export function stepHarder(ref: FormRef): LadderStep {
  const at = placed(ref);
  if (!at) return { ok: false, why: unknown };
  const above = at.exercise.forms[at.index + 1];
  if (above) return to(at.exercise, above);
  const next = at.exercise.leadsTo === null ? null : findExercise(at.exercise.leadsTo);
  const form =
    next?.sides === at.exercise.sides ? next.forms.find((f) => f.level > at.form.level) : undefined;
  if (next && form) return to(next, form);
  const message = `${at.exercise.name} is already in its hardest form. Add time, repetitions or a round, or choose another exercise.`;
  return { ok: false, why: refusal("ladder-top", message, "form") };
}

/** One rung down. Under the bottom rung: the hardest easier form of an exercise that leads to this one. */
export function stepEasier(ref: FormRef): LadderStep {
  const at = placed(ref);
  if (!at) return { ok: false, why: unknown };
  const below = at.exercise.forms[at.index - 1];
  if (below) return to(at.exercise, below);
  const before = exerciseLibrary
    .filter((e) => e.leadsTo === at.exercise.key && e.sides === at.exercise.sides)
    .map((e) => ({ e, form: e.forms.findLast((f) => f.level < at.form.level) }))
    .toSorted((a, b) => (b.form?.level ?? 0) - (a.form?.level ?? 0))[0];
  if (before?.form) return to(before.e, before.form);
  const message = `${at.exercise.name} is already in its easiest form. Add support for the hands, shorten the work, or choose another exercise.`;
  return { ok: false, why: refusal("ladder-bottom", message, "form") };
}
