import type { MeasureSeriesView, ScaleSeriesView } from "@withy/contracts/clinical";
import type { MeasureFact } from "@withy/documents/letter/discharge-facts";
import { loadPatientForCare } from "../clinical/clinical-patient";
import { listMeasureRows, seriesViews } from "../clinical/measure-series";
import type { Context } from "../context";

function scaleWords(scale: ScaleSeriesView): string {
  if (scale.unit !== "points") return scale.unit;
  return scale.max === null ? "" : `out of ${scale.max}`;
}

/** "Pain 0 to 10"; with the scale's own name where a measure has several. */
function nameOf(measure: MeasureSeriesView, scale: ScaleSeriesView): string {
  return measure.scales.length === 1 ? measure.label : `${measure.shortLabel}, ${scale.label.toLowerCase()}`;
}

function factOf(measure: MeasureSeriesView, scale: ScaleSeriesView): MeasureFact | null {
  const scored = scale.points.filter((point) => point.value !== null);
  const [first] = scored;
  const last = scored.at(-1);
  if (!first || !last) return null;
  const change = [scale.change?.words, scale.importance].filter((words) => words).join(" ");
  return {
    key: measure.scales.length === 1 ? measure.measureKey : `${measure.measureKey}-${scale.scaleKey}`,
    name: nameOf(measure, scale),
    shortName:
      measure.scales.length === 1 ? measure.shortLabel : `${measure.shortLabel} ${scale.label.toLowerCase()}`,
    scale: scaleWords(scale),
    first: { score: first.shown, on: first.takenOn },
    last: { recordId: last.recordId, score: last.shown, on: last.takenOn },
    timesTaken: scored.length,
    change: change === "" ? null : change,
    standing: scale.reading,
  };
}

/** Each outcome measure of the episode, first against last, with what the change means by the published rules. */
export async function measureFacts(
  ctx: Context,
  episode: { id: string; patientId: string },
  today: string,
): Promise<MeasureFact[]> {
  const { view, sex } = await loadPatientForCare(ctx, episode.patientId, today);
  const rows = await listMeasureRows(ctx, episode.id);
  return seriesViews(rows, { age: view.age, sex }).flatMap((measure) =>
    measure.scales.flatMap((scale) => factOf(measure, scale) ?? []),
  );
}
