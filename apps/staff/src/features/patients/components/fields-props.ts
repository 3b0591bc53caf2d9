import type { PayerView } from "@withy/contracts/patients";
import type { UseFormReturn } from "react-hook-form";
import type { PatientForm } from "../patient-form";

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
