"use client";
import { findMeasure, measureCatalogue } from "@withy/clinical/measures/catalogue";
import type { MeasureSeriesView } from "@withy/contracts/clinical";
import { AlertLine } from "@withy/ui/alert-line";
import { SectionHead } from "@withy/ui/section-head";
import { Select } from "@withy/ui/select";
import { useState } from "react";
import { MeasureForm } from "./measure-form";

export interface RecordMeasureProps {
  episodeId: string;
  measures: readonly MeasureSeriesView[];
}

/** Any measure of the catalogue, filled in one after the other. */
export function RecordMeasure({ episodeId, measures }: RecordMeasureProps) {
  const [key, setKey] = useState(measures[0]?.measureKey ?? "pain-rating");
  const [filled, setFilled] = useState({ times: 0, alarm: null as string | null });
  const measure = findMeasure(key);
  const again = (alarm: string | null) => setFilled(({ times }) => ({ times: times + 1, alarm }));
  return (
    <section className="measure-panel" aria-label="Record a measure">
      <SectionHead title="Record a measure" />
      <Select
        id="measure-choice"
        label="Measure"
        value={key}
        onChange={(event) => setKey(event.target.value)}
        options={measureCatalogue.map((m) => ({ value: m.key, label: m.label }))}
      />
      {filled.alarm !== null && (
        <AlertLine tone="danger" live>
          {filled.alarm}
        </AlertLine>
      )}
      {measure && (
        <MeasureForm
          key={`${key} ${filled.times}`}
          measure={measure}
          episodeId={episodeId}
          noteId={null}
          lastActivities={measures.find((m) => m.measureKey === key)?.lastActivities ?? []}
          onRecorded={({ alarm }) => again(alarm)}
          onClose={() => again(null)}
        />
      )}
    </section>
  );
}
