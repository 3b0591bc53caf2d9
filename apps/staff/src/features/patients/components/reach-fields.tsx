"use client";
import { Check } from "@withy/ui/check";
import { FieldGroup, FieldRow } from "@withy/ui/field-group";
import { TextArea, TextInput } from "@withy/ui/text-input";
import { fieldProblem } from "@/api/form-problems";
import type { FieldsProps } from "./fields-props";

const channels = [
  { value: "email", label: "E-mail" },
  { value: "text", label: "Text message" },
  { value: "phone", label: "Phone call" },
  { value: "post", label: "Post" },
];

export function ReachFields({ form, error }: FieldsProps) {
  const { register, watch } = form;
  const hasNoPhone = watch("hasNoPhone");
  return (
    <>
      <TextInput
        id="phone"
        label="Phone"
        type="tel"
        span="mid"
        hint="Any way of writing it will do"
        error={fieldProblem(error, "phone")}
        readOnly={hasNoPhone}
        after={
          <Check {...register("hasNoPhone", { onChange: () => hasNoPhone || form.setValue("phone", "") })}>
            There is no phone
          </Check>
        }
        {...register("phone")}
      />
      <TextInput
        id="email"
        label="E-mail address"
        type="email"
        error={fieldProblem(error, "email")}
        {...register("email")}
      />
      <FieldRow>
        <TextArea
          id="addressLines"
          label="Address"
          hint="Up to four lines, without the postcode"
          error={fieldProblem(error, "addressLines")}
          {...register("addressLines")}
        />
        <TextInput
          id="postcode"
          label="Postcode"
          span="mid"
          error={fieldProblem(error, "postcode")}
          {...register("postcode")}
        />
      </FieldRow>
      <FieldGroup
        id="preferredChannel"
        legend="Reach the patient by"
        error={fieldProblem(error, "preferredChannel")}
      >
        <div className="inline">
          {channels.map(({ value, label }) => (
            <Check
              key={value}
              type="radio"
              id={value === "email" ? "preferredChannel" : undefined}
              value={value}
              {...register("preferredChannel")}
            >
              {label}
            </Check>
          ))}
        </div>
      </FieldGroup>
    </>
  );
}
