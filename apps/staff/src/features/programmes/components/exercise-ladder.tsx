import { equipmentWords } from "@withy/clinical/exercises/exercise";
import type { ExerciseView } from "@withy/contracts/programmes";
import Link from "next/link";

/** The forms from the easiest up, with the exercises that the ladder comes from and goes on to. */
export function ExerciseLadder({ exercise }: { exercise: ExerciseView }) {
  return (
    <>
      {exercise.easierExercises.length > 0 && (
        <p className="small">
          Comes after{" "}
          {exercise.easierExercises.map((easier, i) => (
            <span key={easier.key}>
              {i > 0 && ", "}
              <Link href={`/exercises/${easier.key}`}>{easier.name}</Link>
            </span>
          ))}
        </p>
      )}
      <ol className="rungs">
        {exercise.forms.map((form) => (
          <li key={form.key} data-standard={form.key === exercise.standard ? "" : undefined}>
            <b>{form.name}</b>
            <span>{form.how}</span>
            <span className="small soft">
              {form.needs.length === 0
                ? "needs nothing"
                : form.needs.map((need) => equipmentWords[need]).join(", ")}
              {form.key === exercise.standard && ", where a new line starts"}
            </span>
            <span className="small soft num">level {form.level} of 10</span>
          </li>
        ))}
      </ol>
      {exercise.harderExercise && (
        <p className="small">
          Leads to{" "}
          <Link href={`/exercises/${exercise.harderExercise.key}`}>{exercise.harderExercise.name}</Link>
        </p>
      )}
    </>
  );
}
