import { hoos } from "@withy/clinical/measures/catalogue/hoos";
import { hoosPs, hoosPsTable } from "@withy/clinical/measures/catalogue/hoos-ps";
import { koos } from "@withy/clinical/measures/catalogue/koos";
import { koosPs, koosPsTable } from "@withy/clinical/measures/catalogue/koos-ps";
import { lowerExtremityFunctional } from "@withy/clinical/measures/catalogue/lower-extremity-functional";
import { painRating } from "@withy/clinical/measures/catalogue/pain-rating";
import { patientSpecificFunctional } from "@withy/clinical/measures/catalogue/patient-specific-functional";
import { rolandMorris } from "@withy/clinical/measures/catalogue/roland-morris";
import { compareValues, importanceWords, isActivityChangeBeyondError } from "@withy/clinical/measures/change";
import type { Answer } from "@withy/clinical/measures/entry";
import type { Questionnaire } from "@withy/clinical/measures/measure";
import { formatScore } from "@withy/clinical/measures/rounding";
import { inOtherDirection, scoreMeasure, scoreScale } from "@withy/clinical/measures/score";
import { describe, expect, it } from "vitest";
import { change, met, N, repeat, scale, shown } from "./read-measure";

// Computed from the authors' rule: 100 minus mean/4 times 100, at least half of a subscale answered (koos.nu).
describe("HOOS and KOOS subscales", () => {
  const adl: Answer[] = [1, 1, 2, 0, 1, 2, 2, 1, 3, 1, 2, 1, 1, 0, 1, 3, 1];
  it.each<[string, Questionnaire, string, Answer[], string]>([
    ["HOOS pain, ten answers", hoos, "pain", [2, 2, 1, 3, 2, 2, 1, 2, 3, 2], "50.0"],
    ["HOOS pain, five of ten", hoos, "pain", [1, 2, 2, 3, 1, N, N, N, N, N], "55.0"],
    ["HOOS pain, four of ten", hoos, "pain", [1, 2, 2, 3, N, N, N, N, N, N], "no score"],
    ["HOOS pain, all 0", hoos, "pain", repeat(0, 10), "100.0"],
    ["HOOS pain, all 4", hoos, "pain", repeat(4, 10), "0.0"],
    ["HOOS daily living", hoos, "daily-living", adl, "66.2"],
    ["HOOS daily living, first nine", hoos, "daily-living", [...adl.slice(0, 9), ...repeat(N, 8)], "63.9"],
    [
      "HOOS daily living, first eight",
      hoos,
      "daily-living",
      [...adl.slice(0, 8), ...repeat(N, 9)],
      "no score",
    ],
    ["HOOS symptoms, three of five", hoos, "symptoms", [1, 2, 2, N, N], "58.3"],
    ["HOOS symptoms, two of five", hoos, "symptoms", [1, 2, N, N, N], "no score"],
    ["HOOS sport, two of four", hoos, "sport", [1, N, 3, N], "50.0"],
    ["HOOS sport, one of four", hoos, "sport", [1, N, N, N], "no score"],
    ["HOOS quality of life, two of four", hoos, "quality-of-life", [N, 4, N, 3], "12.5"],
    ["KOOS symptoms", koos, "symptoms", [1, 0, 2, 1, 1, 3, 2], "64.3"],
    ["KOOS symptoms, four of seven", koos, "symptoms", [1, 0, 2, 1, N, N, N], "75.0"],
    ["KOOS symptoms, three of seven", koos, "symptoms", [1, 0, 2, N, N, N, N], "no score"],
    ["KOOS pain, five of nine", koos, "pain", [0, 1, 2, 3, 4, N, N, N, N], "50.0"],
    ["KOOS pain, four of nine", koos, "pain", [0, 1, 2, 3, N, N, N, N, N], "no score"],
    ["KOOS sport, three of five", koos, "sport", [4, 4, 2, N, N], "16.7"],
    ["KOOS sport, two of five", koos, "sport", [4, 4, N, N, N], "no score"],
  ])("%s", (_name, measure, key, answers, expected) => {
    expect(shown(measure, key, answers)).toBe(expected);
  });

  // BMC Musculoskeletal Disorders 2014, 15:235: MDC95 by subscale.
  it.each<[string, Questionnaire, string, number, number, boolean]>([
    ["hip pain, 21.6 reached", hoos, "pain", 47.5, 72.5, true],
    ["hip pain, 21.6 not reached", hoos, "pain", 50, 70, false],
    ["hip daily living 17.7", hoos, "daily-living", 40, 57.7, true],
    ["hip symptoms 22.7", hoos, "symptoms", 40, 62, false],
    ["knee pain 20.2", koos, "pain", 40, 60.2, true],
    ["knee quality of life 26.6", koos, "quality-of-life", 40, 65, false],
  ])("change: %s", (_name, measure, key, first, latest, beyond) => {
    expect(change(scale(measure, key), first, latest).isBeyondError).toBe(beyond);
  });
});

// HOOS-PS and KOOS-PS User's Guides, koos.nu, as quoted by a public score library; 64.7 corrects a misprint there.
describe("short forms by conversion table", () => {
  it("both tables fall strictly from 100 to 0", () => {
    for (const [table, highest] of [
      [hoosPsTable, 20],
      [koosPsTable, 28],
    ] as const) {
      expect(table).toHaveLength(highest + 1);
      expect(table[0]).toBe(100);
      expect(table[highest]).toBe(0);
      table.forEach((value, raw) => {
        if (raw > 0) expect(value).toBeLessThan(table[raw - 1] ?? Number.NaN);
      });
    }
  });

  it.each<[string, Questionnaire, Answer[], string, string]>([
    ["HOOS-PS raw 10", hoosPs, [2, 2, 2, 2, 2], "62.3", "37.7"],
    ["HOOS-PS raw 7", hoosPs, [1, 1, 1, 2, 2], "73.1", "26.9"],
    ["HOOS-PS raw 20", hoosPs, [4, 4, 4, 4, 4], "0.0", "100.0"],
    ["KOOS-PS raw 11", koosPs, [1, 1, 1, 2, 2, 2, 2], "64.7", "35.3"],
    ["KOOS-PS raw 14", koosPs, [2, 2, 2, 2, 2, 2, 2], "59.7", "40.3"],
  ])("%s in both directions", (_name, measure, answers, value, other) => {
    const score = scoreScale(scale(measure, "function"), answers);
    expect(score.value).not.toBeNull();
    expect(formatScore(score.value ?? Number.NaN, 1)).toBe(value);
    expect(formatScore(inOtherDirection(score.value ?? Number.NaN), 1)).toBe(other);
  });

  it("needs every item", () => {
    expect(shown(hoosPs, "function", [2, 2, N, 2, 2])).toBe("no score");
    expect(shown(koosPs, "function", [2, 2, 2, 2, 2, 2, N])).toBe("no score");
  });

  // PMC3943561: important difference 2.2 for the knee.
  it("KOOS-PS: 2.2 matters, 2.1 does not", () => {
    expect(met(scale(koosPs, "function"), 60, 62.2, "2.2")).toBe("yes");
    expect(met(scale(koosPs, "function"), 60, 62.1, "2.2")).toBe("no");
  });
});

// Stratford and others 1995, text of the form: MDC90 2 for the average, 3 for one activity.
describe("patient-specific functional scale", () => {
  const names = ["Stairs at the harbour", "Putting on socks", "Gardening an hour"];
  const entry = (...scores: Answer[]) => ({
    form: "activities" as const,
    activities: scores.map((score, i) => ({ name: names[i] ?? "", score })),
  });
  const value = (...scores: Answer[]) => {
    const [score] = scoreMeasure(patientSpecificFunctional, entry(...scores));
    if (!score || score.value === null) throw new Error("no score");
    return score;
  };

  it("3, 5, 2 then 6, 7, 5: 3.3 to 6.0, better by 2.67 from the unrounded means, beyond 2", () => {
    const first = value(3, 5, 2);
    const latest = value(6, 7, 5);
    expect(formatScore(first.value, 1)).toBe("3.3");
    expect(formatScore(latest.value, 1)).toBe("6.0");
    const result = compareValues(patientSpecificFunctional.scale, first, latest);
    expect(result).toMatchObject({ kind: "compared", direction: "better", isBeyondError: true });
    expect(result.kind === "compared" && formatScore(result.difference, 2)).toBe("2.67");
    expect(result.words).toBe("Better by 2.7, beyond measurement error (2.0).");
  });

  it("exactly 2 by thirds is beyond, and 1.67 is not", () => {
    const two = compareValues(patientSpecificFunctional.scale, value(3, 4, 3), value(5, 6, 5));
    const less = compareValues(patientSpecificFunctional.scale, value(3, 4, 3), value(5, 6, 4));
    expect(two).toMatchObject({ isBeyondError: true });
    expect(less).toMatchObject({ isBeyondError: false });
  });

  it("averages those scored, and refuses to compare other activities", () => {
    expect(value(4, null, 6).value).toBe(5);
    expect(compareValues(patientSpecificFunctional.scale, value(4, 5, 6), value(6, null, 7)).kind).toBe(
      "not-comparable",
    );
  });

  it("one activity needs 3", () => {
    expect(isActivityChangeBeyondError(patientSpecificFunctional.oneActivityError, 3, 6)).toBe(true);
    expect(isActivityChangeBeyondError(patientSpecificFunctional.oneActivityError, 3, 5)).toBe(false);
  });
});

// Ostelo and others 2008: 2 points or 30%.
describe("pain rating", () => {
  const pain = scale(painRating, "pain");
  it("7 to 4: three points, 42.9%, important", () => {
    const result = change(pain, 7, 4);
    expect(result.difference).toBe(-3);
    expect(result.direction).toBe("better");
    expect(formatScore(result.percent ?? 0, 1)).toBe("42.9");
    expect(met(pain, 7, 4, "2 points")).toBe("yes");
    expect(met(pain, 7, 4, "30%")).toBe("yes");
  });
  it("6 to 5: one point, 16.7%, neither", () => {
    expect(formatScore(change(pain, 6, 5).percent ?? 0, 1)).toBe("16.7");
    expect(met(pain, 6, 5, "2 points")).toBe("no");
    expect(met(pain, 6, 5, "30%")).toBe("no");
  });
  // Thieme a-1304-3677: smallest detectable change 1.77 in back pain.
  it("two points are beyond 1.77 and one is not", () => {
    expect(change(pain, 6, 4).isBeyondError).toBe(true);
    expect(change(pain, 6, 5).isBeyondError).toBe(false);
  });
});

// Binkley and others 1999: sum 0 to 80, MDC90 9.
describe("lower extremity functional scale", () => {
  const legs = scale(lowerExtremityFunctional, "function");
  it("20 twos are 40; ten threes and ten twos are 50", () => {
    expect(shown(lowerExtremityFunctional, "function", repeat(2, 20))).toBe("40");
    expect(shown(lowerExtremityFunctional, "function", [...repeat(3, 10), ...repeat(2, 10)])).toBe("50");
    expect(shown(lowerExtremityFunctional, "function", [...repeat(2, 19), N])).toBe("no score");
  });
  it.each([
    [40, 50, true],
    [43, 51, false],
    [43, 52, true],
  ])("%i to %i beyond error: %s", (first, latest, beyond) => {
    expect(change(legs, first, latest).isBeyondError).toBe(beyond);
  });
});

// Ostelo and others 2008: 5 points or 30%; each rule is reported, so the screen says which.
describe("Roland-Morris", () => {
  const back = scale(rolandMorris, "disability");
  it("counts ticks; blank and not applicable count as no", () => {
    expect(shown(rolandMorris, "disability", [...repeat(1, 7), ...repeat(N, 10), ...repeat(0, 7)])).toBe("7");
    expect(shown(rolandMorris, "disability", repeat(N, 24))).toBe("0");
  });
  it.each<[number, number, string, "yes" | "no", "yes" | "no"]>([
    [12, 2, "83.3", "yes", "yes"],
    [17, 12, "29.4", "yes", "no"],
    [16, 12, "25.0", "no", "no"],
    [10, 7, "30.0", "no", "yes"],
  ])("%i to %i is %s%%: by points %s, by percent %s", (first, latest, percent, points, share) => {
    expect(formatScore(change(back, first, latest).percent ?? 0, 1)).toBe(percent);
    expect(met(back, first, latest, "5 points")).toBe(points);
    expect(met(back, first, latest, "30%")).toBe(share);
  });
  it("says which rule is met", () => {
    expect(importanceWords(change(back, 17, 12))).toBe(
      "It reaches the published difference that matters: 5 points; does not reach 30% (29.4% of the first value).",
    );
  });
});
