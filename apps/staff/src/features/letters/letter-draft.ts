import {
  type LetterActor,
  type LetterSection,
  type LetterSectionKey,
  type LetterSentence,
  type LetterView,
  letterHeadings,
  letterSectionKeys,
  type SaveLetterInput,
} from "@withy/contracts/letters";

/** What the writer has before them: the parts of the view that can be typed in. */
export interface LetterDraft {
  readonly recipient: { readonly name: string; readonly address: string; readonly email: string };
  readonly sections: readonly LetterSection[];
}

export function draftOf(letter: LetterView): LetterDraft {
  const { name, addressLines, email } = letter.recipient;
  return {
    recipient: { name, address: addressLines.join("\n"), email: email ?? "" },
    sections: letter.sections,
  };
}

function changeSentence(
  draft: LetterDraft,
  key: LetterSectionKey,
  id: string,
  to: Partial<LetterSentence>,
): LetterDraft {
  const sections = draft.sections.map((section) =>
    section.key !== key
      ? section
      : { ...section, sentences: section.sentences.map((one) => (one.id === id ? { ...one, ...to } : one)) },
  );
  return { ...draft, sections };
}

export const withText = (draft: LetterDraft, key: LetterSectionKey, id: string, text: string): LetterDraft =>
  changeSentence(draft, key, id, { text });

export const withActor = (
  draft: LetterDraft,
  key: LetterSectionKey,
  id: string,
  actor: LetterActor,
): LetterDraft => changeSentence(draft, key, id, { actor });

/** An empty sentence of the writer's own at the end of a part; the part is put in where it was not there. */
export function withNewSentence(draft: LetterDraft, key: LetterSectionKey, id: string): LetterDraft {
  const sentence: LetterSentence = {
    id,
    text: "",
    source: null,
    assembled: null,
    actor: key === "plan" ? "gp" : null,
    keptBecause: null,
  };
  const sections = letterSectionKeys.flatMap((one): LetterSection[] => {
    const section = draft.sections.find((s) => s.key === one);
    if (one !== key) return section ? [section] : [];
    return [{ key, heading: letterHeadings[key], sentences: [...(section?.sentences ?? []), sentence] }];
  });
  return { ...draft, sections };
}

/** The parts of the standard that this letter does not have. */
export function absentSections(draft: LetterDraft): LetterSectionKey[] {
  return letterSectionKeys.filter((key) => !draft.sections.some((section) => section.key === key));
}

export function saveInputOf(letterId: string, version: number, draft: LetterDraft): SaveLetterInput {
  const { name, address, email } = draft.recipient;
  return {
    letterId,
    version,
    recipient: { name, addressLines: address.split("\n"), email },
    sections: draft.sections.map(({ key, sentences }) => ({
      key,
      sentences: sentences.map(({ id, text, actor }) => ({ id, text, actor })),
    })),
  };
}
