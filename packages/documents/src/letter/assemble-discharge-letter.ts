import {
  type LetterSection,
  type LetterSectionKey,
  type LetterSentence,
  letterHeadings,
  letterSectionKeys,
} from "@withy/contracts/letters";
import {
  allergies,
  concerns,
  diagnoses,
  findings,
  history,
  referrer,
  safety,
  scales,
} from "./assessment-sections";
import { advice, attendance, plan, summary } from "./care-sections";
import type { DischargeFacts } from "./discharge-facts";

const writers: Record<LetterSectionKey, (facts: DischargeFacts) => LetterSentence[]> = {
  diagnoses,
  plan,
  referrer,
  attendance,
  history,
  concerns,
  findings,
  scales,
  summary,
  advice,
  safety,
  allergies,
};

/**
 * The discharge letter as the record tells it: the headings that have something to say, each sentence with the row
 * it was made from. The same facts give the same letter, so a later assembly shows what has changed since.
 * Headings: outpatient letter standard of the Professional Record Standards Body.
 */
export function assembleDischargeLetter(facts: DischargeFacts): LetterSection[] {
  return letterSectionKeys
    .map((key) => ({
      key,
      heading: letterHeadings[key],
      sentences: writers[key](facts).filter((sentence) => sentence.text !== ""),
    }))
    .filter((section) => section.sentences.length > 0);
}
