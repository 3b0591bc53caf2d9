import type { FormRef } from "@withy/clinical/exercises/exercise";
import { exerciseLibrary, findExercise, findForm, searchExercises } from "@withy/clinical/exercises/library";
import {
  type ExerciseLibraryView,
  type ExerciseView,
  exerciseKeyInput,
  exerciseSearchInput,
} from "@withy/contracts/programmes";
import { notFound } from "@withy/core/errors";
import { verb } from "../../verb";

/** The library itself holds no patient's data, so reading it leaves no audit row. */
export const getExerciseLibrary = verb(
  "clinical.read",
  exerciseSearchInput,
  async (_ctx, input): Promise<ExerciseLibraryView> => ({
    exercises: searchExercises({
      ...(input.words === undefined ? {} : { words: input.words }),
      ...(input.region === undefined ? {} : { region: input.region }),
      ...(input.kind === undefined ? {} : { kind: input.kind }),
      ...(input.equipment === "none" ? { equipmentAtHand: [] } : {}),
    }),
    total: exerciseLibrary.length,
  }),
);

export const getExercise = verb(
  "clinical.read",
  exerciseKeyInput,
  async (_ctx, input): Promise<ExerciseView> => {
    const exercise = findExercise(input.key);
    if (!exercise) throw notFound("exercise");
    const harder = exercise.leadsTo === null ? null : findExercise(exercise.leadsTo);
    const easier = exerciseLibrary.filter((e) => e.leadsTo === exercise.key);
    const named = (e: { key: string; name: string }) => ({ key: e.key, name: e.name });
    return {
      ...exercise,
      harderExercise: harder === null ? null : named(harder),
      easierExercises: easier.map(named),
      alternativeName: alternativeName(exercise.withoutEquipment),
    };
  },
);

function alternativeName(ref: FormRef | null): string | null {
  const other = ref === null ? null : findExercise(ref.exercise);
  const form = ref === null ? null : findForm(ref.exercise, ref.form);
  return other && form ? `${other.name}, ${form.name}` : null;
}
