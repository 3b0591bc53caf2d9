"use client";
import "../programmes.css";
import type { ProgrammesOfPatient } from "@withy/contracts/programmes";
import { clockDuration, plainDateWords } from "@withy/core/date-words";
import { dayOf } from "@withy/core/wall-clock";
import { AlertLine } from "@withy/ui/alert-line";
import { Button } from "@withy/ui/button";
import { EmptyState } from "@withy/ui/empty-state";
import { Line } from "@withy/ui/line";
import Link from "next/link";
import { useRouter } from "next/navigation";
import { useCreateProgramme } from "../hooks/use-create-programme";

/** The programmes of one patient, the one worked on last first, and the way to start another. */
export function ProgrammeList({ view, zone }: { view: ProgrammesOfPatient; zone: string }) {
  const router = useRouter();
  const create = useCreateProgramme(view.patient.id);
  const open = (programmeId: string) => router.push(`/exercises/programmes/${programmeId}`);
  const start = (episodeId: string) =>
    create.mutate(
      { episodeId, ...(view.programmes[0] ? { copyOf: view.programmes[0].id } : {}) },
      { onSuccess: (made) => open(made.id) },
    );
  const startEmpty = (episodeId: string) =>
    create.mutate({ episodeId }, { onSuccess: (made) => open(made.id) });
  const day = (at: string) => plainDateWords(dayOf(new Date(at), zone));
  const last = view.programmes[0];
  return (
    <div className="programme-list">
      {create.error && (
        <AlertLine tone="danger" live>
          {create.error.message}
        </AlertLine>
      )}
      {view.programmes.map((line) => (
        <Line key={line.id} gutter={day(line.updatedAt)} note>
          <span className="programme-row">
            <Link href={`/exercises/programmes/${line.id}`}>{line.title}</Link>
            <span className="side-badge small-badge">{line.place}</span>
            <span className="num">
              {line.exercises} {line.exercises === 1 ? "line" : "lines"}, {clockDuration(line.sessionSeconds)}
              , {line.sessionsPerWeek} a week
            </span>
            <span className="soft">
              {line.lastIssuedAt ? `given out ${day(line.lastIssuedAt)}` : "not given out yet"}
            </span>
          </span>
        </Line>
      ))}
      <div className="programme-starts">
        {view.programmes.length === 0 && (
          <EmptyState title="No exercises yet.">
            {view.openEpisodes.length === 0
              ? "Exercises belong to an episode of care. Open one on the patient's page first."
              : "Start a programme, add exercises, and watch the time add up."}
          </EmptyState>
        )}
        {view.openEpisodes.map((episode) => (
          <div className="btns" key={episode.id}>
            <Button kind="primary" busy={create.isPending} onClick={() => startEmpty(episode.id)}>
              Start a programme for {episode.place.toLowerCase()}
            </Button>
            {last && (
              <Button busy={create.isPending} onClick={() => start(episode.id)}>
                Start from {last.title}
              </Button>
            )}
          </div>
        ))}
      </div>
    </div>
  );
}
