"use client";
import type { NoteView } from "@withy/contracts/clinical";
import { Button } from "@withy/ui/button";
import { Dialog } from "@withy/ui/dialog";
import { ErrorSummary, type FieldError } from "@withy/ui/error-summary";
import { TextArea, TextInput } from "@withy/ui/text-input";
import { useState } from "react";
import { problemItems } from "@/api/form-problems";
import { useAddAddendum } from "../hooks/use-add-addendum";

/** Adds to a signed note, with the reason. The signed text stays as it was. */
export function AddendumDialog({ note, onClose }: { note: NoteView; onClose: () => void }) {
  const add = useAddAddendum(note);
  const [reason, setReason] = useState("");
  const [text, setText] = useState("");
  const errors: FieldError[] = add.error ? problemItems(add.error, (field) => `addendum-${field}`) : [];
  const problem = (id: string) => errors.find((error) => error.id === id)?.message;
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title="Add an addendum"
      lead={`${note.patient.name}, ${note.episode.place}, visit ${note.visitNumber}. Your name and the time are printed with it, and it cannot be changed afterwards.`}
      actions={
        <Button kind="primary" type="submit" form="addendum-form" busy={add.isPending}>
          Add it
        </Button>
      }
    >
      <form
        id="addendum-form"
        noValidate
        onSubmit={(event) => {
          event.preventDefault();
          add.mutate({ reason, text }, { onSuccess: onClose });
        }}
      >
        <ErrorSummary errors={errors} attempt={add.submittedAt} />
        <TextInput
          id="addendum-reason"
          label="Why you are adding this"
          value={reason}
          onChange={(event) => setReason(event.target.value)}
          error={problem("addendum-reason")}
        />
        <TextArea
          id="addendum-text"
          label="What you are adding"
          ruled
          rows={4}
          value={text}
          onChange={(event) => setText(event.target.value)}
          error={problem("addendum-text")}
        />
      </form>
    </Dialog>
  );
}
