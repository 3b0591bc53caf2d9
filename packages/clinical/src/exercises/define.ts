import type { Equipment, Exercise, ExerciseForm } from "./exercise";
import type { Figure } from "./pose";

/** One rung of a ladder. Level is on the scale that all ladders share, 1 (least) to 10 (most). */
export function form(
  key: string,
  level: number,
  name: string,
  how: string,
  needs: readonly Equipment[] = [],
  figure?: Figure,
): ExerciseForm {
  const base = { key, level, name, how, needs };
  return figure === undefined ? base : { ...base, figure };
}

type Optional = "place" | "supports" | "withoutEquipment" | "leadsTo";

export function exercise(given: Omit<Exercise, Optional> & Partial<Pick<Exercise, Optional>>): Exercise {
  return {
    place: null,
    supports: ["worktop", "chair-back", "rail"],
    withoutEquipment: null,
    leadsTo: null,
    ...given,
  };
}
