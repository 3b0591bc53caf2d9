"use client";
import type { EpisodeSummary, MeasureSeriesView } from "@withy/contracts/clinical";
import { ButtonLink } from "@withy/ui/button";
import { ChoiceLinks } from "@withy/ui/choice";
import { EmptyState } from "@withy/ui/empty-state";
import { PageBody } from "@withy/ui/page";
import { SectionHead } from "@withy/ui/section-head";
import Link from "next/link";
import { useMeasures } from "../hooks/use-measures";
import { shortDay } from "../site-time";
import { MeasureChart } from "./measure-chart";
import { MeasureWords } from "./measure-words";
import { RecordMeasure } from "./record-measure";
import { RecordTitle } from "./record-title";

export interface MeasuresPageProps {
  patientId: string;
  episodes: readonly EpisodeSummary[];
  episode: EpisodeSummary | null;
  measures: MeasureSeriesView[];
  canWrite: boolean;
}

/** Every measure of an episode over time, each scale with its chart and its words. */
export function MeasuresPage({ patientId, episodes, episode, measures, canWrite }: MeasuresPageProps) {
  return (
    <>
      <RecordTitle
        title="Measures"
        aside={episode === null ? undefined : `${episode.place}, ${episode.problem}`}
        action={
          episodes.length > 1 && (
            <ChoiceLinks
              label="Episode"
              as={Link}
              items={episodes.map((one) => ({
                href: `/patients/${patientId}/measures?episode=${one.id}`,
                label: `${one.place}, ${shortDay(one.openedOn)}`,
                current: one.id === episode?.id,
              }))}
            />
          )
        }
      />
      {episode === null ? (
        <PageBody>
          <EmptyState
            title="Nothing measured yet"
            action={
              <ButtonLink as={Link} href={`/patients/${patientId}/episodes/new`}>
                Open an episode
              </ButtonLink>
            }
          >
            Measures belong to an episode of care.
          </EmptyState>
        </PageBody>
      ) : (
        <EpisodeMeasures episodeId={episode.id} first={measures} canWrite={canWrite} />
      )}
    </>
  );
}

function EpisodeMeasures({
  episodeId,
  first,
  canWrite,
}: {
  episodeId: string;
  first: MeasureSeriesView[];
  canWrite: boolean;
}) {
  const measures = useMeasures(episodeId, first).data;
  return (
    <div className="episode-columns">
      <PageBody className="courses">
        {measures.length === 0 && (
          <EmptyState title="Nothing measured in this episode yet">Record the first one beside.</EmptyState>
        )}
        {measures.flatMap((series) =>
          series.scales.map((scale) => (
            <section key={`${series.measureKey} ${scale.scaleKey}`}>
              <SectionHead
                title={
                  series.scales.length > 1
                    ? `${series.shortLabel}, ${scale.label.toLowerCase()}`
                    : series.label
                }
                aside={scale.better === "higher" ? "higher is better" : "lower is better"}
              />
              <MeasureChart scale={scale} title={`${series.shortLabel}, ${scale.label}`} />
              <MeasureWords scale={scale} credit={series.credit} />
            </section>
          )),
        )}
      </PageBody>
      {canWrite && (
        <aside className="episode-side" aria-label="Record">
          <RecordMeasure episodeId={episodeId} measures={measures} />
        </aside>
      )}
    </div>
  );
}
