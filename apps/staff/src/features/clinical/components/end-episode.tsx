"use client";
import type { EpisodeView } from "@withy/contracts/clinical";
import { Button, ButtonLink, Buttons } from "@withy/ui/button";
import dynamic from "next/dynamic";
import Link from "next/link";
import { useState } from "react";
import { reopenEpisode } from "../api-client";
import { useEpisodeWrite } from "../hooks/use-episode";

const DischargeDialog = dynamic(() => import("./discharge-dialog").then((m) => m.DischargeDialog));

/** Ends the episode, or opens it again. A discharge letter is written first, from the record as it stands. */
export function EndEpisode({ episode }: { episode: EpisodeView }) {
  const [isEnding, setIsEnding] = useState(false);
  const reopen = useEpisodeWrite(reopenEpisode);
  if (episode.state === "discharged") {
    return (
      <Button
        busy={reopen.isPending}
        onClick={() => reopen.mutate({ episodeId: episode.id, version: episode.version })}
      >
        Open it again
      </Button>
    );
  }
  return (
    <Buttons>
      <ButtonLink as={Link} href={`/patients/${episode.patient.id}/letters?episode=${episode.id}`}>
        Discharge letter
      </ButtonLink>
      <Button onClick={() => setIsEnding(true)}>Discharge…</Button>
      {isEnding && <DischargeDialog episode={episode} onClose={() => setIsEnding(false)} />}
    </Buttons>
  );
}
