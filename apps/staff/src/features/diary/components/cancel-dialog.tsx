"use client";
import type { AppointmentView } from "@withy/contracts/diary";
import { titleDate } from "@withy/core/date-words";
import { AlertLine } from "@withy/ui/alert-line";
import { Button } from "@withy/ui/button";
import { Check } from "@withy/ui/check";
import { Dialog } from "@withy/ui/dialog";
import { ErrorSummary, type FieldError } from "@withy/ui/error-summary";
import { FieldGroup } from "@withy/ui/field-group";
import { TextInput } from "@withy/ui/text-input";
import { useState } from "react";
import { problemItems } from "@/api/form-problems";
import { useCancelAppointment } from "../hooks/use-cancel-appointment";

export interface CancelDialogProps {
  view: AppointmentView;
  onClose: () => void;
}

/** Who cancels and why. The time is given back at once; it can be undone while no one has taken it. */
export function CancelDialog({ view, onClose }: CancelDialogProps) {
  const cancel = useCancelAppointment();
  const [by, setBy] = useState<"patient" | "clinic">("patient");
  const [reason, setReason] = useState("");
  const [missing, setMissing] = useState<FieldError[]>([]);
  const errors: FieldError[] =
    missing.length > 0
      ? missing
      : cancel.error
        ? problemItems(cancel.error, (field) => `cancel-${field}`)
        : [];
  const submit = () => {
    const found = reason.trim() === "" ? [{ id: "cancel-reason", message: "Say why, in a few words" }] : [];
    setMissing(found);
    if (found.length > 0) return;
    const input = { appointmentId: view.id, version: view.version, by, reason };
    cancel.mutate(input, { onSuccess: onClose });
  };
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={`Cancel ${view.patient.name}`}
      lead={`${titleDate(view.day)}, ${view.startTime} with ${view.therapist.name}.`}
      closeLabel="Keep it"
      actions={
        <Button kind="stop" busy={cancel.isPending} type="submit" form="cancel-form">
          Cancel the appointment
        </Button>
      }
    >
      <form
        id="cancel-form"
        noValidate
        onSubmit={(event) => {
          event.preventDefault();
          submit();
        }}
      >
        <ErrorSummary errors={errors} attempt={cancel.submittedAt} />
        {view.isLateToCancel && (
          <AlertLine>
            This is later than the notice asked for. It will be kept as a late cancellation.
          </AlertLine>
        )}
        <FieldGroup legend="Who cancels" id="cancel-by">
          <Check
            type="radio"
            id="cancel-by"
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
          id="cancel-reason"
          label="Why"
          value={reason}
          onChange={(event) => setReason(event.target.value)}
          error={errors.find((error) => error.id === "cancel-reason")?.message}
        />
      </form>
    </Dialog>
  );
}
