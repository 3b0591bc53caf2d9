import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { measureCatalogue } from "./catalogue";
import { hoos } from "./catalogue/hoos";
import { painRating } from "./catalogue/pain-rating";
import { phq9 } from "./catalogue/patient-health";
import { patientSpecificFunctional } from "./catalogue/patient-specific-functional";
import { compareValues, importanceWords, isImportant } from "./change";
import { type Answer, checkEntry } from "./entry";
import { bandOf } from "./interpret";
import { neckDisabilityPercent } from "./licensed-scores";
import { type Questionnaire, scalesOf } from "./measure";
import { formatScore, reaches, roundForDisplay } from "./rounding";
import { scoreMeasure, scoreScale } from "./score";

const questionnaires = measureCatalogue.filter((m): m is Questionnaire => m.form === "items");

describe("the catalogue", () => {
  it("names each measure once", () => {
    expect(new Set(measureCatalogue.map((m) => m.key)).size).toBe(measureCatalogue.length);
  });
  it.each(questionnaires.map((m) => [m.key, m] as const))(
    "%s: scales cover the items in order, none twice",
    (_key, measure) => {
      let next = 1;
      for (const scale of measure.scales) {
        expect(scale.firstItem).toBe(next);
        next += scale.items;
      }
      expect(next - 1).toBe(measure.items);
    },
  );
  it("bands cover the whole range without a gap", () => {
    for (const scale of measureCatalogue.flatMap(scalesOf)) {
      if (!scale.bands) continue;
      for (let n = scale.min; n <= (scale.max ?? 0); n += 1) expect(bandOf(scale, n)).not.toBeNull();
    }
  });
  it("every threshold names its source", () => {
    for (const scale of measureCatalogue.flatMap(scalesOf)) {
      if (scale.error) expect(scale.error.source.citation).not.toBe("");
      for (const rule of scale.importance) expect(rule.source.citation).not.toBe("");
    }
  });
});

describe("scoring", () => {
  const answerFor = (measure: Questionnaire) =>
    fc.array(fc.option(fc.integer({ min: measure.answer.min, max: measure.answer.max }), { nil: null }), {
      minLength: measure.items,
      maxLength: measure.items,
    });

  it.each(questionnaires.map((m) => [m.key, m] as const))(
    "%s: any allowed answers stay in the range or give a reason",
    (_key, measure) => {
      fc.assert(
        fc.property(answerFor(measure), (answers) => {
          expect(checkEntry(measure, { form: "items", answers })).toBeNull();
          scoreMeasure(measure, { form: "items", answers }).forEach((score, i) => {
            const scale = measure.scales[i];
            if (!scale) throw new Error("a score without its scale");
            if (score.value === null) {
              expect(score.reason).toMatch(/^No score: /);
              return;
            }
            expect(score.value).toBeGreaterThanOrEqual(scale.min);
            expect(score.value).toBeLessThanOrEqual(scale.max ?? Number.POSITIVE_INFINITY);
          });
        }),
      );
    },
  );

  it("a worse answer never gives a better score", () => {
    for (const measure of questionnaires) {
      for (const scale of measure.scales) {
        fc.assert(
          fc.property(
            fc.array(fc.integer({ min: measure.answer.min, max: measure.answer.max }), {
              minLength: scale.items,
              maxLength: scale.items,
            }),
            fc.nat(scale.items - 1),
            (answers, at) => {
              const raised = answers.map((a, i) => (i === at ? Math.min(a + 1, measure.answer.max) : a));
              const before = scoreScale(scale, answers).value ?? Number.NaN;
              const after = scoreScale(scale, raised).value ?? Number.NaN;
              const falls = scale.transform.kind === "reversed-hundred" || scale.transform.kind === "table";
              expect(falls ? after <= before + 1e-9 : after >= before - 1e-9).toBe(true);
            },
          ),
        );
      }
    }
  });

  it("says how many answers were missing", () => {
    const pain = hoos.scales.find((s) => s.key === "pain");
    if (!pain) throw new Error("no pain scale");
    const four: Answer[] = [1, 1, 1, 1, null, null, null, null, null, null];
    expect(scoreScale(pain, four)).toMatchObject({
      value: null,
      reason: "No score: at least 5 of 10 items are needed and 4 were answered.",
    });
  });

  it("a neck total is a share of what was answered (from memory)", () => {
    expect(neckDisabilityPercent([5, 5, 5, 5, 5, null, null, null, null, null])).toBe(100);
    expect(neckDisabilityPercent([2, 2, 2, 2, 2, 2, 2, 2, 2, 2])).toBe(40);
    expect(neckDisabilityPercent([null])).toBeNull();
  });
});

describe("what was typed", () => {
  it.each<[string, Answer[], string]>([
    ["above the range", [11], "answers.0"],
    ["not whole", [3.5], "answers.0"],
    ["not a number", [Number.NaN], "answers.0"],
    ["too few", [], "answers"],
  ])("pain rating refuses an answer %s", (_name, answers, field) => {
    expect(checkEntry(painRating, { form: "items", answers })?.field).toBe(field);
  });
  it("PHQ-9 names the item", () => {
    const answers: Answer[] = [0, 0, 0, 4, 0, 0, 0, 0, 0];
    expect(checkEntry(phq9, { form: "items", answers })?.message).toBe(
      "Item 4 must be a whole number from 0 to 3.",
    );
  });
  it.each<[string, { name: string; score: Answer }[], string]>([
    [
      "two activities",
      [
        { name: "Stairs", score: 3 },
        { name: "Socks", score: 3 },
      ],
      "activities",
    ],
    [
      "an unnamed one",
      [
        { name: "Stairs", score: 3 },
        { name: " ", score: 3 },
        { name: "Bed", score: 1 },
      ],
      "activities.1.name",
    ],
    [
      "the same one twice",
      [
        { name: "Stairs", score: 3 },
        { name: "stairs ", score: 3 },
        { name: "Bed", score: 1 },
      ],
      "activities.1.name",
    ],
    [
      "a score over 10",
      [
        { name: "Stairs", score: 3 },
        { name: "Socks", score: 12 },
        { name: "Bed", score: 1 },
      ],
      "activities.1.score",
    ],
  ])("own activities refuse %s", (_name, activities, field) => {
    expect(checkEntry(patientSpecificFunctional, { form: "activities", activities })?.field).toBe(field);
  });
  it("refuses answers of another form", () => {
    expect(checkEntry(phq9, { form: "total", value: 3 })?.kind).toBe("measure-entry");
    expect(() => scoreMeasure(phq9, { form: "total", value: 3 })).toThrow(RangeError);
  });
});

describe("change", () => {
  const pain = painRating.scales[0];
  if (!pain) throw new Error("no pain scale");
  const compare = (first: number, latest: number) =>
    compareValues(pain, { value: first, comparedBy: null }, { value: latest, comparedBy: null });

  it("from 0 has no percent, and a rise in pain is worse", () => {
    expect(compare(0, 3)).toMatchObject({ direction: "worse", percent: null, importance: [] });
  });
  it("none is said plainly", () => {
    expect(compare(4, 4).words).toBe("No change.");
  });
  it("swapping the two days swaps better and worse", () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 10 }), fc.integer({ min: 0, max: 10 }), (a, b) => {
        const there = compare(a, b);
        const back = compare(b, a);
        if (there.kind !== "compared" || back.kind !== "compared") throw new Error("not compared");
        expect(there.difference).toBe(-back.difference === 0 ? 0 : -back.difference);
        expect(there.isBeyondError).toBe(back.isBeyondError);
      }),
    );
  });
  it("rounding never makes a change look as large as the error it did not reach", () => {
    const hip = hoos.scales.find((s) => s.key === "pain");
    if (!hip) throw new Error("no pain scale");
    const nearly = compareValues(hip, { value: 50, comparedBy: null }, { value: 71.56, comparedBy: null });
    expect(nearly.words).toBe("Better by 21.56, within measurement error (21.6).");
  });
  it("a change inside a published range is said to be inside it", () => {
    const hip = hoos.scales.find((s) => s.key === "pain");
    if (!hip) throw new Error("no pain scale");
    const inside = compareValues(hip, { value: 50, comparedBy: null }, { value: 57.5, comparedBy: null });
    expect(importanceWords(inside)).toBe(
      "It lies inside the published range 6 to 10 (15.0% of the first value).",
    );
    expect(isImportant(inside)).toBe(false);
    expect(isImportant(compare(7, 4))).toBe(true);
    expect(isImportant(compare(4, 7))).toBe(false);
  });
});

describe("rounding", () => {
  it.each([
    [72.25, 1, "72.3"],
    [1.005, 2, "1.01"],
    [-2.65, 1, "-2.7"],
    [-0.04, 1, "0.0"],
    [0.5, 0, "1"],
  ])("%d to %i places is %s", (n, places, text) => {
    expect(formatScore(n, places)).toBe(text);
  });
  it("never moves a value by more than half a step", () => {
    fc.assert(
      fc.property(fc.double({ min: -1000, max: 1000, noNaN: true }), (n) => {
        expect(Math.abs(roundForDisplay(n, 1) - n)).toBeLessThanOrEqual(0.05 + 1e-6);
      }),
    );
  });
  it("forgives the last binary digit only", () => {
    expect(reaches(16 / 3 - 10 / 3, 2)).toBe(true);
    expect(reaches(1.9999, 2)).toBe(false);
  });
});
