import { findExercise } from "@withy/clinical/exercises/library";
import type { ProgrammeView } from "@withy/contracts/programmes";
import { newId } from "@withy/core/ids";
import { timeOf } from "@withy/core/wall-clock";
import { useChanges } from "@withy/ui/recent-changes";
import { useState } from "react";
import { addExercise, changeItem, climb, moveItem, putBack, removeItem } from "../draft-changes";
import { useProgrammeDraft } from "./use-programme-draft";

/** The draft with the chosen line and everything that can be done to a line. */
export function useBuilder(first: ProgrammeView) {
  const kept = useProgrammeDraft(first);
  const { announce } = useChanges();
  const [chosenId, choose] = useState<string | null>(null);
  const [ladderSays, setLadderSays] = useState<string | null>(null);
  const programme = kept.draft.content;
  /** What the ladder last said belongs to that moment; the next change ends it. */
  const change: typeof kept.change = (update) => {
    setLadderSays(null);
    kept.change(update);
  };

  const focusLine = (id: string | null) => {
    if (id !== null) requestAnimationFrame(() => document.getElementById(`line-${id}`)?.focus());
  };
  const actions = {
    choose,
    change: (id: string, to: Parameters<typeof changeItem>[2]) => change((p) => changeItem(p, id, to)),
    climb: (id: string, way: "easier" | "harder") => {
      const { programme: next, said } = climb(programme, id, way);
      if (said === null) change(() => next);
      else setLadderSays(said);
    },
    move: (id: string, to: number) => {
      change((p) => moveItem(p, id, to));
      focusLine(id);
    },
    remove: (id: string) => {
      const { items } = programme;
      const index = items.findIndex((item) => item.id === id);
      const item = items[index];
      if (!item) return;
      const name = findExercise(item.exercise)?.name ?? "A line";
      change((p) => removeItem(p, id));
      choose(null);
      focusLine(items[index + 1]?.id ?? items[index - 1]?.id ?? null);
      const undo = async () => change((p) => putBack(p, item, index));
      announce({ at: timeOf(new Date(), first.zone), said: `${name} removed from the programme`, undo });
    },
  };
  const add = (exerciseKey: string) => {
    const { programme: next, firstId } = addExercise(programme, exerciseKey, chosenId, newId);
    change(() => next);
    choose(firstId);
    focusLine(firstId);
  };
  return { kept, programme, chosenId, actions, add, ladderSays };
}
