import { checkLength, checkWrite } from "@withy/clinical/notes/check-note";
import { draftNoteText, isSameText } from "@withy/clinical/notes/note-text";
import { type SavedNote, type StaleNote, saveNoteDraftInput } from "@withy/contracts/clinical";
import { refuseIf, stale } from "@withy/core/errors";
import { notes } from "@withy/db/schema";
import { and, eq } from "drizzle-orm";
import { recordAudit } from "../audit";
import { inTransaction } from "../transaction";
import { verb } from "../verb";
import { keepOverwritten } from "./note-history";
import { loadNote, type NoteRow } from "./note-records";

/** Saves what is typed. An old version is refused with both texts, so that neither is lost. */
export const saveNoteDraft = verb(
  "clinical.write",
  saveNoteDraftInput,
  async (ctx, input): Promise<SavedNote> =>
    inTransaction(ctx, async (tx) => {
      const { note, authorName, siteId } = await loadNote(tx, "clinical.write", input.noteId, { lock: true });
      refuseIf(checkWrite({ ...note, authorName }, tx.staffMemberId));
      const body = draftNoteText(note.kind, input.body);
      refuseIf(checkLength(note.kind, body));
      // The same words again: an answer was lost on the way, or nothing was typed.
      if (isSameText(note.kind, note.body, body)) return saved(note.version, note.updatedAt);
      if (note.version !== input.version) throw stale("note", { ...bothTexts(note, input.version, body) });
      const now = tx.clock.now();
      await keepOverwritten(tx, note, now);
      const version = note.version + 1;
      await tx.db
        .update(notes)
        .set({ body, version, updatedAt: now })
        .where(and(eq(notes.practiceId, tx.practiceId), eq(notes.id, note.id)));
      await recordAudit(tx, {
        action: "note.saved",
        subjectKind: "note",
        subjectId: note.id,
        patientId: note.patientId,
        siteId,
        detail: { version },
      });
      return saved(version, now);
    }),
);

function saved(version: number, at: Date): SavedNote {
  return { version, savedAt: at.toISOString() };
}

function bothTexts(note: NoteRow, seen: number, yours: Record<string, string>): StaleNote {
  return {
    theirs: { version: note.version, body: note.body, savedAt: note.updatedAt.toISOString() },
    yours: { version: seen, body: yours },
  };
}
