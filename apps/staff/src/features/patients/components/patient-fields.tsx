"use client";
import type { PayerView } from "@withy/contracts/patients";
import { SectionHead } from "@withy/ui/section-head";
import type { UseFormReturn } from "react-hook-form";
import type { PatientForm } from "../patient-form";
import { CareFields } from "./care-fields";
import { NameFields } from "./name-fields";
import { PayerFields } from "./payer-fields";
import { ReachFields } from "./reach-fields";

/** The short lists behind the form's choices, read with the page. */
export interface PatientChoices {
  today: string;
  zone: string;
  sites: readonly { id: string; name: string }[];
  therapists: readonly { id: string; name: string }[];
  payers: readonly PayerView[];
}

export interface FieldsProps {
  form: UseFormReturn<PatientForm>;
  /** The save that was refused, whose sentences stand beside the fields. */
  error: unknown;
  choices: PatientChoices;
}

/** The patient form's fields in two columns where there is room. */
export function PatientFields(props: FieldsProps) {
  return (
    <div className="formcols">
      <div>
        <SectionHead title="Who" />
        <NameFields {...props} />
        <SectionHead title="How to reach them" />
        <ReachFields {...props} />
      </div>
      <div>
        <SectionHead title="GP and care" />
        <CareFields {...props} />
        <SectionHead title="Who pays" />
        <PayerFields {...props} />
      </div>
    </div>
  );
}
