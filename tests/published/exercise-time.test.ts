import { compareWithGuidance, moderateEquivalent } from "@withy/clinical/programmes/activity-guidance";
import { intervalSeconds, setTime, tempoSeconds, weekSeconds } from "@withy/clinical/programmes/compute-time";
import { painBand } from "@withy/clinical/programmes/pain-bands";
import { clockDuration } from "@withy/core/date-words";
import { describe, expect, it } from "vitest";

/** Computed from the stated rules; the rules themselves are common practice, no published source. */
describe("interval sessions", () => {
  it.each([
    { items: 10, rounds: 2, work: 30, rest: 30, between: 0, lastRest: "kept", seconds: 1200, timer: "20:00" },
    {
      items: 10,
      rounds: 2,
      work: 30,
      rest: 30,
      between: 0,
      lastRest: "dropped",
      seconds: 1170,
      timer: "19:30",
    },
    {
      items: 10,
      rounds: 2,
      work: 30,
      rest: 30,
      between: 60,
      lastRest: "kept",
      seconds: 1260,
      timer: "21:00",
    },
    { items: 5, rounds: 4, work: 20, rest: 10, between: 0, lastRest: "kept", seconds: 600, timer: "10:00" },
    { items: 1, rounds: 8, work: 20, rest: 10, between: 0, lastRest: "kept", seconds: 240, timer: "04:00" },
  ] as const)(
    "$items × $rounds × ($work + $rest), $between between rounds, last rest $lastRest: $timer",
    (row) => {
      const seconds = intervalSeconds({
        items: row.items,
        rounds: row.rounds,
        workSeconds: row.work,
        restSeconds: row.rest,
        restBetweenRoundsSeconds: row.between,
        lastRest: row.lastRest,
      });
      expect(seconds).toBe(row.seconds);
      expect(clockDuration(seconds)).toBe(row.timer);
    },
  );
});

/** Computed: tension is sets × repetitions × tempo, elapsed adds one rest fewer than sets. Common practice. */
describe("sets and repetitions", () => {
  it.each([
    { sets: 3, reps: 10, tempo: [3, 1, 1, 0], rest: 60, tension: 150, elapsed: 270 },
    { sets: 3, reps: 12, tempo: [6], rest: 60, tension: 216, elapsed: 336 },
    { sets: 2, reps: 15, tempo: [4], rest: 45, tension: 120, elapsed: 165 },
    { sets: 4, reps: 8, tempo: [7], rest: 90, tension: 224, elapsed: 494 },
    { sets: 1, reps: 10, tempo: [3], rest: 60, tension: 30, elapsed: 30 },
  ])("$sets × $reps at $tempo s, rest $rest s", ({ sets, reps, tempo, rest, tension, elapsed }) => {
    const plan = { sets, repetitions: reps, repetitionSeconds: tempoSeconds(tempo), restSeconds: rest };
    expect(setTime(plan)).toEqual({ underTensionSeconds: tension, elapsedSeconds: elapsed });
    expect(setTime({ ...plan, sides: 2 })).toEqual({
      underTensionSeconds: tension * 2,
      elapsedSeconds: elapsed * 2,
    });
  });

  it("doses a week: 150 s under tension, three sessions, 450 s", () => {
    expect(weekSeconds(150, 3)).toBe(450);
  });
});

/**
 * UK Chief Medical Officers' physical activity guidelines 2019: 150 minutes moderate or 75 vigorous a week or a
 * mix. The first mix is the NHS example of two 30-minute runs and 30 minutes of fast walking.
 */
describe("minutes of activity", () => {
  it.each([
    { vigorous: 60, moderate: 30, equivalent: 150, meets: true },
    { vigorous: 30, moderate: 90, equivalent: 150, meets: true },
    { vigorous: 20, moderate: 100, equivalent: 140, meets: false },
    { vigorous: 74, moderate: 0, equivalent: 148, meets: false },
    { vigorous: 0, moderate: 10 * 7, equivalent: 70, meets: false },
  ])(
    "$vigorous vigorous and $moderate moderate is $equivalent",
    ({ vigorous, moderate, equivalent, meets }) => {
      const minutes = { vigorousMinutes: vigorous, moderateMinutes: moderate };
      expect(moderateEquivalent(minutes)).toBe(equivalent);
      const lines = compareWithGuidance({ ...minutes, strengthDays: 2, balanceDays: 0, age: 40 });
      expect(lines.find((line) => line.aim === "aerobic")?.isMet).toBe(meets);
    },
  );

  it("asks for strength on at least 2 days, and balance on 2 days from older adults", () => {
    const week = { moderateMinutes: 150, vigorousMinutes: 0, balanceDays: 2 };
    const met = (strengthDays: number, age: number) =>
      compareWithGuidance({ ...week, strengthDays, age }).map((line) => `${line.aim} ${line.isMet}`);
    expect(met(2, 40)).toEqual(["aerobic true", "strength true"]);
    expect(met(1, 40)).toEqual(["aerobic true", "strength false"]);
    // The last line is the World Health Organization's 3 days from 65 (from memory).
    expect(met(2, 65)).toEqual(["aerobic true", "strength true", "balance true", "balance false"]);
  });
});

/** Pain-monitoring model, Thomeé 1997 (from memory): 0 to 2 safe, 3 to 5 acceptable, above 5 high risk. */
describe("pain during exercise", () => {
  it.each([
    [2, "safe"],
    [3, "acceptable"],
    [5, "acceptable"],
    [6, "too-much"],
  ] as const)("%i is %s", (score, band) => {
    expect(painBand(score)).toBe(band);
  });

  /** Printed by several clinics: 0 to 3, 4 to 5, 6 to 10. */
  it("follows another published first band when a practice sets it", () => {
    expect([3, 4, 5, 6].map((score) => painBand(score, { safeTo: 3, acceptableTo: 5 }))).toEqual([
      "safe",
      "acceptable",
      "acceptable",
      "too-much",
    ]);
  });
});
