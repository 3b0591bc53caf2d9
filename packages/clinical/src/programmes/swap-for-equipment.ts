import type { Equipment, FormRef } from "../exercises/exercise";
import { findExercise, findForm } from "../exercises/library";
import type { Programme, ProgrammeItem } from "./programme";

/** What this form needs that the home does not have. */
export function missingFor(ref: FormRef, missing: readonly Equipment[]): Equipment[] {
  return (findForm(ref.exercise, ref.form)?.needs ?? []).filter((need) => missing.includes(need));
}

/**
 * The form to do instead: the nearest form of the same exercise that the home can do, the easier one where two
 * are equally near, or else the alternative that needs nothing. Null where nothing is missing.
 */
export function alternativeFor(ref: FormRef, missing: readonly Equipment[]): FormRef | null {
  if (missingFor(ref, missing).length === 0) return null;
  const exercise = findExercise(ref.exercise);
  const form = findForm(ref.exercise, ref.form);
  if (!exercise || !form) return null;
  const possible = exercise.forms.filter((f) => f.needs.every((need) => !missing.includes(need)));
  const distance = (level: number) => Math.abs(level - form.level) + (level > form.level ? 0.5 : 0);
  const nearest = possible.toSorted((a, b) => distance(a.level) - distance(b.level))[0];
  return nearest ? { exercise: exercise.key, form: nearest.key } : exercise.withoutEquipment;
}

function swapItem(item: ProgrammeItem, missing: readonly Equipment[]): ProgrammeItem {
  // The first choice is tried again each time, so that equipment found at home undoes the swap.
  const wished = item.insteadOf ?? { exercise: item.exercise, form: item.form };
  const instead = alternativeFor(wished, missing);
  const now = instead ?? wished;
  if (
    now.exercise === item.exercise &&
    now.form === item.form &&
    (instead === null) === (item.insteadOf === null)
  )
    return item;
  return { ...item, exercise: now.exercise, form: now.form, insteadOf: instead === null ? null : wished };
}

/**
 * The programme with every item that needs missing equipment swapped for its alternative. Side, work, rest and
 * order stay, so the clock does not change; a swap is undone when the equipment turns up.
 */
export function swapForEquipment(programme: Programme, missing: readonly Equipment[]): Programme {
  return {
    ...programme,
    equipmentMissing: missing,
    items: programme.items.map((item) => swapItem(item, missing)),
  };
}
