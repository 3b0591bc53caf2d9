import { compareRange, movements, type ReferenceKey } from "@withy/clinical/findings/range-of-movement";
import { redFlagsFor } from "@withy/clinical/findings/red-flags";
import { gradeMeanings, strengthCredit, strengthSum, sumValueOf } from "@withy/clinical/findings/strength";
import { readEntryTimes } from "@withy/clinical/notes/entry-times";
import { describe, expect, it } from "vitest";

// AAOS 1965 via Norkin and White (from memory), AMA Guides (from memory), MSD Manual table (read).
describe("reference ranges, in degrees, by named source", () => {
  it.each<[string, number | null, number | null, number | null]>([
    ["hip-flexion", 120, 100, 125],
    ["hip-extension", 30, 30, 15],
    ["hip-abduction", 45, 40, 45],
    ["hip-adduction", 30, 20, 45],
    ["hip-internal-rotation", 45, 40, 45],
    ["hip-external-rotation", 45, 50, 45],
    ["knee-flexion", 135, 150, 130],
    ["shoulder-flexion", 180, 150, null],
    ["shoulder-extension", 60, 50, 50],
    ["shoulder-abduction", 180, 180, null],
    ["shoulder-internal-rotation", 70, 90, 90],
    ["shoulder-external-rotation", 90, 90, 90],
    ["ankle-dorsiflexion", 20, 20, 20],
    ["ankle-plantarflexion", 50, 40, 50],
  ])("%s", (movement, aaos, ama, msd) => {
    const by = (source: ReferenceKey) => compareRange({ movement, degrees: 10 }, source)?.reference ?? null;
    expect([by("aaos"), by("ama"), by("msd")]).toEqual([aaos, ama, msd]);
  });

  it("a comparison carries its source and its signed difference", () => {
    expect(compareRange({ movement: "hip-flexion", degrees: 105 }, "msd")).toMatchObject({
      reference: 125,
      difference: -20,
      source: { citation: expect.stringContaining("MSD") },
    });
  });

  it("knee flexion is refused only outside -15 to 170", () => {
    expect(movements.find((m) => m.key === "knee-flexion")?.bounds).toEqual([-15, 170]);
  });
});

// Medical Research Council, Memorandum 45, as quoted; MRC sum-score sheet for plus and minus.
describe("strength, 0 to 5", () => {
  it.each([
    ["4+", 4],
    ["4-", 3],
    ["5-", 4],
    ["5", 5],
    ["0", 0],
  ] as const)("%s counts %i in a sum", (grade, value) => {
    expect(sumValueOf(grade)).toBe(value);
  });
  it("twelve full grades are 60; one 4+ and one 4- take off 1 and 2", () => {
    expect(strengthSum(Array.from({ length: 12 }, () => "5" as const))).toBe(60);
    expect(strengthSum([...Array.from({ length: 10 }, () => "5" as const), "4+", "4-"])).toBe(57);
  });
  it("has six meanings and the credit that the licence asks for", () => {
    expect(Object.keys(gradeMeanings)).toEqual(["0", "1", "2", "3", "4", "5"]);
    expect(strengthCredit).toBe("Used with the permission of the Medical Research Council");
  });
});

// BMJ Best Practice and Physiotherapy, March 2024: bladder or bowel, saddle, both legs, sexual function; hospital the same day.
describe("red flags", () => {
  it("suspected cauda equina is an emergency the same day, with its four signs", () => {
    const group = redFlagsFor("lower-back").find((g) => g.key === "cauda-equina");
    expect(group?.isEmergency).toBe(true);
    expect(group?.action).toContain("hospital today");
    expect(group?.flags.map((f) => f.key)).toEqual([
      "bladder-bowel",
      "saddle-numbness",
      "both-legs",
      "sexual-function",
    ]);
  });
  it("a sudden hot swollen joint is an emergency wherever it is", () => {
    for (const region of ["hip", "knee", "ankle-foot"]) {
      expect(redFlagsFor(region).find((g) => g.key === "joint-infection")?.isEmergency).toBe(true);
    }
  });
});

// CSP Quality Assurance Standards, section 6.1.1: before the end of that working day, both times recorded.
describe("entry of a note", () => {
  it("is late on the next day only", () => {
    const visit = new Date("2026-12-01T10:15:00Z");
    expect(readEntryTimes(visit, new Date("2026-12-01T19:00:00Z"), "Europe/London").isLate).toBe(false);
    expect(readEntryTimes(visit, new Date("2026-12-02T07:00:00Z"), "Europe/London").isLate).toBe(true);
  });
});
