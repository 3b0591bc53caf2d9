import { chairStand } from "@withy/clinical/measures/catalogue/chair-stand";
import { fastWalk } from "@withy/clinical/measures/catalogue/fast-walk";
import { stairClimb } from "@withy/clinical/measures/catalogue/stair-climb";
import { timedUpAndGo } from "@withy/clinical/measures/catalogue/timed-up-and-go";
import { compareValues } from "@withy/clinical/measures/change";
import { checkEntry } from "@withy/clinical/measures/entry";
import { readChairStand, readFiveTimes, readTimedUpAndGo } from "@withy/clinical/measures/interpret";
import { formatScore } from "@withy/clinical/measures/rounding";
import { scoreMeasure } from "@withy/clinical/measures/score";
import { describe, expect, it } from "vitest";

const value = (...args: Parameters<typeof scoreMeasure>) => scoreMeasure(...args)[0]?.value ?? Number.NaN;

// CDC STEADI, 30-second chair stand, as quoted by three agreeing pages: below average if fewer than the number.
describe("30-second chair stand", () => {
  const bands: [number, number, number, number][] = [
    [60, 64, 14, 12],
    [65, 69, 12, 11],
    [70, 74, 12, 10],
    [75, 79, 11, 10],
    [80, 84, 10, 9],
    [85, 89, 8, 8],
    [90, 94, 7, 4],
  ];
  it.each(bands)("ages %i to %i: men %i, women %i", (from, to, men, women) => {
    for (const age of [from, to]) {
      for (const [sex, expected] of [
        ["male", men],
        ["female", women],
      ] as const) {
        expect(readChairStand(expected - 1, { age, sex }).standing).toBe("below");
        expect(readChairStand(expected, { age, sex }).standing).toBe("not-below");
      }
    }
  });
  it.each<[string, number, number, "male" | "female" | null, string]>([
    ["man 72 with 11", 11, 72, "male", "below"],
    ["man 72 with 12", 12, 72, "male", "not-below"],
    ["woman 67 with 11", 11, 67, "female", "not-below"],
    ["woman 59", 3, 59, "female", "no-norm"],
    ["woman 95", 3, 95, "female", "no-norm"],
    ["sex not recorded", 3, 72, null, "no-norm"],
  ])("%s", (_name, stands, age, sex, standing) => {
    expect(readChairStand(stands, { age, sex }).standing).toBe(standing);
  });
  it("arms used count as 0, and 0 is below average", () => {
    expect(value(chairStand, { form: "reading", value: 14, usedArms: true })).toBe(0);
    expect(value(chairStand, { form: "reading", value: 14, usedArms: false })).toBe(14);
    expect(readChairStand(0, { age: 91, sex: "female" }).standing).toBe("below");
  });
});

// CDC STEADI, from memory: 12 seconds or more. BMC Musculoskeletal Disorders 2015: MDC 1.10 s (one rater), 1.14 s (two).
describe("timed up and go", () => {
  it.each([
    [11.9, "not-below"],
    [12, "flagged"],
    [14.2, "flagged"],
  ])("%d s is %s", (seconds, standing) => {
    expect(readTimedUpAndGo(seconds).standing).toBe(standing);
  });
  it("1.12 s is beyond error for one rater and within it for two", () => {
    const first = { value: 10, comparedBy: null };
    const latest = { value: 8.88, comparedBy: null };
    expect(compareValues(timedUpAndGo.scale, first, latest, { isSameRater: true })).toMatchObject({
      isBeyondError: true,
      direction: "better",
    });
    expect(compareValues(timedUpAndGo.scale, first, latest)).toMatchObject({ isBeyondError: false });
  });
});

// Bohannon 2006 (abstract): over 11.4, 12.6, 14.8 s; Buatois 2008, as quoted: over 15 s.
describe("five times sit to stand", () => {
  it.each<[number, number, string]>([
    [60, 11.4, "not-below"],
    [60, 11.5, "below"],
    [69, 11.5, "below"],
    [70, 11.5, "not-below"],
    [79, 12.7, "below"],
    [80, 12.7, "not-below"],
    [89, 14.9, "below"],
    [85, 14.8, "not-below"],
    [72, 15.1, "flagged"],
    [59, 14, "no-norm"],
    [90, 14, "no-norm"],
  ])("at %i, %d s: %s", (age, seconds, standing) => {
    expect(readFiveTimes(seconds, { age }).standing).toBe(standing);
  });
});

// Speed is distance over time (OARSI core set, Dobson and others 2013).
describe("40 metre fast walk", () => {
  it.each([
    [25, "1.60"],
    [28.57, "1.40"],
    [32.4, "1.23"],
    [45.2, "0.88"],
  ])("%d s is %s m/s", (seconds, speed) => {
    expect(formatScore(value(fastWalk, { form: "reading", value: seconds }), 2)).toBe(speed);
  });
  it("refuses no time at all", () => {
    expect(checkEntry(fastWalk, { form: "reading", value: 0 })?.field).toBe("value");
  });
});

// HCPLive summary of the OARSI set: record the number of steps where it is not nine.
describe("stair climb", () => {
  it("compares only the same stairs", () => {
    const [nine] = scoreMeasure(stairClimb, { form: "reading", value: 14, steps: 9 });
    const [eleven] = scoreMeasure(stairClimb, { form: "reading", value: 12, steps: 11 });
    if (!nine || nine.value === null || !eleven || eleven.value === null) throw new Error("not scored");
    expect(compareValues(stairClimb.scale, nine, eleven).kind).toBe("not-comparable");
    expect(compareValues(stairClimb.scale, nine, nine).kind).toBe("compared");
    expect(checkEntry(stairClimb, { form: "reading", value: 14 })?.field).toBe("steps");
  });
});
