import { type NoteView, noteIdInput } from "@withy/contracts/clinical";
import { recordAudit } from "../audit";
import { verb } from "../verb";
import { loadNote } from "./note-records";
import { noteView } from "./note-view";

/** One note with the visit before; both count as read. */
export const getNote = verb("clinical.read", noteIdInput, async (ctx, input): Promise<NoteView> => {
  const at = await loadNote(ctx, "clinical.read", input.noteId);
  const view = await noteView(ctx, at);
  await recordAudit(ctx, {
    action: "note.read",
    subjectKind: "note",
    subjectId: at.note.id,
    patientId: at.note.patientId,
    siteId: at.siteId,
    detail: view.earlier === null ? {} : { alsoRead: view.earlier.id },
  });
  return view;
});
