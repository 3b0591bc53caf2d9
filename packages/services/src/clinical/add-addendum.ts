import { checkAddendum } from "@withy/clinical/notes/check-note";
import { addAddendumInput, type NoteView } from "@withy/contracts/clinical";
import { refuseIf } from "@withy/core/errors";
import { newId } from "@withy/core/ids";
import { noteAddenda, staffMembers } from "@withy/db/schema";
import { recordAudit } from "../audit";
import { loadRecord } from "../load-record";
import { once } from "../once";
import { verb } from "../verb";
import { loadNote } from "./note-records";
import { noteView } from "./note-view";

/** Adds to a signed note under the name of whoever adds it; the signed text stays as it was. */
export const addAddendum = verb(
  "clinical.sign",
  addAddendumInput,
  async (ctx, input): Promise<NoteView> =>
    once(ctx, "note.add-addendum", async (tx) => {
      const at = await loadNote(tx, "clinical.sign", input.noteId);
      refuseIf(checkAddendum(at.note, input));
      const author = await loadRecord(tx, staffMembers, tx.staffMemberId, "staff member");
      const id = newId();
      await tx.db.insert(noteAddenda).values({
        practiceId: tx.practiceId,
        id,
        noteId: at.note.id,
        text: input.text,
        reason: input.reason,
        authorId: author.id,
        authorName: `${author.givenName} ${author.familyName}`,
        registrationNumber: author.registrationNumber,
        writtenAt: tx.clock.now(),
      });
      await recordAudit(tx, {
        action: "note.addendum-added",
        subjectKind: "note",
        subjectId: at.note.id,
        patientId: at.note.patientId,
        siteId: at.siteId,
        detail: { addendum: id },
      });
      return noteView(tx, at);
    }),
);
