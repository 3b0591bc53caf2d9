"use client";
import { AlertLine } from "@withy/ui/alert-line";
import { Button, ButtonLink } from "@withy/ui/button";
import { Check } from "@withy/ui/check";
import { Dialog } from "@withy/ui/dialog";
import { FieldGroup } from "@withy/ui/field-group";
import { Skeleton } from "@withy/ui/skeleton";
import Link from "next/link";
import { useEffect, useRef, useState } from "react";
import { ApiError } from "@/api/request";
import { useEpisodes } from "../hooks/use-episodes";
import { useStartNote } from "../hooks/use-start-note";

export interface StartNoteProps {
  appointmentId: string;
  patientId: string;
  onClose: () => void;
}

/** Begins the note at once where the visit's episode is known; else asks which episode it belongs to. */
export function StartNote({ appointmentId, patientId, onClose }: StartNoteProps) {
  const start = useStartNote();
  const begun = useRef(false);
  const { mutate } = start;
  useEffect(() => {
    if (begun.current) return;
    begun.current = true;
    mutate({ appointmentId });
  }, [mutate, appointmentId]);
  if (!start.error) return null;
  const isChoosing = start.error instanceof ApiError && start.error.problem.kind === "episode-needed";
  return isChoosing || start.variables?.episodeId ? (
    <ChooseEpisode appointmentId={appointmentId} patientId={patientId} start={start} onClose={onClose} />
  ) : (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title="The note cannot be started"
      closeLabel="Go back"
    >
      <AlertLine live>{start.error.message}</AlertLine>
    </Dialog>
  );
}

function ChooseEpisode({
  appointmentId,
  patientId,
  start,
  onClose,
}: StartNoteProps & { start: ReturnType<typeof useStartNote> }) {
  const episodes = useEpisodes(patientId);
  const open = (episodes.data ?? []).filter((episode) => episode.state === "open");
  const [chosen, setChosen] = useState<string | null>(null);
  const episodeId = chosen ?? (open.length === 1 ? open[0]?.id : undefined);
  const isRefused = start.error instanceof ApiError && start.error.problem.kind !== "episode-needed";
  const openNew = `/patients/${patientId}/episodes/new?visit=${appointmentId}`;
  return (
    <Dialog
      open
      onOpenChange={(isOpen) => !isOpen && onClose()}
      title="Which episode is this visit for?"
      lead="A note belongs to one course of care for one problem."
      actions={
        <>
          {episodeId !== undefined && (
            <Button
              kind="primary"
              busy={start.isPending}
              onClick={() => start.mutate({ appointmentId, episodeId })}
            >
              Write the note
            </Button>
          )}
          <ButtonLink as={Link} href={openNew} kind={open.length === 0 ? "primary" : "quiet"}>
            Open a new episode
          </ButtonLink>
        </>
      }
    >
      {isRefused && <AlertLine live>{start.error?.message}</AlertLine>}
      {episodes.isPending && <Skeleton lines={2} label="Loading the episodes" />}
      {episodes.error && <AlertLine>{episodes.error.message}</AlertLine>}
      {episodes.data && open.length === 0 && (
        <p>This patient has no open episode. Open one for the problem they came with.</p>
      )}
      {open.length > 0 && (
        <FieldGroup legend="Open episodes" id="episode">
          {open.map((episode) => (
            <Check
              key={episode.id}
              type="radio"
              name="episode"
              checked={episode.id === episodeId}
              onChange={() => setChosen(episode.id)}
            >
              <b>{episode.place}</b>, {episode.problem}
            </Check>
          ))}
        </FieldGroup>
      )}
    </Dialog>
  );
}
