import type { ScaleSeriesView } from "@withy/contracts/clinical";
import { shortDay } from "../site-time";

function sinceFirst(scale: ScaleSeriesView): string {
  const first = scale.points.find((point) => point.value !== null);
  return first ? `Since ${shortDay(first.takenOn)}` : "";
}

/** What the latest value and its change mean, in words, with the figures' sources one press away. */
export function MeasureWords({ scale, credit }: { scale: ScaleSeriesView; credit: string }) {
  const latest = scale.points.at(-1);
  const isUnscored = latest !== undefined && latest.value === null;
  return (
    <div className="says">
      {isUnscored && <p>{latest.shown}</p>}
      {scale.change && (
        <p>
          {sinceFirst(scale)}: <b>{scale.change.words}</b>
          {scale.importance !== null && ` ${scale.importance}`}
          {scale.errorAmount === null && " No measurement error is published for this scale."}
        </p>
      )}
      {scale.lastStep?.kind === "compared" && <p>Since last time: {scale.lastStep.words}</p>}
      {scale.reading !== null && <p>{scale.reading}</p>}
      <details>
        <summary>source</summary>
        <p className="small soft">
          {credit}.{scale.errorSource !== null && ` Error: ${scale.errorSource}.`}
        </p>
      </details>
    </div>
  );
}
