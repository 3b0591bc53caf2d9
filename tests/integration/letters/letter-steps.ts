import type { LetterView } from "@withy/contracts/letters";
import { recordMeasure, signNote } from "@withy/services/clinical";
import { draftDischargeLetter, signLetter } from "@withy/services/letters";
import { contextFor } from "../../support/contexts";
import type { TestPractice } from "../../support/practice";
import { addNote } from "../clinical/visit-with-note";

export const therapistOf = (practice: TestPractice) => contextFor(practice, "therapist");

export async function recordPain(
  practice: TestPractice,
  episodeId: string,
  value: number,
  takenOn?: string,
): Promise<void> {
  await recordMeasure(therapistOf(practice), {
    episodeId,
    measureKey: "pain-rating",
    entry: { form: "items", answers: [value] },
    ...(takenOn ? { takenOn } : {}),
  });
}

/** A treated patient with one signed note and a pain score, and the discharge letter drafted from them. */
export async function addDraft(practice: TestPractice) {
  const ctx = therapistOf(practice);
  const treated = await addNote(practice, { isWritten: true });
  await signNote(ctx, { noteId: treated.noteId, version: treated.version });
  await recordPain(practice, treated.episode.id, 6);
  const letter = await draftDischargeLetter(ctx, { episodeId: treated.episode.id });
  return { ...treated, letter };
}

export async function addSigned(practice: TestPractice) {
  const made = await addDraft(practice);
  const letter = await signLetter(therapistOf(practice), {
    letterId: made.letter.id,
    version: made.letter.version,
  });
  return { ...made, letter };
}

export const sentencesOf = (letter: LetterView) => letter.sections.flatMap((section) => section.sentences);
export const findSentence = (letter: LetterView, id: string) =>
  sentencesOf(letter).find((sentence) => sentence.id === id);

/** The letter as the screen sends it back, with some sentences said otherwise. */
export function editOf(letter: LetterView, words: Record<string, string> = {}) {
  return {
    letterId: letter.id,
    version: letter.version,
    recipient: {
      name: letter.recipient.name,
      addressLines: [...letter.recipient.addressLines],
      email: letter.recipient.email,
    },
    sections: letter.sections.map(({ key, sentences }) => ({
      key,
      sentences: sentences.map(({ id, text, actor }) => ({ id, text: words[id] ?? text, actor })),
    })),
  };
}

/** The secret of the private link in a message. */
export const tokenIn = (text: string | undefined) =>
  /\/link\/([A-Za-z0-9_-]{43})\/letter/.exec(text ?? "")?.[1] ?? "";
