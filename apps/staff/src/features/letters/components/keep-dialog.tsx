"use client";
import { Button } from "@withy/ui/button";
import { Dialog } from "@withy/ui/dialog";
import { TextInput } from "@withy/ui/text-input";
import { useState } from "react";
import { fieldProblem } from "@/api/form-problems";

interface KeepDialogProps {
  error: unknown;
  isBusy: boolean;
  onKeep: (reason: string) => void;
  onClose: () => void;
}

/** Asks why a sentence stays although the record has changed. */
export function KeepDialog({ error, isBusy, onKeep, onClose }: KeepDialogProps) {
  const [reason, setReason] = useState("");
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title="Keep your words"
      lead="The sentence stays as it is, and the reason stays with the letter. It is not printed."
      actions={
        <Button kind="primary" busy={isBusy} onClick={() => onKeep(reason)}>
          Keep the sentence
        </Button>
      }
    >
      <TextInput
        id="keep-reason"
        label="Why it stays"
        maxLength={300}
        value={reason}
        error={fieldProblem(error, "reason")}
        onChange={(event) => setReason(event.target.value)}
      />
    </Dialog>
  );
}
