import {
  type LetterSection,
  type LetterSentence,
  letterHeadings,
  letterSectionKeys,
} from "@withy/contracts/letters";

/** What came back from the screen: words and order, nothing about where they are from. */
export interface EditedSection {
  readonly key: LetterSection["key"];
  readonly sentences: readonly Pick<LetterSentence, "id" | "text" | "actor">[];
}

const typedId = (key: string, used: ReadonlySet<string>): string => {
  let n = 1;
  while (used.has(`${key}:typed-${n}`)) n += 1;
  return `${key}:typed-${n}`;
};

/**
 * The draft with the writer's words. A sentence that the draft knows keeps its source; any other is the writer's own
 * and gets an id of ours. A sourced sentence that is missing is kept with no text, so that it is known to be left out.
 */
export function mergeEdits(
  draft: readonly LetterSection[],
  edited: readonly EditedSection[],
): LetterSection[] {
  const known = new Map(
    draft.flatMap((section) => section.sentences.map((sentence) => [sentence.id, sentence])),
  );
  const used = new Set(known.keys());
  const taken = new Set<string>();
  return letterSectionKeys.flatMap((key) => {
    const words = edited.filter((section) => section.key === key).flatMap((section) => section.sentences);
    const sentences = words.flatMap(({ id, text, actor }): LetterSentence[] => {
      const before = known.get(id);
      if (before && !taken.has(id)) {
        taken.add(id);
        return before.source === null && text === ""
          ? []
          : [{ ...before, text, actor: key === "plan" ? actor : null }];
      }
      if (text === "") return [];
      const own = typedId(key, used);
      used.add(own);
      return [
        {
          id: own,
          text,
          source: null,
          assembled: null,
          actor: key === "plan" ? actor : null,
          keptBecause: null,
        },
      ];
    });
    const here = draft.find((section) => section.key === key)?.sentences ?? [];
    const everywhere = new Set(edited.flatMap((section) => section.sentences.map((sentence) => sentence.id)));
    const leftOut = here
      .filter((sentence) => sentence.source !== null && !everywhere.has(sentence.id))
      .map((sentence) => ({ ...sentence, text: "" }));
    const all = [...sentences, ...leftOut];
    return all.length === 0 ? [] : [{ key, heading: letterHeadings[key], sentences: all }];
  });
}

/** The draft with one sentence said as the record says it now: replaced where it stands, or added to its part. */
export function takeFromRecord(
  draft: readonly LetterSection[],
  fresh: readonly LetterSection[],
  id: string,
): LetterSection[] | null {
  const section = fresh.find((one) => one.sentences.some((sentence) => sentence.id === id));
  const now = section?.sentences.find((sentence) => sentence.id === id);
  const stands = draft.some((one) => one.sentences.some((sentence) => sentence.id === id));
  if (stands) {
    return draft
      .map((one) => ({
        ...one,
        sentences: one.sentences.flatMap((sentence) => (sentence.id !== id ? [sentence] : now ? [now] : [])),
      }))
      .filter((one) => one.sentences.length > 0);
  }
  if (!section || !now) return null;
  return letterSectionKeys.flatMap((key) => {
    const sentences = draft.find((one) => one.key === key)?.sentences ?? [];
    const all = key === section.key ? [...sentences, now] : sentences;
    return all.length === 0 ? [] : [{ key, heading: letterHeadings[key], sentences: all }];
  });
}

/** The draft with one sentence left as it is although the record has changed, and why. Null where there is none such. */
export function keepAgainstRecord(
  draft: readonly LetterSection[],
  fresh: readonly LetterSection[],
  id: string,
  reason: string,
): LetterSection[] | null {
  if (!draft.some((section) => section.sentences.some((sentence) => sentence.id === id))) return null;
  const now = fresh.flatMap((section) => section.sentences).find((sentence) => sentence.id === id);
  return draft.map((section) => ({
    ...section,
    sentences: section.sentences.map((sentence) =>
      sentence.id === id ? { ...sentence, assembled: now?.assembled ?? null, keptBecause: reason } : sentence,
    ),
  }));
}
