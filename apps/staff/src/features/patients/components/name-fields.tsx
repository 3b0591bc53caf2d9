"use client";
import { DateEntry } from "@withy/ui/date-entry";
import { FieldRow } from "@withy/ui/field-group";
import { Select } from "@withy/ui/select";
import { TextInput } from "@withy/ui/text-input";
import { Controller } from "react-hook-form";
import { fieldProblem } from "@/api/form-problems";
import type { FieldsProps } from "./fields-props";

const sexes = [
  { value: "female", label: "Female" },
  { value: "male", label: "Male" },
  { value: "other", label: "Another answer" },
];

export function NameFields({ form, error, choices }: FieldsProps) {
  const { register, control } = form;
  return (
    <>
      <FieldRow>
        <TextInput
          id="givenName"
          label="Given name"
          error={fieldProblem(error, "givenName")}
          {...register("givenName")}
        />
        <TextInput
          id="familyName"
          label="Family name"
          error={fieldProblem(error, "familyName")}
          {...register("familyName")}
        />
      </FieldRow>
      <TextInput
        id="preferredName"
        label="Likes to be called"
        hint="Only where it differs from the given name"
        error={fieldProblem(error, "preferredName")}
        {...register("preferredName")}
      />
      <FieldRow>
        <Controller
          control={control}
          name="bornOn"
          render={({ field }) => (
            <DateEntry
              id="bornOn"
              label="Date of birth"
              hint="Day, month and year, for example 27 3 1958"
              today={choices.today}
              past
              value={field.value}
              onChange={field.onChange}
              error={fieldProblem(error, "bornOn")}
            />
          )}
        />
        <Select
          id="sex"
          label="Sex"
          hint="Some published norms are split by it"
          placeholder="Not asked"
          options={sexes}
          error={fieldProblem(error, "sex")}
          {...register("sex")}
        />
      </FieldRow>
    </>
  );
}
