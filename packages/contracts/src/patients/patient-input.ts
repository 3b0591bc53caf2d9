import { readNhsNumber } from "@withy/core/identifiers/nhs-number";
import { readPhone } from "@withy/core/identifiers/phone";
import { normalisePostcode } from "@withy/core/identifiers/postcode";
import { isPlainDate } from "@withy/core/plain-date";
import { z } from "zod";
import { idField, optionalText, penceField, requiredText, versionField } from "../fields";

export const preferredChannels = ["email", "text", "phone", "post"] as const;
export type PreferredChannel = (typeof preferredChannels)[number];

export const sexes = ["female", "male", "other"] as const;
export type Sex = (typeof sexes)[number];

const emptyToNull = (text: string | null | undefined) => (text == null || text.trim() === "" ? null : text);

/** Reads text by a rule that answers null where it cannot; nothing typed is null, and no mistake. */
const readText = (read: (text: string) => string | null, problem: string) =>
  z
    .string()
    .nullish()
    .transform((text, ctx) => {
      const typed = emptyToNull(text);
      if (typed === null) return null;
      const value = read(typed);
      if (value !== null) return value;
      ctx.addIssue({ code: "custom", message: problem });
      return z.NEVER;
    });

const emailPattern = z.email();

export const patientPhoneField = readText(
  readPhone,
  "Enter a phone number in full, such as 07700 900123 or +33 1 99 00 12 34.",
);
export const emailField = readText((text) => {
  const email = text.trim().toLowerCase();
  return email.length <= 254 && emailPattern.safeParse(email).success ? email : null;
}, "Enter an e-mail address in full, such as name@post.example.");
const nhsNumberField = readText(
  readNhsNumber,
  "Check the NHS number: it has 10 digits, and these do not fit together.",
);
const postcodeField = readText((text) => {
  const postcode = normalisePostcode(text);
  return postcode.length >= 3 && postcode.length <= 10 ? postcode : null;
}, "Enter a postcode, such as ZZ4 6RN.");

export const patientPayerFields = z.strictObject({
  payerId: idField,
  policyNumber: optionalText(40, "The policy number"),
  authorisationCode: optionalText(40, "The authorisation code"),
  sessionsAuthorised: z
    .int("Enter a whole number of sessions.")
    .min(1, "Enter 1 session or more, or leave it empty.")
    .max(200, "Enter 200 sessions or fewer.")
    .nullish()
    .transform((n) => n ?? null),
  excessPence: penceField.default(0),
});

const details = {
  givenName: requiredText(80, "Enter the given name."),
  familyName: requiredText(80, "Enter the family name."),
  preferredName: optionalText(80, "The preferred name"),
  bornOn: z
    .string("Enter the date of birth as day, month and year.")
    .refine(isPlainDate, "Enter the date of birth as day, month and year."),
  sex: z
    .enum(sexes)
    .nullish()
    .transform((sex) => sex ?? null),
  phone: patientPhoneField,
  /** Said at the desk, so that an empty phone is no slip. */
  hasNoPhone: z.boolean().default(false),
  email: emailField,
  addressLines: z
    .array(z.string().trim().max(100, "Use 100 characters or fewer on each line."))
    .max(4, "Use up to four lines.")
    .default([])
    .transform((lines) => lines.filter((line) => line !== "")),
  postcode: postcodeField,
  nhsNumber: nhsNumberField,
  gpPracticeId: idField.nullish().transform((id) => id ?? null),
  gpName: optionalText(120, "The GP's name"),
  communicationNeeds: optionalText(300, "Communication needs"),
  preferredChannel: z.enum(preferredChannels, "Choose how to reach the patient.").default("email"),
  nextOfKin: optionalText(160, "The next of kin"),
  homeSiteId: idField.nullish().transform((id) => id ?? null),
  usualTherapistId: idField.nullish().transform((id) => id ?? null),
  /** Null: the patient pays. */
  payer: patientPayerFields.nullish().transform((payer) => payer ?? null),
  /** Said by the person who saves, once the possible duplicates have been shown. */
  isSomeoneElse: z.boolean().default(false),
};

interface Reachable {
  phone: string | null;
  hasNoPhone: boolean;
  email: string | null;
  addressLines: readonly string[];
  preferredChannel: PreferredChannel;
}

/** Asked even where other fields have mistakes, so that all of them are told at once; not where its own do. */
const unlessWrong = (fields: readonly string[]) => ({
  when: ({ issues }: z.core.ParsePayload) => !issues.some((i) => fields.includes(String(i.path?.[0]))),
});

const reach = [
  {
    field: "phone",
    message: "Enter a phone number, or tick that there is none.",
    holds: (p: Reachable) => p.phone !== null || p.hasNoPhone,
  },
  {
    field: "email",
    message: "Enter an e-mail address, or choose another way to reach the patient.",
    holds: (p: Reachable) => p.preferredChannel !== "email" || p.email !== null,
  },
  {
    field: "preferredChannel",
    message: "Choose a way that does not need a phone.",
    holds: (p: Reachable) =>
      !p.hasNoPhone || (p.preferredChannel !== "text" && p.preferredChannel !== "phone"),
  },
  {
    field: "addressLines",
    message: "Enter the address, or choose another way to reach the patient.",
    holds: (p: Reachable) => p.preferredChannel !== "post" || p.addressLines.length > 0,
  },
];

function withReach<S extends z.ZodType<Reachable>>(schema: S): S {
  return reach.reduce<S>(
    (built, { field, message, holds }) =>
      built.refine(holds, { path: [field], error: message, ...unlessWrong([field, "preferredChannel"]) }),
    schema,
  );
}

export const registerPatientInput = withReach(z.strictObject(details));
export type RegisterPatientInput = z.input<typeof registerPatientInput>;
export type PatientDetails = z.output<typeof registerPatientInput>;

export const editPatientInput = withReach(
  z.strictObject({ patientId: idField, version: versionField, ...details }),
);
export type EditPatientInput = z.input<typeof editPatientInput>;
