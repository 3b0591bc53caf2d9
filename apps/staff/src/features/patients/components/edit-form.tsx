"use client";
import type { PatientView } from "@withy/contracts/patients";
import { timeOf } from "@withy/core/wall-clock";
import { Button, ButtonLink, Buttons } from "@withy/ui/button";
import { useChanges } from "@withy/ui/recent-changes";
import Link from "next/link";
import { useRouter } from "next/navigation";
import { useState } from "react";
import { useForm } from "react-hook-form";
import { ApiError } from "@/api/request";
import { useAwake } from "@/components/use-awake";
import { useEditPatient } from "../hooks/use-save-patient";
import { formFrom, inputFrom } from "../patient-form";
import type { PatientChoices } from "./fields-props";
import { PatientFields } from "./patient-fields";
import { SaveProblem } from "./save-problem";
import { TheirVersion } from "./their-version";

export function EditForm({ patient, choices }: { patient: PatientView; choices: PatientChoices }) {
  const router = useRouter();
  const { announce } = useChanges();
  const form = useForm({ defaultValues: formFrom(patient) });
  const [version, setVersion] = useState(patient.version);
  const edit = useEditPatient(patient.id);
  const isAwake = useAwake();
  const theirs = theirVersion(edit.error);
  const save = (options: { isSomeoneElse?: boolean; over?: number } = {}) =>
    form.handleSubmit((typed) =>
      edit.mutate(
        {
          ...inputFrom(typed, choices.today),
          version: options.over ?? version,
          isSomeoneElse: options.isSomeoneElse ?? false,
        },
        {
          onSuccess: (saved) => {
            announce({
              at: timeOf(new Date(), choices.zone),
              said: `You changed the details of ${saved.name}`,
            });
            router.push(`/patients/${patient.id}`);
            router.refresh();
          },
        },
      ),
    )();
  const takeTheirs = (view: PatientView) => {
    form.reset(formFrom(view));
    setVersion(view.version);
    edit.reset();
  };
  const keepMine = (view: PatientView) => {
    setVersion(view.version);
    void save({ over: view.version });
  };
  return (
    <form
      noValidate
      className="patientform"
      onSubmit={(event) => {
        event.preventDefault();
        void save();
      }}
    >
      {theirs ? (
        <TheirVersion
          theirs={theirs}
          mine={form.getValues()}
          onTakeTheirs={() => takeTheirs(theirs)}
          onKeepMine={() => keepMine(theirs)}
        />
      ) : (
        <SaveProblem
          error={edit.error}
          attempt={edit.submittedAt}
          isSaving={edit.isPending}
          onSomeoneElse={() => void save({ isSomeoneElse: true })}
        />
      )}
      <PatientFields form={form} error={edit.error} choices={choices} />
      <Buttons>
        <Button kind="primary" type="submit" disabled={!isAwake} busy={edit.isPending}>
          Save details
        </Button>
        <ButtonLink href={`/patients/${patient.id}`} as={Link}>
          Leave it
        </ButtonLink>
      </Buttons>
    </form>
  );
}

function theirVersion(error: unknown): PatientView | null {
  if (!(error instanceof ApiError) || error.problem.code !== "stale") return null;
  return (error.problem.more["theirs"] as PatientView | undefined) ?? null;
}
