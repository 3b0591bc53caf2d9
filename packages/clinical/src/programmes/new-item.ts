import { findExercise, standardForm } from "../exercises/library";
import type { ItemSide, Programme, ProgrammeItem } from "./programme";

export const emptyProgramme: Programme = {
  mode: "timed",
  rounds: 2,
  restBetweenRoundsSeconds: 0,
  lastRest: "kept",
  restBetweenItemsSeconds: 30,
  sessionsPerWeek: 3,
  equipmentMissing: [],
  advice: "",
  items: [],
};

const clamp = (value: number, [low, high]: readonly [number, number]) => Math.min(high, Math.max(low, value));

/**
 * Lines for an exercise in its standard form, doses at 30 s work and 30 s rest, or 2 sets of 10, kept inside
 * the exercise's own range. In a timed session a one-sided movement becomes two lines, left and then right, so
 * that each has its place on the clock; in sets it is one line for each side.
 */
export function newItems(exerciseKey: string, mode: Programme["mode"], newId: () => string): ProgrammeItem[] {
  const exercise = findExercise(exerciseKey);
  if (!exercise) return [];
  const { dose } = exercise;
  const holds = dose.holdSeconds[0] > 0;
  const line = (side: ItemSide): ProgrammeItem => ({
    id: newId(),
    exercise: exercise.key,
    form: standardForm(exercise).key,
    side,
    support: null,
    workSeconds: clamp(30, dose.workSeconds),
    restSeconds: clamp(30, dose.restSeconds),
    sets: clamp(2, dose.sets),
    repetitions: clamp(10, dose.repetitions),
    repetitionSeconds: clamp(4, dose.repetitionSeconds),
    holdSeconds: holds ? clamp(10, dose.holdSeconds) : 0,
    restBetweenSetsSeconds: clamp(45, dose.restSeconds),
    note: "",
    insteadOf: null,
  });
  if (exercise.sides === "together") return [line("both")];
  return mode === "timed" ? [line("left"), line("right")] : [line("each")];
}
