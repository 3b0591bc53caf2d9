import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  atLeast,
  type Interval,
  intersect,
  minutesOf,
  overlaps,
  subtract,
  totalMinutes,
  union,
} from "./interval";

const span = 240;
const raw = fc.array(
  fc.tuple(fc.integer({ min: 0, max: span }), fc.integer({ min: 0, max: 40 })).map(([from, n]) => ({
    from: from * 60_000,
    to: (from + n) * 60_000,
  })),
  { maxLength: 12 },
);
const has = (set: readonly Interval[], minute: number): boolean =>
  set.some((i) => i.from <= minute * 60_000 && minute * 60_000 < i.to);
const minutes = Array.from({ length: span + 45 }, (_, i) => i);

function isNormal(set: readonly Interval[]): boolean {
  return set.every(
    (i, n) => i.to > i.from && (n === 0 || (set[n - 1]?.to ?? Number.POSITIVE_INFINITY) < i.from),
  );
}

describe("sets of half-open intervals", () => {
  it("unions into sorted intervals that hold the same minutes", () => {
    fc.assert(
      fc.property(raw, (a) => {
        const u = union(a);
        expect(isNormal(u)).toBe(true);
        expect(minutes.filter((m) => has(u, m))).toEqual(minutes.filter((m) => has(a, m)));
      }),
    );
  });

  it("intersects and subtracts minute by minute", () => {
    fc.assert(
      fc.property(raw, raw, (x, y) => {
        const [a, b] = [union(x), union(y)];
        expect(minutes.filter((m) => has(intersect(a, b), m))).toEqual(
          minutes.filter((m) => has(a, m) && has(b, m)),
        );
        expect(minutes.filter((m) => has(subtract(a, b), m))).toEqual(
          minutes.filter((m) => has(a, m) && !has(b, m)),
        );
        expect(isNormal(subtract(a, b))).toBe(true);
        expect(totalMinutes(intersect(a, b)) + totalMinutes(subtract(a, b))).toBe(totalMinutes(a));
      }),
    );
  });

  it("keeps those long enough", () => {
    fc.assert(
      fc.property(raw, fc.integer({ min: 1, max: 60 }), (x, n) => {
        const kept = atLeast(union(x), n);
        expect(kept.every((i) => minutesOf(i) >= n)).toBe(true);
        expect(kept).toHaveLength(union(x).filter((i) => minutesOf(i) >= n).length);
      }),
    );
  });

  it("does not overlap where one ends as the other starts", () => {
    expect(overlaps({ from: 0, to: 5 }, { from: 5, to: 9 })).toBe(false);
    expect(overlaps({ from: 0, to: 6 }, { from: 5, to: 9 })).toBe(true);
  });
});
