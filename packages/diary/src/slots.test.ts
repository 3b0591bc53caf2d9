import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { isOnGrid, isWholeSlots, slotsOf } from "./slots";

const at = (text: string): Date => new Date(`2026-12-01T${text}:00Z`);

describe("five-minute slots", () => {
  it("takes nine for forty-five minutes and none at the end", () => {
    const slots = slotsOf(at("10:00"), at("10:45"));
    expect(slots).toHaveLength(9);
    expect(slots[0]).toEqual(at("10:00"));
    expect(slots.at(-1)).toEqual(at("10:40"));
  });

  it("refuses what is off the grid or back to front", () => {
    expect(() => slotsOf(at("10:01"), at("10:30"))).toThrow(RangeError);
    expect(() => slotsOf(at("10:00"), at("10:33"))).toThrow(RangeError);
    expect(() => slotsOf(at("10:00"), at("10:00"))).toThrow(RangeError);
    expect(isOnGrid(new Date("2026-12-01T10:05:00.001Z"))).toBe(false);
  });

  it.each([
    [5, true],
    [45, true],
    [0, false],
    [-5, false],
    [7, false],
    [2.5, false],
    [Number.NaN, false],
  ])("length %s: %s", (minutes, ok) => expect(isWholeSlots(minutes)).toBe(ok));

  it("shares a slot exactly when two visits overlap", () => {
    const visit = fc.record({
      from: fc.integer({ min: 0, max: 60 }),
      slots: fc.integer({ min: 1, max: 12 }),
    });
    fc.assert(
      fc.property(visit, visit, (a, b) => {
        const base = at("00:00").getTime();
        const of = (v: { from: number; slots: number }): Date[] =>
          slotsOf(new Date(base + v.from * 300_000), new Date(base + (v.from + v.slots) * 300_000));
        const taken = new Set(of(a).map(Number));
        const shares = of(b).some((s) => taken.has(s.getTime()));
        expect(shares).toBe(a.from < b.from + b.slots && b.from < a.from + a.slots);
      }),
    );
  });
});
