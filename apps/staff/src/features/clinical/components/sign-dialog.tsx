"use client";
import { emptyHeadings } from "@withy/clinical/notes/check-note";
import type { NoteView } from "@withy/contracts/clinical";
import { AlertLine } from "@withy/ui/alert-line";
import { Button } from "@withy/ui/button";
import { Dialog } from "@withy/ui/dialog";
import { ErrorSummary, type FieldError } from "@withy/ui/error-summary";
import { problemItems } from "@/api/form-problems";
import type { NoteDraft } from "../hooks/use-note-draft";
import type { useSignNote } from "../hooks/use-sign-note";
import { clockAt, dayAt } from "../site-time";

export interface SignDialogProps {
  note: NoteView;
  draft: NoteDraft;
  sign: ReturnType<typeof useSignNote>;
  onClose: () => void;
  /** Closes the dialog and goes to a heading of the note. */
  onGoTo: (headingKey: string) => void;
}

/** The last look before a note is closed for good: whose it is, which side, and what is still empty. */
export function SignDialog({ note, draft, sign, onClose, onGoTo }: SignDialogProps) {
  const empty = emptyHeadings(note.kind, draft.body);
  const errors: FieldError[] = sign.error ? problemItems(sign.error).map(({ message }) => ({ message })) : [];
  const isUnsaved = sign.isSuccess && sign.data === null;
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={`Sign the note of ${note.patient.name}`}
      lead={`${note.episode.place}. Visit ${note.visitNumber}, ${dayAt(note.visitAt, note.zone)} at ${clockAt(note.visitAt, note.zone)}.`}
      closeLabel="Write on"
      actions={
        empty.length === 0 && (
          <Button
            kind="primary"
            busy={sign.isPending}
            onClick={() => sign.mutate(undefined, { onSuccess: (done) => done && onClose() })}
          >
            Sign for good
          </Button>
        )
      }
    >
      <ErrorSummary errors={errors} title="The note is not signed" attempt={sign.submittedAt} />
      {isUnsaved && (
        <AlertLine live>
          The last words could not be saved, so the note is not signed. Check the connection and try again.
        </AlertLine>
      )}
      {empty.length > 0 ? (
        <>
          <p>Write something under each of these, then sign:</p>
          <ul className="empty-headings">
            {empty.map(({ key, label }) => (
              <li key={key}>
                <button type="button" className="linklike" onClick={() => onGoTo(key)}>
                  {label}
                </button>
              </li>
            ))}
          </ul>
        </>
      ) : (
        <p>
          Your name, registration number and the time are printed under it. After that nobody can change it; a
          correction is added as an addendum.
        </p>
      )}
    </Dialog>
  );
}
