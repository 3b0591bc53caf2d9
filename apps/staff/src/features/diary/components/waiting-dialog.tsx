"use client";
import type { BookingChoicesView, WaitingRow } from "@withy/contracts/diary";
import { Button } from "@withy/ui/button";
import { Combobox, type ComboboxOption } from "@withy/ui/combobox";
import { Dialog } from "@withy/ui/dialog";
import { ErrorSummary } from "@withy/ui/error-summary";
import { useState } from "react";
import { findPatients } from "@/api/find-patients";
import { useSaveWaiting } from "../hooks/use-save-waiting";
import { type FormProblem, waitingForm, waitingInput, waitingProblems } from "../waiting-form";
import { WaitingFields } from "./waiting-fields";

export interface WaitingDialogProps {
  /** Null: someone new on the list. */
  row: WaitingRow | null;
  start: { patient: ComboboxOption | null; serviceId: string } | null;
  choices: BookingChoicesView;
  zone: string;
  today: string;
  onClose: () => void;
}

/** Puts someone on the list, or changes what they wait for. A refusal keeps everything that was typed. */
export function WaitingDialog({ row, start, choices, zone, today, onClose }: WaitingDialogProps) {
  const [patient, setPatient] = useState(start?.patient ?? null);
  const [form, setForm] = useState(() => waitingForm(row, start?.serviceId ?? ""));
  const [missing, setMissing] = useState<readonly FormProblem[]>([]);
  const [attempt, setAttempt] = useState(0);
  const patientId = row?.patient.id ?? patient?.id ?? null;
  const save = useSaveWaiting(row, zone);
  const errors = missing.length > 0 ? missing : save.problems;
  const errorOf = (id: string) => errors.find((error) => error.id === id)?.message;
  const submit = () => {
    const found = waitingProblems(form, patientId !== null);
    setMissing(found);
    setAttempt((n) => n + 1);
    if (found.length === 0 && patientId !== null) save.run(patientId, waitingInput(form), onClose);
  };
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      size="wide"
      title={row ? `What ${row.patient.name} waits for` : "Add to the waiting list"}
      lead={row ? undefined : "Fill in what they said; what stays empty means any."}
      actions={
        <Button kind="primary" busy={save.isPending} type="submit" form="waiting-form">
          {row ? "Save" : "Add to the list"}
        </Button>
      }
    >
      <form
        id="waiting-form"
        className="waitform"
        noValidate
        onSubmit={(event) => {
          event.preventDefault();
          submit();
        }}
      >
        <ErrorSummary errors={errors} attempt={`${attempt} ${save.attempt}`} />
        {!row && (
          <Combobox
            id="waiting-patientId"
            label="Patient"
            hint="Name, date of birth, phone or NHS number"
            value={patient}
            onChange={(one) => {
              setPatient(one);
              setForm((before) => ({ ...before, insteadOfId: "" }));
            }}
            search={findPatients}
            error={errorOf("waiting-patientId")}
          />
        )}
        <WaitingFields
          form={form}
          onChange={(part) => setForm((before) => ({ ...before, ...part }))}
          choices={choices}
          patientId={patientId}
          today={today}
          errorOf={errorOf}
        />
      </form>
    </Dialog>
  );
}
