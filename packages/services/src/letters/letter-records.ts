import type { LetterRecipientView, LetterSection } from "@withy/contracts/letters";
import type { Permission } from "@withy/core/access/permissions";
import { episodes, letters } from "@withy/db/schema";
import type { EpisodeRow } from "../clinical/episode-records";
import type { Context } from "../context";
import { loadRecord } from "../load-record";
import { requireReach } from "../reach";

export type LetterRow = typeof letters.$inferSelect;

export interface LetterAtHand {
  readonly letter: LetterRow;
  readonly episode: EpisodeRow;
}

/** One letter whose episode this person may reach, or "not found". */
export async function loadLetter(
  ctx: Context,
  permission: Permission,
  letterId: string,
  options: { lock?: boolean } = {},
): Promise<LetterAtHand> {
  const letter = await loadRecord(ctx, letters, letterId, "letter", options);
  const episode = await loadRecord(ctx, episodes, letter.episodeId, "letter");
  requireReach(ctx, permission, episode.siteId, "letter");
  return { letter, episode };
}

/** The stored parts in the contract's words: what was written went through the contract. */
export const sectionsOf = (letter: LetterRow): LetterSection[] => letter.sections as LetterSection[];
export const recipientOf = (letter: LetterRow): LetterRecipientView => letter.recipient;

export const letterTitles: Record<LetterRow["kind"], string> = { discharge: "Discharge from physiotherapy" };
