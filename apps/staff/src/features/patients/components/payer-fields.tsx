"use client";
import { FieldRow } from "@withy/ui/field-group";
import { Select } from "@withy/ui/select";
import { TextInput } from "@withy/ui/text-input";
import { fieldProblem } from "@/api/form-problems";
import type { FieldsProps } from "./fields-props";

export function PayerFields({ form, error, choices }: FieldsProps) {
  const { register, watch } = form;
  const hasPayer = watch("payerId") !== "";
  return (
    <>
      <Select
        id="payerId"
        label="Payer"
        placeholder="The patient"
        options={choices.payers.map((p) => ({ value: p.id, label: p.name }))}
        error={fieldProblem(error, "payer.payerId")}
        {...register("payerId")}
      />
      {hasPayer && (
        <>
          <FieldRow>
            <TextInput
              id="policyNumber"
              label="Policy number"
              error={fieldProblem(error, "payer.policyNumber")}
              {...register("policyNumber")}
            />
            <TextInput
              id="authorisationCode"
              label="Authorisation code"
              error={fieldProblem(error, "payer.authorisationCode")}
              {...register("authorisationCode")}
            />
          </FieldRow>
          <FieldRow>
            <TextInput
              id="sessionsAuthorised"
              label="Sessions authorised"
              inputMode="numeric"
              span="short"
              error={fieldProblem(error, "payer.sessionsAuthorised")}
              {...register("sessionsAuthorised")}
            />
            <TextInput
              id="excessPence"
              label="Excess in pounds"
              hint="The patient pays this part, for example 100.00"
              inputMode="decimal"
              span="short"
              error={fieldProblem(error, "payer.excessPence")}
              {...register("excessPence")}
            />
          </FieldRow>
        </>
      )}
    </>
  );
}
