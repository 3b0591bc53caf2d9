"use client";
import { SectionHead } from "@withy/ui/section-head";
import { CareFields } from "./care-fields";
import type { FieldsProps } from "./fields-props";
import { NameFields } from "./name-fields";
import { PayerFields } from "./payer-fields";
import { ReachFields } from "./reach-fields";

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
