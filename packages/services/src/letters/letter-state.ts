import type { LetterSection, StaleSentence } from "@withy/contracts/letters";
import { assembleDischargeLetter } from "@withy/documents/letter/assemble-discharge-letter";
import type { LetterToCheck } from "@withy/documents/letter/check-letter";
import { missingSentences, staleSentences } from "@withy/documents/letter/compare-with-record";
import type { Context } from "../context";
import { gatherDischargeFacts } from "./gather-discharge-facts";
import { type LetterAtHand, recipientOf, sectionsOf } from "./letter-records";

/** A draft beside the record as it stands now. */
export interface LetterState {
  readonly fresh: readonly LetterSection[];
  readonly stale: readonly StaleSentence[];
  readonly missing: readonly LetterSection[];
  readonly toCheck: LetterToCheck;
}

export async function letterState(
  ctx: Context,
  { letter, episode }: LetterAtHand,
  authorName: string,
): Promise<LetterState> {
  const { facts, unsignedNotes, visitsBooked } = await gatherDischargeFacts(ctx, episode);
  const fresh = assembleDischargeLetter(facts);
  const sections = sectionsOf(letter);
  const stale = staleSentences(sections, fresh);
  return {
    fresh,
    stale,
    missing: missingSentences(sections, fresh),
    toCheck: {
      state: letter.state,
      authorId: letter.authorId,
      authorName,
      recipientName: recipientOf(letter).name,
      sections,
      side: episode.side,
      staleCount: stale.length,
      unsignedNotes,
      visitsBooked,
    },
  };
}
