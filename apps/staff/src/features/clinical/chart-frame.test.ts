import { describe, expect, it } from "vitest";
import { frame, frameOf } from "./chart-frame";

const series = [
  { day: "2026-10-06", value: 47.5 },
  { day: "2026-10-27", value: 57.5 },
  { day: "2026-12-01", value: 72.5 },
];

describe("a chart's frame", () => {
  const drawn = frameOf(series, { min: 0, max: 100, error: 21.6 });
  it("runs from the first day to the last, higher values higher up", () => {
    expect(drawn.points[0]?.x).toBe(frame.left);
    expect(drawn.points.at(-1)?.x).toBe(frame.right);
    expect(drawn.points.map((p) => p.y)).toEqual([...drawn.points.map((p) => p.y)].sort((a, b) => b - a));
  });
  it("keeps everything inside the paper and puts the last point above a band that it has left", () => {
    for (const { y } of [...drawn.points, ...drawn.ticks]) {
      expect(y).toBeGreaterThanOrEqual(frame.top - 0.01);
      expect(y).toBeLessThanOrEqual(frame.bottom + 0.01);
    }
    expect(drawn.points.at(-1)?.y).toBeLessThan(drawn.band?.top ?? 0);
  });
  it("cuts the band at the end of the scale", () => {
    const low = frameOf([{ day: "2026-10-06", value: 1 }], { min: 0, max: 10, error: 2 });
    expect((low.band?.top ?? 0) + (low.band?.height ?? 0)).toBeCloseTo(frame.bottom);
  });
  it("has no band without a published error, and survives one point and no spread", () => {
    const flat = frameOf([{ day: "2026-10-06", value: 12 }], { min: 0, max: null, error: null });
    expect(flat.band).toBeNull();
    expect(Number.isFinite(flat.points[0]?.y)).toBe(true);
    expect(flat.ticks.length).toBeGreaterThan(0);
  });
  it("sets two of one day side by side", () => {
    const same = frameOf(
      [
        { day: "2026-12-01", value: 3 },
        { day: "2026-12-01", value: 5 },
      ],
      { min: 0, max: 10, error: 1 },
    );
    expect(same.points.map((p) => p.x)).toEqual([frame.left, frame.right]);
  });
});
