"use client";
import { Combobox } from "@withy/ui/combobox";
import { useState } from "react";
import { Controller } from "react-hook-form";
import { fieldProblem } from "@/api/form-problems";
import { findGpPractices } from "../api-client";
import type { SurgeryOption } from "../patient-form";
import { AddSurgery } from "./add-surgery";
import type { FieldsProps } from "./fields-props";

/** The GP surgery, found as one types, or added where the list does not have it. */
export function SurgeryField({ form, error }: Pick<FieldsProps, "form" | "error">) {
  const [isAdding, setIsAdding] = useState(false);
  const take = (surgery: SurgeryOption) => {
    form.setValue("gpPractice", surgery);
    setIsAdding(false);
  };
  return (
    <>
      <Controller
        control={form.control}
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
      <AddSurgery open={isAdding} onClose={() => setIsAdding(false)} onAdded={take} />
    </>
  );
}
