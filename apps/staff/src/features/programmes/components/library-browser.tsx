"use client";
import "../exercises.css";
import {
  type Region,
  regions,
  regionWords,
  type TrainingKind,
  trainingKinds,
} from "@withy/clinical/exercises/exercise";
import type { ExerciseLibraryView, ExerciseSearchInput } from "@withy/contracts/programmes";
import { AlertLine } from "@withy/ui/alert-line";
import { Check } from "@withy/ui/check";
import { Choice } from "@withy/ui/choice";
import { EmptyState } from "@withy/ui/empty-state";
import { Select } from "@withy/ui/select";
import { TextInput } from "@withy/ui/text-input";
import { useEffect, useState } from "react";
import { useExerciseLibrary } from "../hooks/use-exercise-library";
import { kindWords, LibraryLine } from "./library-line";

const regionOptions = [
  { value: "", label: "All" },
  ...regions.map((region) => ({ value: region, label: regionWords[region] })),
];
const kindOptions = trainingKinds.map((kind) => ({ value: kind, label: kindWords[kind] }));

/** The address follows the filter, so that a search can be kept, sent and gone back to. */
function useFilter(first: ExerciseSearchInput) {
  const [filter, setFilter] = useState(first);
  useEffect(() => {
    const search = new URLSearchParams(
      Object.entries(filter).filter(
        (entry): entry is [string, string] => typeof entry[1] === "string" && entry[1] !== "",
      ),
    );
    const text = search.toString();
    window.history.replaceState(null, "", text === "" ? "/exercises" : `/exercises?${text}`);
  }, [filter]);
  const set = (name: keyof ExerciseSearchInput, value: string) =>
    setFilter(({ [name]: _, ...rest }) => (value === "" ? rest : { ...rest, [name]: value }));
  return { filter, set };
}

/** Every exercise, found by words, region, aim and what is at hand. */
export function LibraryBrowser({ first, view }: { first: ExerciseSearchInput; view: ExerciseLibraryView }) {
  const { filter, set } = useFilter(first);
  const [firstFilter] = useState(() => JSON.stringify(first));
  const library = useExerciseLibrary(filter, { filter: firstFilter, view });
  const found = library.data?.exercises ?? [];
  return (
    <div className="library">
      {/* biome-ignore lint/a11y/useSemanticElements: <search> is not known to every reader yet */}
      <div className="library-ask" role="search">
        <TextInput
          id="library-words"
          type="search"
          label="Name, muscle or equipment"
          value={filter.words ?? ""}
          onChange={(event) => set("words", event.currentTarget.value)}
        />
        <Select
          id="library-kind"
          label="Trains"
          placeholder="Anything"
          options={kindOptions}
          value={filter.kind ?? ""}
          onChange={(event) => set("kind", event.currentTarget.value as TrainingKind | "")}
        />
        <Check
          checked={filter.equipment === "none"}
          onChange={(event) => set("equipment", event.currentTarget.checked ? "none" : "")}
        >
          Possible without equipment
        </Check>
      </div>
      <Choice
        label="Region"
        options={regionOptions}
        value={filter.region ?? ""}
        onChange={(value) => set("region", value as Region | "")}
      />
      {library.error && (
        <AlertLine tone="danger" live>
          {library.error.message}
        </AlertLine>
      )}
      <p className="small soft num" role="status">
        {found.length} of {view.total} exercises
      </p>
      {found.length === 0 ? (
        <EmptyState title="Nothing matches.">Try fewer letters, another region, or any equipment.</EmptyState>
      ) : (
        <ul className="library-lines">
          {found.map((exercise) => (
            <LibraryLine key={exercise.key} exercise={exercise} />
          ))}
        </ul>
      )}
    </div>
  );
}
