export interface FramePoint {
  readonly day: string;
  readonly value: number;
}

export interface ChartFrame {
  readonly points: readonly {
    readonly x: number;
    readonly y: number;
    readonly value: number;
    readonly day: string;
  }[];
  readonly ticks: readonly { readonly y: number; readonly value: number }[];
  /** The error band round the first value; null where no error is published. */
  readonly band: { readonly top: number; readonly height: number } | null;
  readonly firstY: number;
}

export interface FrameLimits {
  readonly min: number;
  readonly max: number | null;
  readonly error: number | null;
}

export const frame = { left: 34, right: 300, top: 12, bottom: 92, width: 356, height: 112 } as const;

const steps = [0.1, 0.2, 0.5, 1, 2, 5, 10, 20, 25, 50, 100];

function niceStep(span: number): number {
  return steps.find((step) => span / step <= 4.2) ?? 200;
}

/** Lowest and highest value in sight: all points and the band, with some air, inside what the scale allows. */
function domainOf(values: readonly number[], { min, max, error }: FrameLimits): [number, number] {
  const first = values[0] ?? min;
  const around = error === null ? values : [...values, first - error, first + error];
  const low = Math.min(...around);
  const high = Math.max(...around);
  const air = Math.max((high - low) * 0.15, niceStep(Math.max(high - low, 1)) / 2);
  const from = Math.max(min, low - air);
  const to = max === null ? high + air : Math.min(max, high + air);
  return to > from ? [from, to] : [from, from + 1];
}

function xOf(points: readonly FramePoint[]): (day: string, i: number) => number {
  const times = points.map((p) => Date.parse(p.day));
  const first = times[0] ?? 0;
  const span = (times.at(-1) ?? 0) - first;
  const width = frame.right - frame.left;
  if (points.length < 2) return () => frame.left;
  // Several on one day stand side by side rather than on top of each other.
  if (span === 0) return (_day, i) => frame.left + (width * i) / (points.length - 1);
  return (day) => frame.left + (width * (Date.parse(day) - first)) / span;
}

/** Places a series on paper: days along the foot, values up the side. Sizes are in the drawing's own units. */
export function frameOf(points: readonly FramePoint[], limits: FrameLimits): ChartFrame {
  const values = points.map((p) => p.value);
  const [from, to] = domainOf(values, limits);
  const height = frame.bottom - frame.top;
  const yOf = (value: number): number => frame.bottom - ((value - from) / (to - from)) * height;
  const step = niceStep(to - from);
  const ticks: { y: number; value: number }[] = [];
  for (let v = Math.ceil(from / step) * step; v <= to + 1e-9; v += step) ticks.push({ y: yOf(v), value: v });
  const first = values[0] ?? from;
  const x = xOf(points);
  const clamp = (y: number): number => Math.min(Math.max(y, frame.top), frame.bottom);
  const top = clamp(yOf(first + (limits.error ?? 0)));
  return {
    points: points.map((p, i) => ({ x: x(p.day, i), y: yOf(p.value), value: p.value, day: p.day })),
    ticks,
    band: limits.error === null ? null : { top, height: clamp(yOf(first - limits.error)) - top },
    firstY: yOf(first),
  };
}
