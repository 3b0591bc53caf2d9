import { z } from "zod";
import { optionalText, requiredText } from "../fields";
import { emailField, patientPhoneField } from "./patient-input";

/** Surgeries whose name or postcode starts with what was typed. */
export const listGpPracticesInput = z.strictObject({
  search: z.string().trim().max(80).default(""),
});

export interface GpPracticeView {
  readonly id: string;
  readonly name: string;
  readonly addressLines: readonly string[];
  readonly postcode: string;
  readonly phone: string | null;
  readonly email: string | null;
}

export const addGpPracticeInput = z.strictObject({
  name: requiredText(120, "Enter the surgery's name."),
  addressLines: z
    .array(z.string().trim().max(100, "Use 100 characters or fewer on each line."))
    .max(4, "Use up to four lines.")
    .transform((lines) => lines.filter((line) => line !== ""))
    .refine((lines) => lines.length > 0, "Enter the surgery's address."),
  postcode: requiredText(10, "Enter the surgery's postcode."),
  phone: patientPhoneField,
  email: emailField,
  odsCode: optionalText(9, "The ODS code"),
});
export type AddGpPracticeInput = z.input<typeof addGpPracticeInput>;

export const listPayersInput = z.strictObject({});

export interface PayerView {
  readonly id: string;
  readonly name: string;
  readonly kind: "insurer" | "employer";
}
