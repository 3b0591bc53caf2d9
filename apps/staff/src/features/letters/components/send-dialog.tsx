"use client";
import type { LetterView } from "@withy/contracts/letters";
import { Button } from "@withy/ui/button";
import { Check } from "@withy/ui/check";
import { Dialog } from "@withy/ui/dialog";
import { ErrorSummary } from "@withy/ui/error-summary";
import { FieldGroup } from "@withy/ui/field-group";
import { useChanges } from "@withy/ui/recent-changes";
import { TextInput } from "@withy/ui/text-input";
import { useState } from "react";
import { fieldProblem, problemItems } from "@/api/form-problems";
import { useSendLetter } from "../hooks/use-send-letter";
import { clockNow } from "../letter-words";

/** Sends a signed letter, or notes that it was posted; also to another address than the one on record. */
export function SendDialog({ letter, onClose }: { letter: LetterView; onClose: () => void }) {
  const send = useSendLetter();
  const { announce } = useChanges();
  const [to, setTo] = useState<"recipient" | "patient">("recipient");
  const reader = to === "recipient" ? letter.recipient : letter.patient;
  const [channel, setChannel] = useState<"email" | "print">(
    letter.recipient.email === null ? "print" : "email",
  );
  const [typed, setTyped] = useState<string | null>(null);
  const email = typed ?? reader.email ?? "";
  const submit = async () => {
    await send.mutateAsync({ letterId: letter.id, to, channel, email: channel === "email" ? email : null });
    announce({
      at: clockNow(letter.zone),
      said:
        channel === "email"
          ? `Letter on its way to ${reader.name}`
          : `Letter to ${reader.name} noted as posted`,
    });
    onClose();
  };
  const chooseReader = (one: "recipient" | "patient") => {
    setTo(one);
    setTyped(null);
  };
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={`Send letter ${letter.reference}`}
      lead="The letter itself never goes by e-mail: the reader gets a private link that works for 30 days."
      actions={
        <Button kind="primary" busy={send.isPending} onClick={() => void submit().catch(() => undefined)}>
          {channel === "email" ? "Send the link" : "Note as posted"}
        </Button>
      }
    >
      <ErrorSummary
        errors={
          send.error ? problemItems(send.error, (field) => (field === "email" ? "send-email" : field)) : []
        }
        attempt={send.submittedAt}
      />
      <FieldGroup legend="To" id="send-reader">
        <Check
          type="radio"
          name="reader"
          checked={to === "recipient"}
          onChange={() => chooseReader("recipient")}
        >
          {letter.recipient.name}
        </Check>
        <Check type="radio" name="reader" checked={to === "patient"} onChange={() => chooseReader("patient")}>
          A copy to {letter.patient.name}
        </Check>
      </FieldGroup>
      <FieldGroup legend="How" id="send-channel">
        <Check type="radio" name="channel" checked={channel === "email"} onChange={() => setChannel("email")}>
          Private link by e-mail
        </Check>
        <Check type="radio" name="channel" checked={channel === "print"} onChange={() => setChannel("print")}>
          Printed and posted
        </Check>
      </FieldGroup>
      {channel === "email" && (
        <TextInput
          id="send-email"
          label="E-mail address"
          type="email"
          value={email}
          error={fieldProblem(send.error, "email")}
          onChange={(event) => setTyped(event.target.value)}
        />
      )}
    </Dialog>
  );
}
