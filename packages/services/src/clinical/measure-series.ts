import { measureCatalogue } from "@withy/clinical/measures/catalogue";
import type { MeasuredPerson } from "@withy/clinical/measures/interpret";
import { findScale, type Measure } from "@withy/clinical/measures/measure";
import { seriesOfMeasure } from "@withy/clinical/measures/series";
import type { MeasureSeriesView } from "@withy/contracts/clinical";
import { measureRecords } from "@withy/db/schema";
import { and, asc, eq, isNull } from "drizzle-orm";
import type { Context } from "../context";
import { entryOf } from "./measure-answers";

export type MeasureRow = typeof measureRecords.$inferSelect;

/** The records of an episode that count (a corrected one counts no more), oldest first. */
export async function listMeasureRows(ctx: Context, episodeId: string): Promise<MeasureRow[]> {
  return ctx.db
    .select()
    .from(measureRecords)
    .where(
      and(
        eq(measureRecords.practiceId, ctx.practiceId),
        eq(measureRecords.episodeId, episodeId),
        isNull(measureRecords.replacedBy),
      ),
    )
    .orderBy(asc(measureRecords.takenOn), asc(measureRecords.enteredAt), asc(measureRecords.id));
}

function activitiesIn(row: MeasureRow | undefined): string[] {
  return row?.answers.labels ?? [];
}

function seriesView(
  measure: Measure,
  rows: readonly MeasureRow[],
  person: MeasuredPerson,
): MeasureSeriesView {
  const records = rows.map((row) => ({
    recordId: row.id,
    takenOn: row.takenOn,
    enteredBy: row.enteredBy,
    entry: entryOf(measure, row.answers),
  }));
  return {
    measureKey: measure.key,
    label: measure.label,
    shortLabel: measure.shortLabel,
    credit: measure.credit,
    scales: seriesOfMeasure(measure, records, person).flatMap((series) => {
      const scale = findScale(measure, series.scaleKey);
      if (!scale) return [];
      const { label, unit, decimals, better, min, max, error } = scale;
      const errorSource =
        error === null ? null : `${error.label}, ${error.population}: ${error.source.citation}`;
      return [{ ...series, label, unit, decimals, better, min, max, errorSource }];
    }),
    lastActivities: activitiesIn(rows.at(-1)),
  };
}

/** The series of each measure that has records, in the catalogue's order. */
export function seriesViews(rows: readonly MeasureRow[], person: MeasuredPerson): MeasureSeriesView[] {
  return measureCatalogue.flatMap((measure) => {
    const own = rows.filter((row) => row.measureKey === measure.key);
    return own.length === 0 ? [] : [seriesView(measure, own, person)];
  });
}
