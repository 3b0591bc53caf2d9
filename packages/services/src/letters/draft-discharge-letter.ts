import { draftDischargeLetterInput, type LetterView } from "@withy/contracts/letters";
import { newId } from "@withy/core/ids";
import { letters, patients } from "@withy/db/schema";
import { assembleDischargeLetter } from "@withy/documents/letter/assemble-discharge-letter";
import { and, eq } from "drizzle-orm";
import { loadEpisode } from "../clinical/episode-records";
import type { Context } from "../context";
import { loadRecord } from "../load-record";
import { requireReach } from "../reach";
import { inTransaction } from "../transaction";
import { verb } from "../verb";
import { gatherDischargeFacts } from "./gather-discharge-facts";
import { auditLetter } from "./letter-audit";
import { recipientFor } from "./letter-recipient";
import { loadLetter } from "./letter-records";
import { newLetterReference } from "./letter-reference";
import { letterView } from "./letter-view";

/**
 * A discharge letter of this episode, assembled from the record: the draft that this person already has, or a new one.
 * The episode's row is held, so that two presses make one draft.
 */
export const draftDischargeLetter = verb(
  "letters.write",
  draftDischargeLetterInput,
  async (ctx, input): Promise<LetterView> =>
    inTransaction(ctx, async (tx) => {
      const episode = await loadEpisode(tx, "letters.write", input.episodeId, { lock: true });
      requireReach(tx, "letters.write", episode.siteId, "episode");
      const open = await findOwnDraft(tx, episode.id);
      if (open) return letterView(tx, await loadLetter(tx, "letters.read", open));
      const patient = await loadRecord(tx, patients, episode.patientId, "patient");
      const { facts } = await gatherDischargeFacts(tx, episode);
      const now = tx.clock.now();
      const id = newId();
      await tx.db.insert(letters).values({
        practiceId: tx.practiceId,
        id,
        episodeId: episode.id,
        patientId: episode.patientId,
        authorId: tx.staffMemberId,
        kind: "discharge",
        reference: newLetterReference(),
        recipient: asRow(await recipientFor(tx, patient)),
        sections: assembleDischargeLetter(facts),
        datedOn: facts.today,
        createdAt: now,
        updatedAt: now,
      });
      const at = await loadLetter(tx, "letters.read", id);
      await auditLetter(tx, "drafted", at, { kind: "discharge" });
      return letterView(tx, at);
    }),
);

async function findOwnDraft(ctx: Context, episodeId: string): Promise<string | null> {
  const [row] = await ctx.db
    .select({ id: letters.id })
    .from(letters)
    .where(
      and(
        eq(letters.practiceId, ctx.practiceId),
        eq(letters.authorId, ctx.staffMemberId),
        eq(letters.state, "draft"),
        eq(letters.episodeId, episodeId),
      ),
    )
    .limit(1);
  return row?.id ?? null;
}

const asRow = (recipient: LetterView["recipient"]) => ({
  ...recipient,
  addressLines: [...recipient.addressLines],
});
