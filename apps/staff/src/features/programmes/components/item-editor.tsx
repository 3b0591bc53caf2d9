"use client";
import { type Support, supports, supportWords } from "@withy/clinical/exercises/exercise";
import { findExercise } from "@withy/clinical/exercises/library";
import type { ItemSide, Programme, ProgrammeItem } from "@withy/clinical/programmes/programme";
import { Button } from "@withy/ui/button";
import { Select } from "@withy/ui/select";
import { TextInput } from "@withy/ui/text-input";
import type { ItemActions } from "../item-actions";
import { NumberBox } from "./number-box";

type Count =
  | "workSeconds"
  | "restSeconds"
  | "sets"
  | "repetitions"
  | "repetitionSeconds"
  | "holdSeconds"
  | "restBetweenSetsSeconds";

interface CountField {
  readonly name: Count;
  /** Said to readers, since the words around the box are split by it. */
  readonly label: string;
  readonly before: string;
  readonly after: string;
}

const counts: Record<"timed" | "sets", readonly CountField[]> = {
  timed: [
    { name: "workSeconds", label: "seconds of work", before: "work", after: "s" },
    { name: "restSeconds", label: "seconds of rest", before: "rest", after: "s" },
  ],
  sets: [
    { name: "sets", label: "sets", before: "", after: "sets" },
    { name: "repetitions", label: "repetitions", before: "of", after: "" },
    { name: "repetitionSeconds", label: "seconds a repetition", before: "at", after: "s each" },
    { name: "holdSeconds", label: "seconds of hold", before: "hold", after: "s" },
    { name: "restBetweenSetsSeconds", label: "seconds between sets", before: "rest", after: "s" },
  ],
};

const sideOptions = [
  { value: "left", label: "Left" },
  { value: "right", label: "Right" },
  { value: "each", label: "Left, then right" },
];

/** Supports that suit the exercise first; any of them may be added to any exercise. */
function supportOptions(item: ProgrammeItem) {
  const suited = findExercise(item.exercise)?.supports ?? [];
  const ordered = [...suited, ...supports.filter((support) => !suited.includes(support))];
  return [
    { value: "", label: "No support" },
    ...ordered.map((value) => ({ value, label: supportWords[value] })),
  ];
}

/** The details of the chosen line, under it. */
export function ItemEditor({
  programme,
  item,
  index,
  actions,
  name,
}: {
  programme: Programme;
  item: ProgrammeItem;
  index: number;
  actions: ItemActions;
  name: string;
}) {
  const set = (change: Partial<ProgrammeItem>) => actions.change(item.id, change);
  const isSided = findExercise(item.exercise)?.sides === "one-at-a-time";
  return (
    <section className="item-editor" aria-label={`Details of ${index + 1}. ${name}`}>
      <div className="counts num">
        {counts[programme.mode].map(({ name: field, label, before, after }) => (
          <span className="count" key={field}>
            <span aria-hidden="true">{before}</span>
            <NumberBox
              label={`${name}: ${label}`}
              value={item[field]}
              onChange={(value) => set({ [field]: value })}
              className="number-box small"
            />
            <span aria-hidden="true">{after}</span>
          </span>
        ))}
      </div>
      {isSided && (
        <Select
          id={`side-${item.id}`}
          label="Side"
          options={sideOptions}
          value={item.side}
          onChange={(event) => set({ side: event.currentTarget.value as ItemSide })}
        />
      )}
      <Select
        id={`support-${item.id}`}
        label="Support for the hands"
        options={supportOptions(item)}
        value={item.support ?? ""}
        onChange={(event) => set({ support: (event.currentTarget.value || null) as Support | null })}
      />
      <TextInput
        id={`note-${item.id}`}
        label="Note on the handout"
        value={item.note}
        maxLength={300}
        onChange={(event) => set({ note: event.currentTarget.value })}
      />
      <div className="btns">
        <Button size="small" disabled={index === 0} onClick={() => actions.move(item.id, index - 1)}>
          Move up
        </Button>
        <Button
          size="small"
          disabled={index === programme.items.length - 1}
          onClick={() => actions.move(item.id, index + 1)}
        >
          Move down
        </Button>
        <Button size="small" kind="stop" onClick={() => actions.remove(item.id)}>
          Remove<span className="vh"> {name}</span>
        </Button>
      </div>
    </section>
  );
}
