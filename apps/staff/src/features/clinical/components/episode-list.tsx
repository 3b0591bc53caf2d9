"use client";
import { episodeStateLabels } from "@withy/clinical/episodes/states";
import type { EpisodeSummary } from "@withy/contracts/clinical";
import { ButtonLink } from "@withy/ui/button";
import { EmptyState } from "@withy/ui/empty-state";
import { Line } from "@withy/ui/line";
import { PageBody } from "@withy/ui/page";
import Link from "next/link";
import { shortDay } from "../site-time";
import { RecordTitle } from "./record-title";

export interface EpisodeListProps {
  patientId: string;
  episodes: readonly EpisodeSummary[];
  canWrite: boolean;
}

function noteWords({ notes, unsignedNotes }: EpisodeSummary): string {
  if (notes === 0) return "no note yet";
  const count = notes === 1 ? "1 note" : `${notes} notes`;
  return unsignedNotes === 0 ? `${count}, all signed` : `${count}, ${unsignedNotes} to sign`;
}

function countWords(episodes: readonly EpisodeSummary[]): string {
  const open = episodes.filter((episode) => episode.state === "open").length;
  return episodes.length === 0 ? "none yet" : `${open} open, ${episodes.length - open} discharged`;
}

/** A patient's courses of care, open ones first. */
export function EpisodeList({ patientId, episodes, canWrite }: EpisodeListProps) {
  const openNew = canWrite && (
    <ButtonLink as={Link} kind="primary" href={`/patients/${patientId}/episodes/new`}>
      Open an episode
    </ButtonLink>
  );
  return (
    <>
      <RecordTitle
        title="Episodes of care"
        aside={countWords(episodes)}
        action={episodes.length > 0 && openNew}
      />
      {episodes.map((episode) => (
        <Line
          key={episode.id}
          gutter={<time dateTime={episode.openedOn}>{shortDay(episode.openedOn)}</time>}
          tick
        >
          <div className="visit">
            <span className="visit-who">
              <Link href={`/patients/${patientId}/episodes/${episode.id}`}>
                {episode.place}: {episode.problem}
              </Link>
              <span className="soft small">
                {episode.therapistName}, {episode.siteName}
              </span>
            </span>
            <b>{episodeStateLabels[episode.state]}</b>
            <span className="how-far num" data-due={episode.unsignedNotes > 0 ? "" : undefined}>
              {noteWords(episode)}
            </span>
          </div>
        </Line>
      ))}
      {episodes.length === 0 && (
        <PageBody>
          <EmptyState title="No episode of care yet" action={openNew}>
            Open one for the problem the patient came with. Notes, measures and the programme belong to it.
          </EmptyState>
        </PageBody>
      )}
    </>
  );
}
