"use client";
import { findMeasure, measureCatalogue } from "@withy/clinical/measures/catalogue";
import type { MeasureSeriesView } from "@withy/contracts/clinical";
import { AlertLine } from "@withy/ui/alert-line";
import { Choice } from "@withy/ui/choice";
import { SectionHead } from "@withy/ui/section-head";
import { Select } from "@withy/ui/select";
import { useState } from "react";
import { MeasureChart } from "./measure-chart";
import { MeasureForm } from "./measure-form";
import { MeasureWords } from "./measure-words";

export interface MeasurePanelProps {
  episodeId: string;
  noteId: string | null;
  measures: readonly MeasureSeriesView[];
  canRecord: boolean;
  isRecording: boolean;
  onRecording: (isRecording: boolean) => void;
}

const directionWords = { higher: "higher is better", lower: "lower is better" } as const;

function rangeWords(scale: MeasureSeriesView["scales"][number]): string {
  const range = scale.max === null ? scale.unit : `${scale.min} to ${scale.max}`;
  return `${range}, ${directionWords[scale.better]}`;
}

function Course({ series }: { series: MeasureSeriesView }) {
  const [chosen, setChosen] = useState(series.scales[0]?.scaleKey ?? "");
  const scale = series.scales.find((s) => s.scaleKey === chosen) ?? series.scales[0];
  if (!scale) return null;
  return (
    <>
      {series.scales.length > 1 && (
        <Choice
          label="Scale"
          options={series.scales.map((s) => ({ value: s.scaleKey, label: s.label }))}
          value={scale.scaleKey}
          onChange={setChosen}
        />
      )}
      <p className="small soft">{rangeWords(scale)}</p>
      <MeasureChart scale={scale} title={`${series.shortLabel}, ${scale.label}`} />
      <MeasureWords scale={scale} credit={series.credit} />
    </>
  );
}

/** One measure at a time beside the note: its course, what the change means, and the form to fill in. */
export function MeasurePanel(props: MeasurePanelProps) {
  const { episodeId, noteId, measures, canRecord, isRecording, onRecording } = props;
  const [key, setKey] = useState(measures[0]?.measureKey ?? "pain-rating");
  const [alarm, setAlarm] = useState<string | null>(null);
  const series = measures.find((m) => m.measureKey === key);
  const measure = findMeasure(key);
  const choose = (next: string) => {
    setKey(next);
    setAlarm(null);
  };
  return (
    <section className="measure-panel" aria-label="Measures">
      <SectionHead
        title="Measures"
        aside={series ? series.label : undefined}
        action={
          canRecord &&
          !isRecording && (
            <button type="button" className="linklike" onClick={() => onRecording(true)}>
              record
            </button>
          )
        }
      />
      <Select
        id="measure-choice"
        label="Measure"
        value={key}
        onChange={(event) => choose(event.target.value)}
        options={measureCatalogue.map((m) => ({ value: m.key, label: m.label }))}
      />
      {alarm !== null && (
        <AlertLine tone="danger" live>
          {alarm}
        </AlertLine>
      )}
      {isRecording && measure ? (
        <MeasureForm
          key={key}
          measure={measure}
          episodeId={episodeId}
          noteId={noteId}
          lastActivities={series?.lastActivities ?? []}
          onClose={() => onRecording(false)}
          onRecorded={(recorded) => {
            setAlarm(recorded.alarm);
            onRecording(false);
          }}
        />
      ) : series ? (
        <Course key={key} series={series} />
      ) : (
        <p className="soft">Not recorded in this episode yet.</p>
      )}
    </section>
  );
}
