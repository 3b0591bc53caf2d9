"use client";
import type { ActivityMeasure } from "@withy/clinical/measures/measure";
import { Button } from "@withy/ui/button";
import { TextInput } from "@withy/ui/text-input";
import type { TypedActivity } from "../typed-measure";
import type { MeasureFieldProps } from "./measure-fields";

/** Three to five things in the patient's own words, the same ones each time. */
export function Activities({
  measure,
  typed,
  onChange,
  problem,
}: MeasureFieldProps & { measure: ActivityMeasure }) {
  const set = (at: number, change: Partial<TypedActivity>) =>
    onChange({
      ...typed,
      activities: typed.activities.map((old, i) => (i === at ? { ...old, ...change } : old)),
    });
  return (
    <>
      {typed.activities.map((activity, i) => (
        <div className="activity" key={i}>
          <TextInput
            id={`activities.${i}.name`}
            label={`Activity ${i + 1}`}
            maxLength={120}
            value={activity.name}
            onChange={(event) => set(i, { name: event.target.value })}
            error={problem(`activities.${i}.name`)}
          />
          <TextInput
            id={`activities.${i}.score`}
            label={`${measure.answer.min} to ${measure.answer.max}`}
            aria-label={`Activity ${i + 1}, ${measure.answer.min} to ${measure.answer.max}`}
            span="short"
            inputMode="numeric"
            value={activity.score}
            onChange={(event) => set(i, { score: event.target.value })}
            error={problem(`activities.${i}.score`)}
          />
        </div>
      ))}
      {typed.activities.length < measure.most && (
        <Button
          size="small"
          onClick={() => onChange({ ...typed, activities: [...typed.activities, { name: "", score: "" }] })}
        >
          Another activity
        </Button>
      )}
    </>
  );
}
