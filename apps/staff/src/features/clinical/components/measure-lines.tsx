import type { MeasureSeriesView, ScaleSeriesView } from "@withy/contracts/clinical";

interface Row {
  key: string;
  label: string;
  today: string;
  before: string | null;
  remark: string;
}

function rowOf(series: MeasureSeriesView, scale: ScaleSeriesView, day: string): Row | null {
  const at = scale.points.findLastIndex((point) => point.takenOn === day && point.value !== null);
  const point = scale.points[at];
  if (!point) return null;
  const before = scale.points.slice(0, at).findLast((earlier) => earlier.value !== null);
  const change = scale.change?.kind === "compared" ? scale.change : null;
  const judged = change?.isBeyondError == null ? "" : change.isBeyondError ? "beyond error" : "within error";
  return {
    key: `${series.measureKey} ${scale.scaleKey}`,
    label: series.scales.length > 1 ? `${series.shortLabel}, ${scale.label.toLowerCase()}` : series.label,
    today: point.shown,
    before: before?.shown ?? null,
    remark:
      change && change.direction !== "same" ? [change.direction, judged].filter(Boolean).join(", ") : "",
  };
}

/** What was measured on the day of the visit, on the note's own lines. */
export function MeasureLines({ measures, day }: { measures: readonly MeasureSeriesView[]; day: string }) {
  const rows = measures.flatMap((series) =>
    series.scales.flatMap((scale) => rowOf(series, scale, day) ?? []),
  );
  if (rows.length === 0) return null;
  return (
    <table className="measured">
      <caption className="vh">Measured at this visit</caption>
      <thead className="vh">
        <tr>
          <th scope="col">Measure</th>
          <th scope="col">Today</th>
          <th scope="col">Before</th>
          <th scope="col">Change since the first</th>
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <tr key={row.key}>
            <th scope="row">{row.label}</th>
            <td className="n">
              <b>{row.today}</b>
            </td>
            <td className="n soft">{row.before === null ? "first" : `was ${row.before}`}</td>
            <td className="n soft">{row.remark}</td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
