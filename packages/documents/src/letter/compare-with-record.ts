import type { LetterSection, LetterSentence, StaleSentence } from "@withy/contracts/letters";

const sentencesOf = (sections: readonly LetterSection[]): LetterSentence[] =>
  sections.flatMap((section) => section.sentences);

/**
 * The sentences of a draft whose source says something else now than when they were made. What a person typed is
 * never stale, nor what was left out (its text is empty); what was edited is, where its source has moved.
 * @param fresh the same letter assembled from the record as it stands
 */
export function staleSentences(
  draft: readonly LetterSection[],
  fresh: readonly LetterSection[],
): StaleSentence[] {
  const now = new Map(sentencesOf(fresh).map((sentence) => [sentence.id, sentence]));
  return sentencesOf(draft).flatMap((sentence) => {
    if (sentence.source === null || sentence.text === "") return [];
    const current = now.get(sentence.id);
    if (current?.assembled === sentence.assembled) return [];
    return [{ id: sentence.id, now: current?.assembled ?? null, source: current?.source ?? null }];
  });
}

/** What the record says now and the draft has no sentence for, with the section that it belongs to. */
export function missingSentences(
  draft: readonly LetterSection[],
  fresh: readonly LetterSection[],
): LetterSection[] {
  const said = new Set(sentencesOf(draft).map((sentence) => sentence.id));
  return fresh
    .map((section) => ({
      ...section,
      sentences: section.sentences.filter((sentence) => !said.has(sentence.id)),
    }))
    .filter((section) => section.sentences.length > 0);
}
