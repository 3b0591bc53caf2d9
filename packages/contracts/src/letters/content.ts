import { z } from "zod";
import { letterActors, letterSectionKeys } from "./headings";

export const letterSourceKinds = ["episode", "note", "measure", "visits", "programme", "patient"] as const;

export const letterSource = z.strictObject({
  kind: z.enum(letterSourceKinds),
  /** The row that the sentence was made from. */
  id: z.uuid(),
  /** What the margin says: "Assessment, 6 Oct". */
  label: z.string().max(80),
});
export type LetterSource = z.infer<typeof letterSource>;

/** A heading of a note may be one long sentence, so a sentence may be as long as a heading. */
export const longestSentence = 8200;

export const letterSentence = z.strictObject({
  /** Says the same thing about the same fact in every version of the letter: "scales:pain". */
  id: z.string().min(1).max(120),
  text: z.string().trim().max(longestSentence, "Keep each sentence under 8,000 characters."),
  /** Null for what a person typed. */
  source: letterSource.nullable(),
  /** What the record said when the sentence was last made from it; null for what a person typed. */
  assembled: z.string().max(longestSentence).nullable(),
  /** Only in the plan. */
  actor: z.enum(letterActors).nullable(),
  /** Why an older wording stays although the record has changed; null where nothing was kept against it. */
  keptBecause: z.string().max(300).nullable(),
});
export type LetterSentence = z.infer<typeof letterSentence>;

export const letterSection = z.strictObject({
  key: z.enum(letterSectionKeys),
  heading: z.string().max(120),
  sentences: z.array(letterSentence).max(60),
});
export type LetterSection = z.infer<typeof letterSection>;

/** A sentence whose source has changed since it was written. */
export interface StaleSentence {
  readonly id: string;
  /** What the record says now; null where it no longer says anything about this. */
  readonly now: string | null;
  readonly source: LetterSource | null;
}
