"use client";
import type { CourseView } from "@withy/contracts/diary";
import { Button } from "@withy/ui/button";
import { Check } from "@withy/ui/check";
import { Dialog } from "@withy/ui/dialog";
import { ErrorSummary, type FieldError } from "@withy/ui/error-summary";
import { FieldGroup } from "@withy/ui/field-group";
import { TextInput } from "@withy/ui/text-input";
import { useState } from "react";
import { problemItems } from "@/api/form-problems";
import { cancelCourse } from "../course-client";
import { useCourseAct } from "../hooks/use-course";

/** Cancels every visit still to come, for one reason. It can be undone where the times are still free. */
export function CancelCourseDialog({ course, onClose }: { course: CourseView; onClose: () => void }) {
  const [by, setBy] = useState<"patient" | "clinic">("patient");
  const [reason, setReason] = useState("");
  const [missing, setMissing] = useState<FieldError[]>([]);
  const cancel = useCourseAct(
    cancelCourse,
    (view) => view,
    (view) => `Rest of the course of ${view.patient.name} cancelled`,
  );
  const rest = course.visits.filter((visit) => visit.isRest).length;
  const refused = cancel.error ? problemItems(cancel.error, (field) => `cancelrest-${field}`) : [];
  const errors: FieldError[] = missing.length > 0 ? missing : refused;
  const submit = () => {
    const found =
      reason.trim() === "" ? [{ id: "cancelrest-reason", message: "Say why, in a few words" }] : [];
    setMissing(found);
    if (found.length > 0) return;
    cancel.mutate({ courseId: course.id, version: course.version, by, reason }, { onSuccess: onClose });
  };
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={`Cancel the rest for ${course.patient.name}`}
      lead={`${rest === 1 ? "1 visit is" : `${rest} visits are`} still to come. Their times are free for others at once.`}
      closeLabel="Keep them"
      actions={
        <Button kind="stop" busy={cancel.isPending} type="submit" form="cancelrest-form">
          Cancel {rest === 1 ? "1 visit" : `${rest} visits`}
        </Button>
      }
    >
      <form
        id="cancelrest-form"
        noValidate
        onSubmit={(event) => {
          event.preventDefault();
          submit();
        }}
      >
        <ErrorSummary errors={errors} attempt={`${cancel.submittedAt} ${cancel.failureCount}`} />
        <FieldGroup legend="Who cancels" id="cancelrest-by">
          <Check
            type="radio"
            id="cancelrest-by"
            name="by"
            checked={by === "patient"}
            onChange={() => setBy("patient")}
          >
            The patient
          </Check>
          <Check type="radio" name="by" checked={by === "clinic"} onChange={() => setBy("clinic")}>
            The clinic
          </Check>
        </FieldGroup>
        <TextInput
          id="cancelrest-reason"
          label="Why"
          value={reason}
          onChange={(event) => setReason(event.target.value)}
          error={errors.find((error) => error.id === "cancelrest-reason")?.message}
        />
      </form>
    </Dialog>
  );
}
