"use client";
import { timeOf } from "@withy/core/wall-clock";
import { Button, ButtonLink, Buttons } from "@withy/ui/button";
import { useChanges } from "@withy/ui/recent-changes";
import Link from "next/link";
import { useRouter } from "next/navigation";
import { useForm } from "react-hook-form";
import { useAwake } from "@/components/use-awake";
import { useRegisterPatient } from "../hooks/use-save-patient";
import { emptyForm, inputFrom } from "../patient-form";
import type { PatientChoices } from "./fields-props";
import { PatientFields } from "./patient-fields";
import { SaveProblem } from "./save-problem";

interface Props {
  choices: PatientChoices;
  deskSiteId: string;
  /** Opens the form with what was typed into a search that found nobody. */
  name: { givenName: string; familyName: string };
}

export function RegisterForm({ choices, deskSiteId, name }: Props) {
  const router = useRouter();
  const { announce } = useChanges();
  const form = useForm({ defaultValues: { ...emptyForm(deskSiteId), ...name } });
  const register = useRegisterPatient();
  const isAwake = useAwake();
  const save = (isSomeoneElse: boolean) =>
    form.handleSubmit((typed) =>
      register.mutate(
        { ...inputFrom(typed, choices.today), isSomeoneElse },
        {
          onSuccess: (patient) => {
            announce({ at: timeOf(new Date(), choices.zone), said: `You registered ${patient.name}` });
            router.push(`/patients/${patient.id}`);
          },
        },
      ),
    )();
  return (
    <form
      noValidate
      className="patientform"
      onSubmit={(event) => {
        event.preventDefault();
        void save(false);
      }}
    >
      <SaveProblem
        error={register.error}
        attempt={register.submittedAt}
        isSaving={register.isPending}
        onSomeoneElse={() => void save(true)}
      />
      <PatientFields form={form} error={register.error} choices={choices} />
      <Buttons>
        <Button kind="primary" type="submit" disabled={!isAwake} busy={register.isPending}>
          Register patient
        </Button>
        <ButtonLink href="/patients" as={Link}>
          Leave it
        </ButtonLink>
      </Buttons>
    </form>
  );
}
