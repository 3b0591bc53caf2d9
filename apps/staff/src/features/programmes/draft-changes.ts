import type { Equipment, FormRef } from "@withy/clinical/exercises/exercise";
import { type LadderStep, stepEasier, stepHarder } from "@withy/clinical/programmes/ladder";
import { newItems } from "@withy/clinical/programmes/new-item";
import type { Programme, ProgrammeItem } from "@withy/clinical/programmes/programme";
import { missingFor, swapForEquipment } from "@withy/clinical/programmes/swap-for-equipment";

/** Every change that the builder can make to a programme; each gives a new one and leaves the old alone. */

export function changeItem(programme: Programme, id: string, change: Partial<ProgrammeItem>): Programme {
  return {
    ...programme,
    items: programme.items.map((item) => (item.id === id ? { ...item, ...change } : item)),
  };
}

/** The same work or rest for every line at once. */
export function changeAll(
  programme: Programme,
  change: Pick<Partial<ProgrammeItem>, "workSeconds" | "restSeconds">,
) {
  return { ...programme, items: programme.items.map((item) => ({ ...item, ...change })) };
}

/** Whether the line is a left side whose right side follows. */
function isPair(items: readonly ProgrammeItem[], at: number): boolean {
  const [left, right] = [items[at], items[at + 1]];
  return left?.side === "left" && right?.side === "right" && left.exercise === right.exercise;
}

/** New lines stand after the chosen one, or at the end; what is not at home is swapped at once. */
export function addExercise(
  programme: Programme,
  exerciseKey: string,
  afterId: string | null,
  newId: () => string,
): { programme: Programme; firstId: string | null } {
  const lines = newItems(exerciseKey, programme.mode, newId);
  const at = programme.items.findIndex((item) => item.id === afterId);
  const place = at < 0 ? programme.items.length : at + (isPair(programme.items, at) ? 2 : 1);
  const items = [...programme.items.slice(0, place), ...lines, ...programme.items.slice(place)];
  return {
    programme: swapForEquipment({ ...programme, items }, programme.equipmentMissing),
    firstId: lines[0]?.id ?? null,
  };
}

export function removeItem(programme: Programme, id: string): Programme {
  return { ...programme, items: programme.items.filter((item) => item.id !== id) };
}

/** Takes a removal back, without touching what was changed since. */
export function putBack(programme: Programme, item: ProgrammeItem, index: number): Programme {
  if (programme.items.some((other) => other.id === item.id)) return programme;
  return { ...programme, items: programme.items.toSpliced(index, 0, item) };
}

/** Moves a line to the place of another. */
export function moveItem(programme: Programme, id: string, to: number): Programme {
  const from = programme.items.findIndex((item) => item.id === id);
  const item = programme.items[from];
  if (!item || to < 0 || to >= programme.items.length) return programme;
  const rest = programme.items.filter((other) => other.id !== id);
  return { ...programme, items: [...rest.slice(0, to), item, ...rest.slice(to)] };
}

/** Where the ladder leads from a line, passing over rungs that need what is not at home. */
export function ladderFrom(programme: Programme, item: FormRef, way: "easier" | "harder"): LadderStep {
  const step = way === "easier" ? stepEasier : stepHarder;
  let next = step(item);
  while (next.ok && missingFor(next.to, programme.equipmentMissing).length > 0) next = step(next.to);
  return next;
}

export function climb(
  programme: Programme,
  id: string,
  way: "easier" | "harder",
): { programme: Programme; said: string | null } {
  const item = programme.items.find((one) => one.id === id);
  if (!item) return { programme, said: null };
  const next = ladderFrom(programme, item, way);
  if (!next.ok) return { programme, said: next.why.message };
  return { programme: changeItem(programme, id, { ...next.to, insteadOf: null }), said: null };
}

export function setEquipmentMissing(programme: Programme, missing: readonly Equipment[]): Programme {
  return swapForEquipment(programme, missing);
}

/** Changing over keeps every line: sides that were two lines stay two, in sets as well. */
export function setMode(programme: Programme, mode: Programme["mode"]): Programme {
  return { ...programme, mode };
}
