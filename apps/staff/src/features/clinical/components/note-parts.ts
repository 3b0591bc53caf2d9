import type { DayList, MeasureSeriesView, NoteView } from "@withy/contracts/clinical";

/** What the writing page and the reading page of a note are both given. */
export interface NoteParts {
  note: NoteView;
  measures: readonly MeasureSeriesView[];
  day: DayList;
  visitDay: string;
  visitWords: string;
}
