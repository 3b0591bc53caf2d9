"use client";
import type { CourseView } from "@withy/contracts/diary";
import { titleDate } from "@withy/core/date-words";
import { addDays } from "@withy/core/plain-date";
import { Button } from "@withy/ui/button";
import { Choice } from "@withy/ui/choice";
import { Dialog } from "@withy/ui/dialog";
import { ErrorSummary, type FieldError } from "@withy/ui/error-summary";
import { FieldRow } from "@withy/ui/field-group";
import { TextInput } from "@withy/ui/text-input";
import { useState } from "react";
import { problemItems } from "@/api/form-problems";
import { shiftCourse } from "../course-client";
import { useCourseAct } from "../hooks/use-course";

const readDays = (text: string) => {
  const n = /^\s*\d{1,3}\s*$/.test(text) ? Number(text) : 0;
  return n >= 1 && n <= 120 ? n : null;
};

/** Moves all visits still to come by so many days; the clock time stays. All of them move, or none. */
export function ShiftDialog({ course, onClose }: { course: CourseView; onClose: () => void }) {
  const [text, setText] = useState("7");
  const [way, setWay] = useState("later");
  const [missing, setMissing] = useState<FieldError[]>([]);
  const days = readDays(text);
  const shift = useCourseAct(
    shiftCourse,
    (view) => view,
    (view, input) =>
      `Rest of the course of ${view.patient.name} moved ${Math.abs(input.days)} days ${input.days > 0 ? "later" : "earlier"}`,
  );
  const first = course.visits.find((visit) => visit.isRest);
  const signed = days === null ? null : way === "later" ? days : -days;
  const errors: FieldError[] =
    missing.length > 0
      ? missing
      : shift.error
        ? problemItems(shift.error, (field) => (field === "days" ? "shift-days" : "")).map(({ message }) => ({
            message,
          }))
        : [];
  const submit = () => {
    const found =
      signed === null ? [{ id: "shift-days", message: "Enter how many days, from 1 to 120" }] : [];
    setMissing(found);
    if (signed === null) return;
    shift.mutate({ courseId: course.id, version: course.version, days: signed }, { onSuccess: onClose });
  };
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={`Shift the rest for ${course.patient.name}`}
      lead={
        first && signed !== null
          ? `The next visit moves from ${titleDate(first.day)} to ${titleDate(addDays(first.day, signed))}, still at ${first.startTime}.`
          : undefined
      }
      actions={
        <Button kind="primary" busy={shift.isPending} type="submit" form="shift-form">
          Shift {course.visits.filter((visit) => visit.isRest).length} visits
        </Button>
      }
    >
      <form
        id="shift-form"
        noValidate
        onSubmit={(event) => {
          event.preventDefault();
          submit();
        }}
      >
        <ErrorSummary errors={errors} attempt={`${shift.submittedAt} ${shift.failureCount}`} />
        <FieldRow>
          <TextInput
            id="shift-days"
            label="By how many days"
            inputMode="numeric"
            value={text}
            onChange={(event) => setText(event.target.value)}
            error={errors.find((error) => error.id === "shift-days")?.message}
          />
          <div className="field">
            <span className="label">Which way</span>
            <Choice
              label="Which way"
              options={[
                { value: "later", label: "Later" },
                { value: "earlier", label: "Earlier" },
              ]}
              value={way}
              onChange={setWay}
            />
          </div>
        </FieldRow>
        <p className="small soft">
          If one of the new times is taken, nothing moves. The patient gets one message with the new times.
        </p>
      </form>
    </Dialog>
  );
}
