"use client";
import { equipmentWords, placeWords, supportWords } from "@withy/clinical/exercises/exercise";
import { findExercise, findForm } from "@withy/clinical/exercises/library";
import type { Programme, ProgrammeItem } from "@withy/clinical/programmes/programme";
import { clockDuration } from "@withy/core/date-words";
import type { DragEvent, KeyboardEvent } from "react";
import type { ItemActions } from "../item-actions";
import { ExerciseFigure } from "./exercise-figure";
import { ItemEditor } from "./item-editor";
import { LadderCell } from "./ladder-cell";

interface ItemLineProps {
  programme: Programme;
  item: ProgrammeItem;
  index: number;
  startSecond: number;
  isChosen: boolean;
  canWrite: boolean;
  actions: ItemActions;
  drag: {
    onDragStart: (event: DragEvent) => void;
    onDragOver: (event: DragEvent) => void;
    onDrop: (event: DragEvent) => void;
    isTarget: boolean;
  };
}

/** One line of the programme; choosing it opens its details under it. */
export function ItemLine(props: ItemLineProps) {
  const { programme, item, index, startSecond, isChosen, canWrite, actions, drag } = props;
  const exercise = findExercise(item.exercise);
  const form = findForm(item.exercise, item.form);
  const name = exercise?.name ?? "Not in the library";
  return (
    <li
      data-chosen={isChosen ? "" : undefined}
      data-drop={drag.isTarget ? "" : undefined}
      onDragOver={drag.onDragOver}
      onDrop={drag.onDrop}
    >
      <span className="gut num tick">{clockDuration(startSecond).replace(/^0/, "")}</span>
      <div className="in">
        {/* biome-ignore lint/a11y/noStaticElementInteractions: a handle for the mouse; keys and buttons move lines too */}
        <span
          className="number num"
          draggable={canWrite}
          onDragStart={drag.onDragStart}
          title={canWrite ? "Drag to another place" : undefined}
        >
          {index + 1}
        </span>
        {exercise && <ExerciseFigure figure={form?.figure ?? exercise.figure} size={44} />}
        <ItemName {...props} name={name} formName={form?.name ?? ""} />
        <LadderCell
          programme={programme}
          item={item}
          canWrite={canWrite}
          onClimb={(way) => actions.climb(item.id, way)}
        />
        <SupportCell item={item} canWrite={canWrite} onAdd={() => actions.choose(item.id)} name={name} />
        <Needs item={item} />
        <Dose programme={programme} item={item} />
      </div>
      {isChosen && canWrite && (
        <ItemEditor programme={programme} item={item} index={index} actions={actions} name={name} />
      )}
    </li>
  );
}

const sideWords = { both: null, left: "left", right: "right", each: "each side" } as const;

function ItemName({
  item,
  index,
  isChosen,
  canWrite,
  actions,
  name,
  formName,
}: ItemLineProps & { name: string; formName: string }) {
  const side = sideWords[item.side];
  const keys = (event: KeyboardEvent) => {
    if (!event.altKey || (event.key !== "ArrowUp" && event.key !== "ArrowDown")) return;
    event.preventDefault();
    actions.move(item.id, index + (event.key === "ArrowUp" ? -1 : 1));
  };
  return (
    <button
      type="button"
      className="name"
      id={`line-${item.id}`}
      disabled={!canWrite}
      aria-expanded={isChosen}
      aria-keyshortcuts="Alt+ArrowUp Alt+ArrowDown"
      onClick={() => actions.choose(isChosen ? null : item.id)}
      onKeyDown={keys}
    >
      <b>
        {name}
        {side && <span className="side-mark">{side}</span>}
      </b>
      <span className="soft small">{formName}</span>
    </button>
  );
}

function SupportCell({
  item,
  canWrite,
  onAdd,
  name,
}: {
  item: ProgrammeItem;
  canWrite: boolean;
  onAdd: () => void;
  name: string;
}) {
  if (item.support !== null) return <span className="support small">{supportWords[item.support]}</span>;
  if (!canWrite) return <span className="support small soft">none</span>;
  return (
    <span className="support small">
      <button type="button" className="linkish" onClick={onAdd}>
        add support<span className="vh"> to {name}</span>
      </button>
    </span>
  );
}

/** What the line needs; a swap says what is missing at home and that the time stays. */
function Needs({ item }: { item: ProgrammeItem }) {
  const exercise = findExercise(item.exercise);
  const form = findForm(item.exercise, item.form);
  const wished = item.insteadOf ? findForm(item.insteadOf.exercise, item.insteadOf.form) : null;
  const place = exercise?.place ? [placeWords[exercise.place]] : [];
  const words = [...(form?.needs ?? []).map((need) => equipmentWords[need]), ...place].join(", ");
  if (!wished) return <span className="needs small soft">{words || "nothing"}</span>;
  const missing = wished.needs.map((need) => equipmentWords[need]).join(", ");
  return (
    <span className="needs small soft">
      <s>{missing}</s>, not at home: swapped, same clock
    </span>
  );
}

function Dose({ programme, item }: { programme: Programme; item: ProgrammeItem }) {
  if (programme.mode === "timed") {
    return (
      <>
        <span className="num dose">
          {item.workSeconds}
          <i>s</i>
        </span>
        <span className="num dose soft">
          {item.restSeconds}
          <i>s</i>
        </span>
      </>
    );
  }
  return (
    <>
      <span className="num dose">
        {item.sets} × {item.repetitions}
      </span>
      <span className="num dose soft">
        {item.restBetweenSetsSeconds}
        <i>s</i>
      </span>
    </>
  );
}
