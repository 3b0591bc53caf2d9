import { outcomes } from "@withy/clinical/episodes/states";
import { z } from "zod";
import { idField, optionalText, pageFields, requiredText, versionField } from "../fields";
import { longestSentence } from "./content";
import { letterActors, letterSectionKeys } from "./headings";

export const letterIdInput = z.strictObject({ letterId: idField });

export const draftDischargeLetterInput = z.strictObject({ episodeId: idField });

const emailField = z
  .string()
  .trim()
  .transform((text) => (text === "" ? null : text))
  .nullish()
  .transform((text) => text ?? null)
  .refine(
    (text) => text === null || z.email().safeParse(text).success,
    "Enter an e-mail address such as letters@surgery.example.",
  );

export const letterRecipientInput = z.strictObject({
  name: requiredText(160, "Enter who the letter is to."),
  addressLines: z
    .array(z.string().trim().max(100, "Keep each line of the address under 100 characters."))
    .max(7, "Keep the address to seven lines, so that it fits the envelope's window.")
    .transform((lines) => lines.filter((line) => line !== "")),
  email: emailField,
});

/** What the writer may change: words and order. Where a sentence comes from is ours to say, never the browser's. */
export const saveLetterInput = z.strictObject({
  letterId: idField,
  version: versionField,
  recipient: letterRecipientInput,
  sections: z
    .array(
      z.strictObject({
        key: z.enum(letterSectionKeys),
        sentences: z
          .array(
            z.strictObject({
              id: z.string().min(1).max(120),
              text: z.string().trim().max(longestSentence, "Keep each sentence under 8,000 characters."),
              actor: z.enum(letterActors).nullable(),
            }),
          )
          .max(60, "Keep each part to 60 sentences."),
      }),
    )
    .max(letterSectionKeys.length),
});
export type SaveLetterInput = z.input<typeof saveLetterInput>;

/** take: say what the record says now. keep: leave the words as they are, and say why. */
export const settleSentenceInput = z.strictObject({
  letterId: idField,
  version: versionField,
  sentenceId: z.string().min(1).max(120),
  choice: z.enum(["take", "keep"]),
  reason: optionalText(300, "The reason"),
});
export type SettleSentenceInput = z.input<typeof settleSentenceInput>;

export const signLetterInput = z.strictObject({
  letterId: idField,
  version: versionField,
  /** Given where the same act ends the episode. */
  discharge: z
    .strictObject({ version: versionField, outcome: z.enum(outcomes, "Choose how the episode ended.") })
    .nullable()
    .default(null),
});
export type SignLetterInput = z.input<typeof signLetterInput>;

export const sendLetterInput = z.strictObject({
  letterId: idField,
  /** The recipient of the letter, or a copy for the patient. */
  to: z.enum(["recipient", "patient"]),
  channel: z.enum(["email", "print"]),
  /** Another address than the one on record, for this sending only. */
  email: emailField,
});
export type SendLetterInput = z.input<typeof sendLetterInput>;

export const listLettersInput = z.strictObject({
  state: z.enum(["all", "draft", "signed"]).default("all"),
  patientId: idField.optional(),
  ...pageFields,
});
export type ListLettersInput = z.input<typeof listLettersInput>;

/** What the reader of a private link must know, as they typed it. */
export const letterReaderInput = z.strictObject({
  bornOn: requiredText(40, "Enter the patient's date of birth as day, month and year."),
});

/** The secret part of a private link: 32 random bytes in base64url. */
export const letterTokenInput = z.strictObject({ token: z.string().regex(/^[A-Za-z0-9_-]{43}$/) });
