"use client";
import { Select } from "@withy/ui/select";
import { TextArea, TextInput } from "@withy/ui/text-input";
import dynamic from "next/dynamic";
import { fieldProblem } from "@/api/form-problems";
import type { FieldsProps } from "./fields-props";

const SurgeryField = dynamic(() => import("./surgery-field").then((m) => m.SurgeryField), {
  ssr: false,
  loading: () => <TextInput id="gpPractice" label="GP surgery" readOnly />,
});

export function CareFields({ form, error, choices }: FieldsProps) {
  const { register } = form;
  return (
    <>
      <TextInput
        id="nhsNumber"
        label="NHS number"
        span="mid"
        inputMode="numeric"
        hint="Ten digits, with or without spaces"
        error={fieldProblem(error, "nhsNumber")}
        {...register("nhsNumber")}
      />
      <SurgeryField form={form} error={error} />
      <TextInput
        id="gpName"
        label="GP's name"
        error={fieldProblem(error, "gpName")}
        {...register("gpName")}
      />
      <Select
        id="usualTherapistId"
        label="Usual therapist"
        placeholder="No one in particular"
        options={choices.therapists.map((t) => ({ value: t.id, label: t.name }))}
        error={fieldProblem(error, "usualTherapistId")}
        {...register("usualTherapistId")}
      />
      <Select
        id="homeSiteId"
        label="Home site"
        options={choices.sites.map((s) => ({ value: s.id, label: s.name }))}
        error={fieldProblem(error, "homeSiteId")}
        {...register("homeSiteId")}
      />
      <TextArea
        id="communicationNeeds"
        label="Communication needs"
        hint="Hearing, sight, language, a carer. Nothing clinical"
        error={fieldProblem(error, "communicationNeeds")}
        {...register("communicationNeeds")}
      />
      <TextInput
        id="nextOfKin"
        label="Next of kin"
        hint="Name, relation and phone"
        error={fieldProblem(error, "nextOfKin")}
        {...register("nextOfKin")}
      />
    </>
  );
}
