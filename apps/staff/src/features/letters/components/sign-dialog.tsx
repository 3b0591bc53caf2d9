"use client";
import { type Outcome, outcomeLabels, outcomes } from "@withy/clinical/episodes/states";
import type { LetterView } from "@withy/contracts/letters";
import { Button } from "@withy/ui/button";
import { Check } from "@withy/ui/check";
import { Dialog } from "@withy/ui/dialog";
import { ErrorSummary, type FieldError } from "@withy/ui/error-summary";
import { FieldGroup } from "@withy/ui/field-group";
import { useChanges } from "@withy/ui/recent-changes";
import { useState } from "react";
import { problemItems } from "@/api/form-problems";
import { signLetter } from "../api-client";
import { useLetterWrite } from "../hooks/use-letter-write";
import { useSendLetter } from "../hooks/use-send-letter";
import { clockNow } from "../letter-words";

interface SignDialogProps {
  letter: LetterView;
  onClose: () => void;
  onSigned: (letter: LetterView) => void;
}

/** Signs the letter, ends the episode with it where wished, and sends it: one act at the end of care. */
export function SignDialog({ letter, onClose, onSigned }: SignDialogProps) {
  const sign = useLetterWrite(signLetter);
  const send = useSendLetter();
  const { announce } = useChanges();
  const canEnd = letter.episode.state === "open";
  const [ends, setEnds] = useState(canEnd);
  const [outcome, setOutcome] = useState<Outcome | null>(null);
  const [toRecipient, setToRecipient] = useState(letter.recipient.email !== null);
  const [toPatient, setToPatient] = useState(false);
  const [isMissing, setIsMissing] = useState(false);
  const errors: FieldError[] = isMissing
    ? [{ id: "outcome-goals-met", message: "Choose how the episode ended." }]
    : sign.error
      ? problemItems(sign.error)
      : [];

  const submit = async () => {
    setIsMissing(ends && outcome === null);
    if (ends && outcome === null) return;
    const discharge = ends && outcome ? { version: letter.episode.version, outcome } : null;
    let view = await sign.mutateAsync({ letterId: letter.id, version: letter.version, discharge });
    const readers = [
      ...(toRecipient ? ["recipient" as const] : []),
      ...(toPatient ? ["patient" as const] : []),
    ];
    // A signed letter stays signed where a sending is refused: the page then shows what to do.
    for (const to of readers)
      view = await send.mutateAsync({ letterId: letter.id, to, channel: "email" }).catch(() => view);
    announce({ at: clockNow(letter.zone), said: said(letter, view, readers.length) });
    onSigned(view);
    onClose();
  };

  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={`Sign the letter about ${letter.patient.name}`}
      lead={`${letter.episode.place}, ${letter.episode.problem}. A signed letter cannot be changed.`}
      closeLabel="Go on writing"
      actions={
        <Button
          kind="primary"
          busy={sign.isPending || send.isPending}
          onClick={() => void submit().catch(() => undefined)}
        >
          {toRecipient || toPatient ? "Sign and send" : "Sign"}
        </Button>
      }
    >
      <ErrorSummary errors={errors} attempt={sign.submittedAt} />
      {canEnd && (
        <FieldGroup legend="The episode" id="episode-end">
          <Check checked={ends} onChange={(event) => setEnds(event.target.checked)}>
            Discharge with this letter
          </Check>
        </FieldGroup>
      )}
      {ends && (
        <FieldGroup
          legend="How it ended"
          id="outcome"
          error={isMissing ? "Choose how the episode ended." : undefined}
        >
          {outcomes.map((one) => (
            <Check
              key={one}
              type="radio"
              name="outcome"
              id={`outcome-${one}`}
              checked={outcome === one}
              onChange={() => setOutcome(one)}
            >
              {outcomeLabels[one]}
            </Check>
          ))}
        </FieldGroup>
      )}
      <FieldGroup
        legend="Send a private link by e-mail"
        id="send-to"
        hint="The letter itself never goes by e-mail. The link works for 30 days."
      >
        <Check
          checked={toRecipient}
          disabled={letter.recipient.email === null}
          onChange={(event) => setToRecipient(event.target.checked)}
        >
          To {letter.recipient.name}: {letter.recipient.email ?? "no e-mail address, print and post instead"}
        </Check>
        <Check
          checked={toPatient}
          disabled={letter.patient.email === null}
          onChange={(event) => setToPatient(event.target.checked)}
        >
          A copy to {letter.patient.name}: {letter.patient.email ?? "no e-mail address"}
        </Check>
      </FieldGroup>
    </Dialog>
  );
}

function said(before: LetterView, after: LetterView, wished: number): string {
  const sent = after.deliveries.length - before.deliveries.length;
  const ended =
    before.episode.state === "open" && after.episode.state === "discharged" ? ", episode discharged" : "";
  if (sent < wished)
    return `Letter about ${after.patient.name} signed${ended}, but not sent to everyone: see the page`;
  return `Letter about ${after.patient.name} signed${sent > 0 ? " and on its way" : ""}${ended}`;
}
