"use client";
import { checkEntry } from "@withy/clinical/measures/entry";
import { findScale, type Measure } from "@withy/clinical/measures/measure";
import { formatScore } from "@withy/clinical/measures/rounding";
import { alarmOf, scoreMeasure } from "@withy/clinical/measures/score";
import type { RecordedMeasure } from "@withy/contracts/clinical";
import { AlertLine } from "@withy/ui/alert-line";
import { Button, Buttons } from "@withy/ui/button";
import { ErrorSummary, type FieldError } from "@withy/ui/error-summary";
import { TextInput } from "@withy/ui/text-input";
import { useState } from "react";
import { problemItems } from "@/api/form-problems";
import { useAwake } from "@/components/use-awake";
import { useRecordMeasure } from "../hooks/use-record-measure";
import { emptyFields, entryFrom, isBlank, type TypedMeasure } from "../typed-measure";
import { Activities } from "./activity-fields";
import { NumberedItems, OwnQuestion, Reading } from "./measure-fields";

export interface MeasureFormProps {
  measure: Measure;
  episodeId: string;
  noteId: string | null;
  lastActivities: readonly string[];
  onRecorded: (recorded: RecordedMeasure) => void;
  onClose: () => void;
}

function refusalOf(measure: Measure, typed: TypedMeasure): FieldError | null {
  if (isBlank(measure, typed)) return { message: "Enter at least one answer." };
  const refusal = checkEntry(measure, entryFrom(measure, typed));
  return refusal && { id: refusal.field, message: refusal.message };
}

/** The score of what stands in the fields, while it is typed. */
function scoreWords(measure: Measure, typed: TypedMeasure): string {
  if (isBlank(measure, typed) || refusalOf(measure, typed)) return "";
  return scoreMeasure(measure, entryFrom(measure, typed))
    .map((score) => {
      const scale = findScale(measure, score.scale);
      return `${scale?.label ?? ""}: ${score.value === null ? score.reason : formatScore(score.value, scale?.decimals ?? 0)}`;
    })
    .join(". ");
}

function Fields(props: {
  measure: Measure;
  typed: TypedMeasure;
  onChange: (typed: TypedMeasure) => void;
  problem: (id: string) => string | undefined;
}) {
  const { measure, typed, onChange, problem } = props;
  if (measure.form === "activities") return <Activities {...props} measure={measure} />;
  if (measure.form === "reading") return <Reading {...props} measure={measure} />;
  if (measure.form === "items") {
    return measure.ownWording ? (
      <OwnQuestion {...props} measure={measure} />
    ) : (
      <NumberedItems {...props} measure={measure} />
    );
  }
  return (
    <TextInput
      id="value"
      label="Total"
      hint={`${measure.scale.min} to ${measure.scale.max}. ${measure.licence}.`}
      span="short"
      inputMode="decimal"
      value={typed.value}
      onChange={(event) => onChange({ ...typed, value: event.target.value })}
      error={problem("value")}
    />
  );
}

/** Fills in one measure beside the note: scored while it is typed, refused by name, kept with one press. */
export function MeasureForm({
  measure,
  episodeId,
  noteId,
  lastActivities,
  onRecorded,
  onClose,
}: MeasureFormProps) {
  const record = useRecordMeasure(episodeId);
  const isAwake = useAwake();
  const [typed, setTyped] = useState(() => emptyFields(measure, lastActivities));
  const [refused, setRefused] = useState<FieldError | null>(null);
  const errors: FieldError[] = refused ? [refused] : record.error ? problemItems(record.error) : [];
  const problem = (id: string) => errors.find((error) => error.id === id)?.message;
  const alarm = refusalOf(measure, typed) ? null : alarmOf(measure, entryFrom(measure, typed));
  const submit = () => {
    const found = refusalOf(measure, typed);
    setRefused(found);
    if (found) return;
    record.mutate(
      { noteId, measureKey: measure.key, entry: entryFrom(measure, typed) as never },
      { onSuccess: onRecorded },
    );
  };
  return (
    <form
      className="measure-form"
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        submit();
      }}
    >
      <ErrorSummary errors={errors} attempt={record.submittedAt} />
      {measure.advice.map((advice) => (
        <p key={advice} className="small soft">
          {advice}
        </p>
      ))}
      <Fields measure={measure} typed={typed} onChange={setTyped} problem={problem} />
      <p className="score-now num" role="status">
        {scoreWords(measure, typed)}
      </p>
      {alarm !== null && <AlertLine tone="danger">{alarm}</AlertLine>}
      <Buttons>
        <Button kind="primary" type="submit" disabled={!isAwake} busy={record.isPending}>
          Record {measure.shortLabel}
        </Button>
        <Button onClick={onClose}>Leave it</Button>
      </Buttons>
    </form>
  );
}
