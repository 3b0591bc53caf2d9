"use client";
import { startTimes } from "@withy/clinical/programmes/equation";
import type { Programme } from "@withy/clinical/programmes/programme";
import { type DragEvent, useState } from "react";
import type { ItemActions } from "../item-actions";
import { ItemLine } from "./item-line";

/** The lines in their order. A line's number can be dragged; Alt with an arrow or the buttons do the same. */
export function ItemList({
  programme,
  chosenId,
  canWrite,
  actions,
}: {
  programme: Programme;
  chosenId: string | null;
  canWrite: boolean;
  actions: ItemActions;
}) {
  const [dragged, setDragged] = useState<{ id: string; over: number | null } | null>(null);
  const starts = startTimes(programme);
  const dragOf = (id: string, index: number) => ({
    isTarget: dragged?.over === index && dragged.id !== id,
    onDragStart: (event: DragEvent) => {
      event.dataTransfer.effectAllowed = "move";
      event.dataTransfer.setData("text/plain", String(index + 1));
      setDragged({ id, over: null });
    },
    onDragOver: (event: DragEvent) => {
      if (!dragged) return;
      event.preventDefault();
      if (dragged.over !== index) setDragged({ ...dragged, over: index });
    },
    onDrop: (event: DragEvent) => {
      event.preventDefault();
      if (dragged) actions.move(dragged.id, index);
      setDragged(null);
    },
  });
  return (
    <ol className="items" onDragEnd={() => setDragged(null)}>
      {programme.items.map((item, index) => (
        <ItemLine
          key={item.id}
          programme={programme}
          item={item}
          index={index}
          startSecond={starts[index] ?? 0}
          isChosen={item.id === chosenId}
          canWrite={canWrite}
          actions={actions}
          drag={dragOf(item.id, index)}
        />
      ))}
    </ol>
  );
}
