import { clockDuration } from "@withy/core/date-words";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { intervalSeconds, sessionTime, setTime, tempoSeconds } from "./compute-time";
import { sessionEquation, startTimes } from "./equation";
import { emptyProgramme, newItems } from "./new-item";
import type { Programme } from "./programme";
import { timeline } from "./timeline";

let next = 0;
const id = () => `item-${++next}`;
const items = (...keys: string[]) => keys.flatMap((key) => newItems(key, "timed", id));

/** Four movements for both sides together, three for each side: ten timed items. */
const hipSession: Programme = {
  ...emptyProgramme,
  items: items(
    "sit-to-stand",
    "step-up",
    "bridge",
    "side-leg-lift",
    "heel-raise",
    "hip-hinge",
    "backward-leg-reach",
  ),
};

describe("the hip interval session", () => {
  it("has ten timed items, two rounds, and takes exactly 20:00", () => {
    expect(hipSession.items).toHaveLength(10);
    expect(sessionTime(hipSession).elapsedSeconds).toBe(1200);
    expect(clockDuration(1200)).toBe("20:00");
    expect(sessionEquation(hipSession)).toEqual({
      timedItems: 10,
      rounds: 2,
      workSeconds: 30,
      restSeconds: 30,
      restBetweenRoundsSeconds: 0,
      lastRestDropped: false,
      totalSeconds: 1200,
    });
  });

  it("is as long when the sides are marked each on one line", () => {
    const merged = hipSession.items
      .filter((item) => item.side !== "right")
      .map((item) => (item.side === "left" ? { ...item, side: "each" as const } : item));
    const programme = { ...hipSession, items: merged };
    expect(merged).toHaveLength(7);
    expect(sessionTime(programme).elapsedSeconds).toBe(1200);
    expect(sessionEquation(programme).timedItems).toBe(10);
  });

  it("counts a one-sided line once when only one side is wanted", () => {
    const left = { ...hipSession, items: hipSession.items.filter((item) => item.side !== "right") };
    expect(sessionTime(left).elapsedSeconds).toBe(7 * 2 * 60);
  });

  it("tells when each line starts", () => {
    expect(startTimes(hipSession)).toEqual([0, 60, 120, 180, 240, 300, 360, 420, 480, 540, 600]);
  });

  it("drops only the last rest under rule B, and adds rest between rounds", () => {
    expect(sessionTime({ ...hipSession, lastRest: "dropped" }).elapsedSeconds).toBe(1170);
    expect(sessionTime({ ...hipSession, restBetweenRoundsSeconds: 60 }).elapsedSeconds).toBe(1260);
  });
});

const programmes = fc
  .record({
    rounds: fc.integer({ min: 1, max: 5 }),
    restBetweenRoundsSeconds: fc.integer({ min: 0, max: 90 }),
    lastRest: fc.constantFrom("kept" as const, "dropped" as const),
    lines: fc.array(
      fc.record({
        workSeconds: fc.integer({ min: 5, max: 90 }),
        restSeconds: fc.integer({ min: 0, max: 60 }),
        side: fc.constantFrom("both" as const, "left" as const, "right" as const, "each" as const),
      }),
      { maxLength: 8 },
    ),
  })
  .map(({ lines, ...rest }): Programme => {
    const [base] = newItems("bridge", "timed", id);
    if (!base) throw new Error("bridge is in the library");
    return { ...emptyProgramme, ...rest, items: lines.map((line) => ({ ...base, ...line, id: id() })) };
  });

describe("properties of timed sessions", () => {
  it("the timeline adds up to the session's time, without gaps", () => {
    fc.assert(
      fc.property(programmes, (programme) => {
        const steps = timeline(programme);
        let at = 0;
        for (const step of steps) {
          expect(step.startSecond).toBe(at);
          at += step.seconds;
        }
        expect(at).toBe(sessionTime(programme).elapsedSeconds);
      }),
    );
  });

  it("agrees with the plain interval rule where every item is alike", () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 12 }),
        fc.integer({ min: 1, max: 6 }),
        fc.integer({ min: 5, max: 60 }),
        fc.integer({ min: 0, max: 60 }),
        fc.constantFrom("kept" as const, "dropped" as const),
        (count, rounds, workSeconds, restSeconds, lastRest) => {
          const [base] = newItems("bridge", "timed", id);
          if (!base) throw new Error("bridge is in the library");
          const lines = Array.from({ length: count }, () => ({ ...base, workSeconds, restSeconds }));
          const programme: Programme = { ...emptyProgramme, rounds, lastRest, items: lines };
          expect(sessionTime(programme).elapsedSeconds).toBe(
            intervalSeconds({ items: count, rounds, workSeconds, restSeconds, lastRest }),
          );
        },
      ),
    );
  });
});

describe("sets", () => {
  it("adds holds to the tension and change-over time between exercises", () => {
    expect(
      setTime({ sets: 2, repetitions: 3, repetitionSeconds: 2, holdSeconds: 10, restSeconds: 30 }),
    ).toEqual({
      underTensionSeconds: 72,
      elapsedSeconds: 102,
    });
    expect(tempoSeconds([3, 1, 1, 0])).toBe(5);
    const [bridge] = newItems("bridge", "sets", id);
    const [reach] = newItems("backward-leg-reach", "sets", id);
    if (!bridge || !reach) throw new Error("both are in the library");
    expect(reach.side).toBe("each");
    // Bridge 2 × 10 × 4 s + 45 s = 125; each leg the same, twice = 250; 30 s to change over.
    expect(sessionTime({ ...emptyProgramme, mode: "sets", items: [bridge, reach] }).elapsedSeconds).toBe(405);
  });

  it("is nothing for an empty programme", () => {
    expect(sessionTime(emptyProgramme).elapsedSeconds).toBe(0);
    expect(sessionTime({ ...emptyProgramme, mode: "sets" }).elapsedSeconds).toBe(0);
    expect(
      intervalSeconds({ items: 0, rounds: 2, workSeconds: 30, restSeconds: 30, lastRest: "dropped" }),
    ).toBe(0);
    expect(startTimes(emptyProgramme)).toEqual([0]);
  });
});
