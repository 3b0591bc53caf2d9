"use client";
import { type Region, regions, regionWords } from "@withy/clinical/exercises/exercise";
import { searchExercises, standardForm } from "@withy/clinical/exercises/library";
import { Dialog } from "@withy/ui/dialog";
import { Select } from "@withy/ui/select";
import { TextInput } from "@withy/ui/text-input";
import { type KeyboardEvent, useRef, useState } from "react";
import { ExerciseFigure } from "./exercise-figure";

const regionOptions = [
  { value: "", label: "Every region" },
  ...regions.map((region) => ({ value: region, label: regionWords[region] })),
];

/** Moves between the lines with the arrows, as in a list. */
function walk(event: KeyboardEvent<HTMLElement>) {
  if (event.key !== "ArrowDown" && event.key !== "ArrowUp") return;
  const lines = [...event.currentTarget.querySelectorAll<HTMLElement>("[data-walk]")];
  const at = lines.indexOf(document.activeElement as HTMLElement);
  const next = lines[at + (event.key === "ArrowDown" ? 1 : -1)];
  if (!next) return;
  event.preventDefault();
  next.focus();
}

/** Finds an exercise by typing: Enter takes the first, arrows walk through the rest. */
export function AddExerciseDialog({
  startRegion,
  onAdd,
  onClose,
}: {
  startRegion: Region | null;
  onAdd: (exerciseKey: string) => void;
  onClose: () => void;
}) {
  const [words, setWords] = useState("");
  const [region, setRegion] = useState<Region | "">(startRegion ?? "");
  const input = useRef<HTMLInputElement>(null);
  const found = searchExercises({ words, ...(region === "" ? {} : { region }) });
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title="Add an exercise"
      size="wide"
      initialFocus={input}
      closeLabel="Close"
    >
      {/* biome-ignore lint/a11y/noStaticElementInteractions: the arrows only move focus between controls inside */}
      <div className="add-exercise" onKeyDown={walk}>
        {/* A form, so that Enter is spent before focus goes back to the button that opened this. */}
        <form
          className="ask"
          onSubmit={(event) => {
            event.preventDefault();
            if (found[0]) onAdd(found[0].key);
          }}
        >
          <TextInput
            id="find-exercise"
            ref={input}
            data-walk=""
            label="Name, muscle or equipment"
            value={words}
            onChange={(event) => setWords(event.currentTarget.value)}
          />
          <Select
            id="find-region"
            label="Region"
            options={regionOptions}
            value={region}
            onChange={(event) => setRegion(event.currentTarget.value as Region | "")}
          />
        </form>
        <p className="small soft" role="status">
          {found.length === 0
            ? "Nothing matches. Try fewer letters or another region."
            : `${found.length} ${found.length === 1 ? "exercise" : "exercises"}. Enter adds the first.`}
        </p>
        <ul>
          {found.map((exercise) => (
            <li key={exercise.key}>
              <button type="button" data-walk="" onClick={() => onAdd(exercise.key)}>
                <ExerciseFigure figure={exercise.figure} size={44} />
                <span>
                  <b>{exercise.name}</b>
                  <span className="small soft">
                    {regionWords[exercise.region]},{" "}
                    {exercise.sides === "together" ? "both sides together" : "each side"},{" "}
                    {standardForm(exercise).name}
                  </span>
                </span>
              </button>
            </li>
          ))}
        </ul>
      </div>
    </Dialog>
  );
}
