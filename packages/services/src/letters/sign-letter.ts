import { createHash } from "node:crypto";
import { type LetterView, signLetterInput } from "@withy/contracts/letters";
import { refuseIf } from "@withy/core/errors";
import { dayOf } from "@withy/core/zoned-time";
import { staffMembers } from "@withy/db/schema";
import { checkSign } from "@withy/documents/letter/check-letter";
import { dischargeEpisode } from "../clinical/discharge-episode";
import { loadSite, loadStaffName } from "../clinical/episode-records";
import type { Context } from "../context";
import { loadRecord } from "../load-record";
import { inTransaction } from "../transaction";
import { verb } from "../verb";
import { changeLetter, requireLetterVersion } from "./change-letter";
import { auditLetter } from "./letter-audit";
import { type LetterRow, loadLetter } from "./letter-records";
import { letterState } from "./letter-state";
import { letterView } from "./letter-view";

/** Who, to whom, when and every word: any later change of one character gives another value. */
function hashOf(
  letter: LetterRow,
  signature: { datedOn: string; signedName: string; registrationNumber: string },
): string {
  const form = JSON.stringify([letter.id, letter.patientId, signature, letter.recipient, letter.sections]);
  return createHash("sha256").update(form, "utf8").digest("hex");
}

/** Signs the letter; from then on the database itself refuses to change it. The same act may end the episode. */
export const signLetter = verb(
  "letters.sign",
  signLetterInput,
  async (ctx, input): Promise<LetterView> =>
    inTransaction(ctx, async (tx) => {
      const at = await loadLetter(tx, "letters.sign", input.letterId, { lock: true });
      const { letter, episode } = at;
      const signer = await loadRecord(tx, staffMembers, tx.staffMemberId, "staff member");
      const state = await letterState(tx, at, await loadStaffName(tx, letter.authorId));
      refuseIf(checkSign(state.toCheck, { id: signer.id, registrationNumber: signer.registrationNumber }));
      requireLetterVersion(letter, input.version);
      if (input.discharge) await dischargeEpisode(tx, { episodeId: episode.id, ...input.discharge });
      await writeSigned(tx, letter, signer, await loadSite(tx, episode.siteId));
      await auditLetter(tx, "signed", at, {
        version: letter.version + 1,
        discharged: input.discharge !== null,
      });
      return letterView(tx, await loadLetter(tx, "letters.read", letter.id));
    }),
);

async function writeSigned(
  ctx: Context,
  letter: LetterRow,
  signer: typeof staffMembers.$inferSelect,
  site: { zone: string },
): Promise<void> {
  const now = ctx.clock.now();
  const signature = {
    datedOn: dayOf(now, site.zone),
    signedName: `${signer.givenName} ${signer.familyName}`,
    registrationNumber: signer.registrationNumber ?? "",
  };
  await changeLetter(ctx, letter, {
    ...signature,
    state: "signed",
    signedAt: now,
    signedBy: ctx.staffMemberId,
    bodyHash: hashOf(letter, signature),
  });
}
