"use client";
import { readRedFlags } from "@withy/clinical/findings/red-flags";
import { noteKindLabels } from "@withy/clinical/notes/headings";
import { noteStateLabels } from "@withy/clinical/notes/states";
import type { EpisodeView, MeasureSeriesView } from "@withy/contracts/clinical";
import { EmptyState } from "@withy/ui/empty-state";
import { Line } from "@withy/ui/line";
import { PageBody } from "@withy/ui/page";
import { SectionHead } from "@withy/ui/section-head";
import dynamic from "next/dynamic";
import Link from "next/link";
import { useState } from "react";
import { useEpisode } from "../hooks/use-episode";
import { useMeasures } from "../hooks/use-measures";
import { isoDayAt, shortDay } from "../site-time";
import { EndEpisode } from "./end-episode";
import { EpisodeFacts } from "./episode-facts";
import { GoalsForm } from "./goals-form";
import { MeasurePanel } from "./measure-panel";
import { RecordTitle } from "./record-title";

const RedFlagsDialog = dynamic(() => import("./red-flags-dialog").then((m) => m.RedFlagsDialog));

export interface EpisodePageProps {
  episode: EpisodeView;
  measures: MeasureSeriesView[];
  canWrite: boolean;
}

function Notes({ episode }: { episode: EpisodeView }) {
  return (
    <section aria-labelledby="notes-head">
      <PageBody className="section-line">
        <SectionHead
          id="notes-head"
          title="Notes"
          aside={episode.notes === 0 ? "none yet" : `${episode.notes}, latest first`}
        />
      </PageBody>
      {[...episode.noteLines].reverse().map((note) => (
        <Line
          key={note.id}
          gutter={<time dateTime={note.visitAt}>{shortDay(isoDayAt(note.visitAt, episode.zone))}</time>}
          tick
        >
          <div className="visit">
            <span className="visit-who">
              <Link href={`/notes/${note.id}`}>
                {noteKindLabels[note.kind]}, visit {note.visitNumber}
              </Link>
              <span className="soft small">{note.authorName}</span>
            </span>
            <span className="how-far" data-due={note.state === "draft" ? "" : undefined}>
              {note.state === "draft" ? "To sign" : noteStateLabels.signed}
              {note.addenda > 0 && `, ${note.addenda === 1 ? "1 addendum" : `${note.addenda} addenda`}`}
            </span>
          </div>
        </Line>
      ))}
      {episode.notes === 0 && (
        <PageBody>
          <EmptyState title="No note yet">Begin one from the visit, under Notes to sign.</EmptyState>
        </PageBody>
      )}
    </section>
  );
}

function standing(episode: EpisodeView): string {
  const since =
    episode.dischargedOn === null
      ? `open since ${shortDay(episode.openedOn)}`
      : `discharged ${shortDay(episode.dischargedOn)}`;
  return `${since}, ${episode.therapistName}, ${episode.siteName}`;
}

/** One course of care: its notes down the page; goals, flags, measures and its end beside them. */
export function EpisodePage({ episode: first, measures: firstMeasures, canWrite }: EpisodePageProps) {
  const episode = useEpisode(first).data;
  const measures = useMeasures(episode.id, firstMeasures).data;
  const [isAskingFlags, setIsAskingFlags] = useState(false);
  const [isRecording, setIsRecording] = useState(false);
  const isOpen = episode.state === "open";
  const flags = readRedFlags(episode.region, episode.redFlags);
  return (
    <div className="episode-page">
      <RecordTitle
        title={
          <>
            <span className="side">{episode.place}</span> {episode.problem}
          </>
        }
        aside={standing(episode)}
        action={canWrite && <EndEpisode episode={episode} />}
      />
      <div className="episode-columns">
        <Notes episode={episode} />
        <aside className="episode-side" aria-label="About the episode">
          <GoalsForm key={episode.version} episode={episode} canWrite={canWrite && isOpen} />
          <section>
            <SectionHead
              title="Red flags"
              action={
                canWrite &&
                isOpen && (
                  <button type="button" className="linklike" onClick={() => setIsAskingFlags(true)}>
                    ask
                  </button>
                )
              }
            />
            <p>{flags.words}.</p>
            {flags.present.map((flag) => (
              <p key={flag.question} className={flag.isEmergency ? "danger" : "warn"}>
                <b>{flag.question}.</b> {flag.action}
              </p>
            ))}
          </section>
          <MeasurePanel
            episodeId={episode.id}
            noteId={null}
            measures={measures}
            canRecord={canWrite && isOpen}
            isRecording={isRecording}
            onRecording={setIsRecording}
          />
          <EpisodeFacts episode={episode} />
        </aside>
      </div>
      {isAskingFlags && (
        <RedFlagsDialog episode={episode} onSaved={() => undefined} onClose={() => setIsAskingFlags(false)} />
      )}
    </div>
  );
}
