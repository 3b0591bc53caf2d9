"use client";
import { checkDischarge, type Outcome, outcomeLabels, outcomes } from "@withy/clinical/episodes/states";
import type { EpisodeView } from "@withy/contracts/clinical";
import { AlertLine } from "@withy/ui/alert-line";
import { Button } from "@withy/ui/button";
import { Check } from "@withy/ui/check";
import { Dialog } from "@withy/ui/dialog";
import { ErrorSummary, type FieldError } from "@withy/ui/error-summary";
import { FieldGroup } from "@withy/ui/field-group";
import { useChanges } from "@withy/ui/recent-changes";
import { useState } from "react";
import { problemItems } from "@/api/form-problems";
import { dischargeEpisode } from "../api-client";
import { useEpisodeWrite } from "../hooks/use-episode";
import { clockAt } from "../site-time";

/** Ends the episode with its outcome; says what stands in the way where something does. */
export function DischargeDialog({ episode, onClose }: { episode: EpisodeView; onClose: () => void }) {
  const discharge = useEpisodeWrite(dischargeEpisode);
  const { announce } = useChanges();
  const [outcome, setOutcome] = useState<Outcome | null>(null);
  const [missing, setMissing] = useState(false);
  const refusal = checkDischarge({
    state: episode.state,
    unsignedNotes: episode.unsignedNotes,
    signedNotes: episode.notes - episode.unsignedNotes,
  });
  const errors: FieldError[] = missing
    ? [{ id: "outcome", message: "Choose how the episode ended." }]
    : discharge.error
      ? problemItems(discharge.error)
      : [];
  const submit = () => {
    setMissing(outcome === null);
    if (outcome === null) return;
    discharge.mutate(
      { episodeId: episode.id, version: episode.version, outcome },
      {
        onSuccess: () => {
          announce({
            at: clockAt(new Date(), episode.zone),
            said: `${episode.patient.name} discharged, ${episode.place.toLowerCase()}`,
          });
          onClose();
        },
      },
    );
  };
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={`Discharge ${episode.patient.name}`}
      lead={`${episode.place}, ${episode.problem}. It can be opened again.`}
      closeLabel="Keep it open"
      actions={
        !refusal && (
          <Button kind="primary" busy={discharge.isPending} onClick={submit}>
            Discharge
          </Button>
        )
      }
    >
      {refusal ? (
        <AlertLine live>{refusal.message}</AlertLine>
      ) : (
        <>
          <ErrorSummary errors={errors} attempt={discharge.submittedAt} />
          <FieldGroup
            legend="How did it end?"
            id="outcome"
            error={errors.find((e) => e.id === "outcome")?.message}
          >
            {outcomes.map((one, i) => (
              <Check
                key={one}
                type="radio"
                name="outcome"
                id={i === 0 ? "outcome" : undefined}
                checked={outcome === one}
                onChange={() => setOutcome(one)}
              >
                {outcomeLabels[one]}
              </Check>
            ))}
          </FieldGroup>
        </>
      )}
    </Dialog>
  );
}
