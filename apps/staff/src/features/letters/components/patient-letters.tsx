"use client";
import type { LetterRow } from "@withy/contracts/letters";
import type { Page as PageOf } from "@withy/contracts/page";
import { Button } from "@withy/ui/button";
import { EmptyState } from "@withy/ui/empty-state";
import { Line } from "@withy/ui/line";
import { SectionHead } from "@withy/ui/section-head";
import { useRouter } from "next/navigation";
import { ApiError } from "@/api/request";
import { useDraftLetter } from "../hooks/use-draft-letter";
import { useLetters } from "../hooks/use-letters";
import { LetterLine } from "./letter-line";

interface EpisodeChoice {
  id: string;
  problem: string;
  place: string;
  state: "open" | "discharged";
}

interface PatientLettersProps {
  first: PageOf<LetterRow>;
  patientId: string;
  episodes: readonly EpisodeChoice[];
  /** The episode that the reader came from. */
  wishedEpisode: string | null;
  mayWrite: boolean;
  zone: string;
}

/** The patient's letters, and a way to write the next from each course of care. */
export function PatientLetters({
  first,
  patientId,
  episodes,
  wishedEpisode,
  mayWrite,
  zone,
}: PatientLettersProps) {
  const { rows } = useLetters({ patientId }, first).data;
  const ordered = [...episodes].sort(
    (a, b) => Number(b.id === wishedEpisode) - Number(a.id === wishedEpisode),
  );
  return (
    <>
      {mayWrite && ordered.length > 0 && (
        <section aria-labelledby="write-letter">
          <div className="letter-list-head">
            <SectionHead
              id="write-letter"
              title="Write a discharge letter"
              aside="from the record as it stands"
            />
          </div>
          {ordered.map((episode, index) => (
            <EpisodeLine key={episode.id} episode={episode} isFirst={index === 0} />
          ))}
        </section>
      )}
      <section aria-labelledby="letters-so-far">
        <div className="letter-list-head">
          <SectionHead id="letters-so-far" title="Letters so far" />
          {rows.length === 0 && (
            <EmptyState title="No letters yet">
              {mayWrite && ordered.length === 0
                ? "A discharge letter is written from an episode of care. Open one under Episodes first."
                : "What is written and sent about this patient will stand here."}
            </EmptyState>
          )}
        </div>
        {rows.map((letter) => (
          <LetterLine key={letter.id} letter={letter} zone={zone} hidePatient />
        ))}
      </section>
    </>
  );
}

function EpisodeLine({ episode, isFirst }: { episode: EpisodeChoice; isFirst: boolean }) {
  const router = useRouter();
  const draft = useDraftLetter();
  const write = () =>
    draft.mutate(episode.id, { onSuccess: (letter) => router.push(`/letters/${letter.id}`) });
  return (
    <Line gutter={episode.state === "open" ? "open" : "discharged"} note className="letter-row">
      <span className="grow">
        {episode.place}, {episode.problem}
        {draft.error && (
          <span className="danger" role="alert">
            {" "}
            {draft.error instanceof ApiError
              ? draft.error.problem.detail
              : "The letter could not be started. Try again."}
          </span>
        )}
      </span>
      <Button
        kind={isFirst ? "primary" : "quiet"}
        size="small"
        busy={draft.isPending || draft.isSuccess}
        onClick={write}
      >
        Write the letter<span className="vh"> about {episode.problem}</span>
      </Button>
    </Line>
  );
}
