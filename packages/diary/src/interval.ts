/** A stretch of time from `from` up to, and without, `to`: both in milliseconds since the epoch. */
export interface Interval {
  readonly from: number;
  readonly to: number;
}

const minuteMs = 60_000;

export const interval = (from: Date, to: Date): Interval => ({ from: from.getTime(), to: to.getTime() });
export const minutesOf = (i: Interval): number => (i.to - i.from) / minuteMs;
export const overlaps = (a: Interval, b: Interval): boolean => a.from < b.to && b.from < a.to;
export const contains = (outer: Interval, inner: Interval): boolean =>
  outer.from <= inner.from && inner.to <= outer.to;

/** Total minutes of a set of disjoint intervals. */
export function totalMinutes(set: readonly Interval[]): number {
  return set.reduce((sum, i) => sum + minutesOf(i), 0);
}

/**
 * The union as sorted, disjoint intervals that do not even touch; empty ones vanish. This is the normal form that
 * the other functions take and give.
 */
export function union(intervals: readonly Interval[]): Interval[] {
  const sorted = intervals.filter((i) => i.to > i.from).sort((a, b) => a.from - b.from);
  const out: { from: number; to: number }[] = [];
  for (const i of sorted) {
    const last = out.at(-1);
    if (last !== undefined && i.from <= last.to) last.to = Math.max(last.to, i.to);
    else out.push({ from: i.from, to: i.to });
  }
  return out;
}

/** What two normal sets share. */
export function intersect(a: readonly Interval[], b: readonly Interval[]): Interval[] {
  const out: Interval[] = [];
  let i = 0;
  let j = 0;
  for (let x = a[i], y = b[j]; x !== undefined && y !== undefined; x = a[i], y = b[j]) {
    const from = Math.max(x.from, y.from);
    const to = Math.min(x.to, y.to);
    if (from < to) out.push({ from, to });
    if (x.to < y.to) i += 1;
    else j += 1;
  }
  return out;
}

/** What is in the normal set `a` and not in the normal set `b`. */
export function subtract(a: readonly Interval[], b: readonly Interval[]): Interval[] {
  const out: Interval[] = [];
  let j = 0;
  for (const whole of a) {
    let from = whole.from;
    while (j > 0 && (b[j - 1]?.to ?? 0) > from) j -= 1;
    for (let cut = b[j]; cut !== undefined && cut.from < whole.to; j += 1, cut = b[j]) {
      if (cut.to <= from) continue;
      if (cut.from > from) out.push({ from, to: cut.from });
      from = Math.max(from, cut.to);
      if (from >= whole.to) break;
    }
    if (from < whole.to) out.push({ from, to: whole.to });
  }
  return out;
}

/** Those of at least so many minutes. */
export function atLeast(set: readonly Interval[], minutes: number): Interval[] {
  return set.filter((i) => i.to - i.from >= minutes * minuteMs);
}
