"use client";
import type { PerformanceTest, Questionnaire } from "@withy/clinical/measures/measure";
import { Check } from "@withy/ui/check";
import { Choice } from "@withy/ui/choice";
import { FieldGroup } from "@withy/ui/field-group";
import { TextInput } from "@withy/ui/text-input";
import type { TypedMeasure } from "../typed-measure";

export interface MeasureFieldProps {
  typed: TypedMeasure;
  onChange: (typed: TypedMeasure) => void;
  problem: (id: string) => string | undefined;
}

/** One question in our own words, answered by one press. */
export function OwnQuestion({
  measure,
  typed,
  onChange,
  problem,
}: MeasureFieldProps & { measure: Questionnaire }) {
  const { min, max } = measure.answer;
  const options = Array.from({ length: max - min + 1 }, (_, i) => ({
    value: String(min + i),
    label: String(min + i),
  }));
  return (
    <FieldGroup legend={measure.ownWording?.[0] ?? measure.label} id="answers.0" error={problem("answers.0")}>
      <div id="answers.0" tabIndex={-1}>
        <Choice
          label={measure.label}
          options={options}
          value={typed.items[0] ?? ""}
          onChange={(value) => onChange({ ...typed, items: [value] })}
        />
      </div>
    </FieldGroup>
  );
}

/** Numbered items by subscale: the published sentences are on the practice's own form. */
export function NumberedItems({
  measure,
  typed,
  onChange,
  problem,
}: MeasureFieldProps & { measure: Questionnaire }) {
  const { min, max } = measure.answer;
  const set = (at: number, value: string) =>
    onChange({ ...typed, items: typed.items.map((old, i) => (i === at ? value : old)) });
  return measure.scales.map((scale) => (
    <FieldGroup
      key={scale.key}
      legend={scale.label}
      id={`scale-${scale.key}`}
      hint={`Each item ${min} to ${max}. Leave a blank where none was given.`}
    >
      <div className="items">
        {Array.from({ length: scale.items }, (_, i) => scale.firstItem - 1 + i).map((at) => (
          <label key={at} data-bad={problem(`answers.${at}`) ? "" : undefined}>
            <span>
              <span className="vh">Item </span>
              {at + 1}
            </span>
            <input
              id={`answers.${at}`}
              className="input"
              inputMode="numeric"
              autoComplete="off"
              value={typed.items[at] ?? ""}
              aria-invalid={problem(`answers.${at}`) ? true : undefined}
              onChange={(event) => set(at, event.target.value)}
            />
          </label>
        ))}
      </div>
    </FieldGroup>
  ));
}

/** One reading of a performance test, with the conditions that decide what it counts for. */
export function Reading({
  measure,
  typed,
  onChange,
  problem,
}: MeasureFieldProps & { measure: PerformanceTest }) {
  return (
    <>
      <TextInput
        id="value"
        label={measure.reading.label}
        span="short"
        inputMode="decimal"
        value={typed.value}
        onChange={(event) => onChange({ ...typed, value: event.target.value })}
        error={problem("value")}
      />
      {measure.conditions.includes("used-arms") && (
        <Check
          checked={typed.usedArms}
          onChange={(event) => onChange({ ...typed, usedArms: event.target.checked })}
        >
          The arms pushed (the result is then 0)
        </Check>
      )}
      {measure.conditions.includes("steps") && (
        <TextInput
          id="steps"
          label="Number of steps"
          span="short"
          inputMode="numeric"
          value={typed.steps}
          onChange={(event) => onChange({ ...typed, steps: event.target.value })}
          error={problem("steps")}
        />
      )}
      {measure.conditions.includes("walking-aid") && (
        <TextInput
          id="walkingAid"
          label="Walking aid"
          hint="Leave empty where none was used."
          span="mid"
          maxLength={60}
          value={typed.walkingAid}
          onChange={(event) => onChange({ ...typed, walkingAid: event.target.value })}
        />
      )}
    </>
  );
}
