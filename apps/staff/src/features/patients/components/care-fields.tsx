"use client";
import { Combobox } from "@withy/ui/combobox";
import { Select } from "@withy/ui/select";
import { TextArea, TextInput } from "@withy/ui/text-input";
import { useState } from "react";
import { Controller } from "react-hook-form";
import { fieldProblem } from "@/api/form-problems";
import { findGpPractices } from "../api-client";
import type { SurgeryOption } from "../patient-form";
import { AddSurgery } from "./add-surgery";
import type { FieldsProps } from "./fields-props";

export function CareFields({ form, error, choices }: FieldsProps) {
  const { register, control } = form;
  const [isAdding, setIsAdding] = useState(false);
  const take = (surgery: SurgeryOption) => {
    form.setValue("gpPractice", surgery);
    setIsAdding(false);
  };
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
      <Controller
        control={control}
        name="gpPractice"
        render={({ field }) => (
          <Combobox<SurgeryOption>
            id="gpPractice"
            label="GP surgery"
            value={field.value}
            onChange={field.onChange}
            search={findGpPractices}
            error={fieldProblem(error, "gpPracticeId")}
            after={
              <button
                type="button"
                className="btn addlink"
                data-kind="plain"
                onClick={() => setIsAdding(true)}
              >
                Add a surgery that is not in the list
              </button>
            }
          />
        )}
      />
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
      <AddSurgery open={isAdding} onClose={() => setIsAdding(false)} onAdded={take} />
    </>
  );
}
