import { describe, expect, it } from "vitest";
import { emptyProgramme, newItems } from "./new-item";
import { checkPainBands, defaultPainBands, painBand } from "./pain-bands";
import { programmeWeek } from "./week";

let next = 0;
const id = () => `item-${++next}`;

describe("a week of a programme", () => {
  it("multiplies by sessions and counts strength days", () => {
    const programme = { ...emptyProgramme, sessionsPerWeek: 3, items: newItems("bridge", "timed", id) };
    const week = programmeWeek(programme, 50);
    expect(week.sessionSeconds).toBe(120);
    expect(week.weekSeconds).toBe(360);
    expect(week.underTensionWeekSeconds).toBe(180);
    expect(week.guidance.find((g) => g.aim === "strength")).toMatchObject({
      does: "3 days a week",
      isMet: true,
    });
    expect(week.guidance.some((g) => g.aim === "balance")).toBe(false);
  });

  it("adds balance from 65 and counts only aerobic work as minutes", () => {
    const walk = newItems("brisk-walk", "timed", id).map((item) => ({
      ...item,
      workSeconds: 1800,
      restSeconds: 0,
    }));
    const programme = {
      ...emptyProgramme,
      rounds: 1,
      sessionsPerWeek: 5,
      items: [...walk, ...newItems("bridge", "timed", id)],
    };
    const week = programmeWeek(programme, 65);
    expect(week.guidance.find((g) => g.aim === "aerobic")).toMatchObject({
      does: "150 min a week",
      isMet: true,
    });
    expect(week.guidance.filter((g) => g.aim === "balance").map((g) => g.isMet)).toEqual([false, false]);
  });

  it("never claims more days than a week has", () => {
    const programme = { ...emptyProgramme, sessionsPerWeek: 14, items: newItems("bridge", "timed", id) };
    expect(programmeWeek(programme, null).guidance.find((g) => g.aim === "strength")?.does).toBe(
      "7 days a week",
    );
  });
});

describe("pain bands", () => {
  it("covers every score once", () => {
    expect(Array.from({ length: 11 }, (_, score) => painBand(score))).toEqual([
      ...Array(3).fill("safe"),
      ...Array(3).fill("acceptable"),
      ...Array(5).fill("too-much"),
    ]);
    expect(painBand(3, { safeTo: 3, acceptableTo: 5 })).toBe("safe");
  });

  it.each([-1, 11, 2.5, Number.NaN])("throws for %s", (score) => {
    expect(() => painBand(score)).toThrow(RangeError);
  });

  it("refuses bands that overlap or allow more than 5", () => {
    expect(checkPainBands(defaultPainBands)).toBeNull();
    expect(checkPainBands({ safeTo: 5, acceptableTo: 5 })).toMatchObject({ field: "acceptableTo" });
    expect(checkPainBands({ safeTo: 2, acceptableTo: 6 })).toMatchObject({ field: "acceptableTo" });
    expect(checkPainBands({ safeTo: 1.5, acceptableTo: 5 })).not.toBeNull();
  });
});
