import { type LetterView, saveLetterInput } from "@withy/contracts/letters";
import { refuseIf } from "@withy/core/errors";
import { checkWrite } from "@withy/documents/letter/check-letter";
import { mergeEdits } from "@withy/documents/letter/merge-edits";
import { loadStaffName } from "../clinical/episode-records";
import { inTransaction } from "../transaction";
import { verb } from "../verb";
import { changeLetter, requireLetterVersion } from "./change-letter";
import { auditLetter } from "./letter-audit";
import { loadLetter, sectionsOf } from "./letter-records";
import { letterView } from "./letter-view";

/** Saves the writer's words. Where each sentence comes from stays as we know it. */
export const saveLetter = verb(
  "letters.write",
  saveLetterInput,
  async (ctx, input): Promise<LetterView> =>
    inTransaction(ctx, async (tx) => {
      const at = await loadLetter(tx, "letters.write", input.letterId, { lock: true });
      const { letter, episode } = at;
      const authorName = await loadStaffName(tx, letter.authorId);
      refuseIf(checkWrite({ ...letter, authorName }, tx.staffMemberId));
      requireLetterVersion(letter, input.version);
      const changed = await changeLetter(tx, letter, {
        recipient: { kind: letter.recipient.kind, ...input.recipient },
        sections: mergeEdits(sectionsOf(letter), input.sections),
      });
      await auditLetter(tx, "saved", at, { version: changed.version });
      return letterView(tx, { letter: changed, episode });
    }),
);
