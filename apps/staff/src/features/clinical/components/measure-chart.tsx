import type { ScaleSeriesView } from "@withy/contracts/clinical";
import { frame, frameOf } from "../chart-frame";
import { shortDay } from "../site-time";

function judged(scale: ScaleSeriesView): [string, string] | null {
  if (scale.change?.kind !== "compared" || scale.change.isBeyondError === null) return null;
  return scale.change.isBeyondError ? ["beyond", "error"] : ["within", "error"];
}

/** The days along the foot that have room: the first, the last, and those between that do not touch them. */
function shownDays(points: readonly { x: number; day: string }[]): Set<number> {
  const shown = new Set<number>([0, points.length - 1]);
  const last = points.at(-1)?.x ?? 0;
  let from = points[0]?.x ?? 0;
  points.forEach((point, i) => {
    if (point.x - from < 52 || last - point.x < 52) return;
    shown.add(i);
    from = point.x;
  });
  return shown;
}

/** One scale over time, with the band inside which a change may be error. The same is said in words below it. */
export function MeasureChart({ scale, title }: { scale: ScaleSeriesView; title: string }) {
  const scored = scale.points.flatMap((p) =>
    p.value === null ? [] : [{ day: p.takenOn, value: p.value, shown: p.shown }],
  );
  if (scored.length === 0) return null;
  const drawn = frameOf(scored, { min: scale.min, max: scale.max, error: scale.errorAmount });
  const last = drawn.points.at(-1);
  const days = shownDays(drawn.points);
  const words = judged(scale);
  const label = `${title}: ${scored.map((p) => `${p.shown} on ${shortDay(p.day)}`).join(", ")}`;
  return (
    <svg
      className="measure-chart"
      viewBox={`0 0 ${frame.width} ${frame.height}`}
      role="img"
      aria-label={label}
    >
      {drawn.band && (
        <>
          <rect
            x={frame.left}
            y={drawn.band.top}
            width={frame.right - frame.left}
            height={drawn.band.height}
            fill="var(--band)"
          />
          <path className="start" d={`M${frame.left} ${drawn.firstY}H${frame.right}`} />
        </>
      )}
      {drawn.ticks.map((tick) => (
        <g key={tick.value}>
          <path className="tick-mark" d={`M${frame.left - 4} ${tick.y}h4`} />
          <text x={frame.left - 8} y={tick.y + 4} textAnchor="end">
            {Number(tick.value.toFixed(2))}
          </text>
        </g>
      ))}
      <path className="foot" d={`M${frame.left} ${frame.bottom}H${frame.right}`} />
      <path
        className="course"
        d={drawn.points.map((p, i) => `${i === 0 ? "M" : "L"}${p.x} ${p.y}`).join("")}
      />
      {drawn.points.map((p, i) => (
        <g key={`${p.day} ${p.x}`}>
          <circle
            className={p === last ? "latest" : "earlier"}
            cx={p.x}
            cy={p.y}
            r={p === last ? 4.5 : 3.4}
          />
          {days.has(i) && (
            <text x={p.x} y={107} textAnchor={i === 0 ? "start" : p === last ? "end" : "middle"}>
              {shortDay(p.day)}
            </text>
          )}
        </g>
      ))}
      {last && (
        <text className="big" x={last.x + 9} y={Math.min(last.y + 5, 78)}>
          {scored.at(-1)?.shown}
        </text>
      )}
      {last && words && (
        <text x={last.x + 9} y={Math.min(last.y + 21, 94)}>
          <tspan>{words[0]}</tspan>
          <tspan x={last.x + 9} dy={13}>
            {words[1]}
          </tspan>
        </text>
      )}
    </svg>
  );
}
