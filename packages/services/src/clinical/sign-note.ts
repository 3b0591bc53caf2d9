import { createHash } from "node:crypto";
import { checkSign } from "@withy/clinical/notes/check-note";
import { signedForm, tidyNoteText } from "@withy/clinical/notes/note-text";
import { type NoteView, signNoteInput } from "@withy/contracts/clinical";
import { refuseIf, stale } from "@withy/core/errors";
import { notes, staffMembers } from "@withy/db/schema";
import { and, eq } from "drizzle-orm";
import { recordAudit } from "../audit";
import type { Context } from "../context";
import { loadRecord } from "../load-record";
import { inTransaction } from "../transaction";
import { verb } from "../verb";
import { keepOverwritten, keepState } from "./note-history";
import { loadNote, type NoteRow } from "./note-records";
import { noteView } from "./note-view";

/** Signs the note as it was last saved. From then on the database itself refuses to change it. */
export const signNote = verb(
  "clinical.sign",
  signNoteInput,
  async (ctx, input): Promise<NoteView> =>
    inTransaction(ctx, async (tx) => {
      const { note, authorName, siteId } = await loadNote(tx, "clinical.sign", input.noteId, { lock: true });
      const signer = await loadRecord(tx, staffMembers, tx.staffMemberId, "staff member");
      const text = tidyNoteText(note.kind, note.body);
      refuseIf(
        checkSign(
          { ...note, authorName, text },
          { id: signer.id, registrationNumber: signer.registrationNumber },
        ),
      );
      if (note.version !== input.version) throw stale("note", { version: note.version });
      const now = tx.clock.now();
      await keepOverwritten(tx, note, now);
      await writeSigned(tx, note, text, {
        at: now,
        name: `${signer.givenName} ${signer.familyName}`,
        registrationNumber: signer.registrationNumber ?? "",
      });
      await recordAudit(tx, {
        action: "note.signed",
        subjectKind: "note",
        subjectId: note.id,
        patientId: note.patientId,
        siteId,
        detail: { version: note.version + 1 },
      });
      return noteView(tx, await loadNote(tx, "clinical.sign", note.id));
    }),
);

async function writeSigned(
  ctx: Context,
  note: NoteRow,
  text: Record<string, string>,
  signature: { at: Date; name: string; registrationNumber: string },
): Promise<void> {
  const form = signedForm(
    {
      noteId: note.id,
      patientId: note.patientId,
      kind: note.kind,
      visitAt: note.visitAt.toISOString(),
      signedAt: signature.at.toISOString(),
      signedName: signature.name,
      registrationNumber: signature.registrationNumber,
    },
    text,
  );
  const version = note.version + 1;
  await ctx.db
    .update(notes)
    .set({
      body: text,
      state: "signed",
      version,
      updatedAt: signature.at,
      signedAt: signature.at,
      signedBy: ctx.staffMemberId,
      signedName: signature.name,
      registrationNumber: signature.registrationNumber,
      bodyHash: createHash("sha256").update(form, "utf8").digest("hex"),
    })
    .where(and(eq(notes.practiceId, ctx.practiceId), eq(notes.id, note.id)));
  await keepState(ctx, {
    noteId: note.id,
    version,
    body: text,
    savedAt: signature.at,
    savedBy: ctx.staffMemberId,
  });
}
