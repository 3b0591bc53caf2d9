import { type LetterView, settleSentenceInput } from "@withy/contracts/letters";
import { notFound, refused, refuseIf } from "@withy/core/errors";
import { refusal } from "@withy/core/refusal";
import { checkWrite } from "@withy/documents/letter/check-letter";
import { keepAgainstRecord, takeFromRecord } from "@withy/documents/letter/merge-edits";
import { loadStaffName } from "../clinical/episode-records";
import { inTransaction } from "../transaction";
import { verb } from "../verb";
import { changeLetter, requireLetterVersion } from "./change-letter";
import { auditLetter } from "./letter-audit";
import { loadLetter, sectionsOf } from "./letter-records";
import { letterState } from "./letter-state";
import { letterView } from "./letter-view";

/** Settles one sentence that no longer agrees with the record: the record's words, or the writer's with a reason. */
export const settleSentence = verb(
  "letters.write",
  settleSentenceInput,
  async (ctx, input): Promise<LetterView> =>
    inTransaction(ctx, async (tx) => {
      const at = await loadLetter(tx, "letters.write", input.letterId, { lock: true });
      const { letter, episode } = at;
      const authorName = await loadStaffName(tx, letter.authorId);
      refuseIf(checkWrite({ ...letter, authorName }, tx.staffMemberId));
      requireLetterVersion(letter, input.version);
      if (input.choice === "keep" && input.reason === null) {
        throw refused(refusal("no-reason", "Say why the older words stay.", "reason"));
      }
      const { fresh } = await letterState(tx, at, authorName);
      const sections =
        input.choice === "take"
          ? takeFromRecord(sectionsOf(letter), fresh, input.sentenceId)
          : keepAgainstRecord(sectionsOf(letter), fresh, input.sentenceId, input.reason ?? "");
      if (!sections) throw notFound("sentence");
      const changed = await changeLetter(tx, letter, { sections });
      await auditLetter(tx, "settled", at, { version: changed.version, choice: input.choice });
      return letterView(tx, { letter: changed, episode });
    }),
);
