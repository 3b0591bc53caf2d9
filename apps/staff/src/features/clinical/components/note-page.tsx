"use client";
import { noteKindLabels } from "@withy/clinical/notes/headings";
import type { DayList, MeasureSeriesView, NoteView } from "@withy/contracts/clinical";
import { Page } from "@withy/ui/page";
import { useDayList } from "../hooks/use-day-list";
import { useMeasures } from "../hooks/use-measures";
import { useNote } from "../hooks/use-note";
import { clockAt, isoDayAt } from "../site-time";
import { DayStrip } from "./day-strip";
import { PatientHead } from "./note-head";
import type { NoteParts } from "./note-parts";
import { ReadNote } from "./read-note";
import { WriteNote } from "./write-note";

export interface NotePageProps {
  note: NoteView;
  measures: MeasureSeriesView[];
  day: DayList;
}

/** The note of one visit: written while it is a draft of one's own, else read. */
export function NotePage({ note: first, measures: firstMeasures, day: firstDay }: NotePageProps) {
  const note = useNote(first);
  const measures = useMeasures(note.episode.id, firstMeasures).data;
  const day = useDayList(firstDay).data;
  const until = note.visitEndsAt === null ? "" : ` to ${clockAt(note.visitEndsAt, note.zone)}`;
  const parts: NoteParts = {
    note,
    measures,
    day,
    visitDay: isoDayAt(note.visitAt, note.zone),
    visitWords: `visit ${note.visitNumber}, ${clockAt(note.visitAt, note.zone)}${until}, ${note.siteName}`,
  };
  return (
    <Page fit className="note-page">
      <PatientHead
        patient={note.patient}
        place={note.episode.place}
        about={`${note.episode.problem}. ${noteKindLabels[note.kind]}, visit ${note.visitNumber}`}
      />
      <DayStrip list={day} openNoteId={note.id} />
      {note.canWrite ? <WriteNote {...parts} /> : <ReadNote {...parts} />}
    </Page>
  );
}
