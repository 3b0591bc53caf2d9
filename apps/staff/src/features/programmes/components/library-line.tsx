import {
  type Exercise,
  equipmentWords,
  placeWords,
  regionWords,
  type TrainingKind,
} from "@withy/clinical/exercises/exercise";
import Link from "next/link";
import { ExerciseFigure } from "./exercise-figure";

export const kindWords: Record<TrainingKind, string> = {
  strength: "Strength",
  mobility: "Movement",
  balance: "Balance",
  aerobic: "Heart and lungs",
};

/** What a form may need, over all forms of the exercise. */
function needsOf(exercise: Exercise): string {
  const needs = new Set(exercise.forms.flatMap((form) => form.needs.map((need) => equipmentWords[need])));
  const place = exercise.place === null ? [] : [placeWords[exercise.place]];
  return [...place, ...needs].join(", ");
}

/** One line of the library. */
export function LibraryLine({ exercise }: { exercise: Exercise }) {
  return (
    <li>
      <ExerciseFigure figure={exercise.figure} size={52} />
      <span className="what">
        <Link href={`/exercises/${exercise.key}`}>{exercise.name}</Link>
        <span className="soft small">{exercise.purpose}</span>
      </span>
      <span className="small">
        {regionWords[exercise.region]}
        <span className="soft">{exercise.kinds.map((kind) => kindWords[kind].toLowerCase()).join(", ")}</span>
      </span>
      <span className="small">
        {exercise.sides === "together" ? "both sides together" : "one side at a time"}
        <span className="soft">{exercise.forms.length} forms</span>
      </span>
      <span className="small soft needs">{needsOf(exercise) || "needs nothing"}</span>
    </li>
  );
}
