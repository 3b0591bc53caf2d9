import { neckDisability, quickDash } from "@withy/clinical/measures/catalogue/licensed";
import { gad7, phq2, phq9 } from "@withy/clinical/measures/catalogue/patient-health";
import type { Answer } from "@withy/clinical/measures/entry";
import { bandOf } from "@withy/clinical/measures/interpret";
import { groupStartBack, scoreQuickDash } from "@withy/clinical/measures/licensed-scores";
import { findScale } from "@withy/clinical/measures/measure";
import { formatScore } from "@withy/clinical/measures/rounding";
import { alarmOf } from "@withy/clinical/measures/score";
import { describe, expect, it } from "vitest";
import { change, met, N, scale, shown } from "./read-measure";

// Kroenke and others 2001 (bands), PMC2906530 (PHQ-2); the rule for blanks is from memory of the manual.
describe("PHQ and GAD-7", () => {
  const low: Answer[] = [1, 1, 2, 1, 0, 1, 0, 0, 0];
  const high: Answer[] = [2, 2, 3, 2, 2, 2, 1, 1, 1];
  const mood = scale(phq9, "mood");
  it("6 is mild with no prompt; 16 is moderately severe with the prompt of item 9", () => {
    expect(shown(phq9, "mood", low)).toBe("6");
    expect(bandOf(mood, 6)).toBe("mild");
    expect(alarmOf(phq9, { form: "items", answers: low })).toBeNull();
    expect(shown(phq9, "mood", high)).toBe("16");
    expect(bandOf(mood, 16)).toBe("moderately severe");
    expect(alarmOf(phq9, { form: "items", answers: high })).toContain("Item 9 is above 0");
  });
  it("prompts at a total of 1, and where item 9 is blank", () => {
    expect(alarmOf(phq9, { form: "items", answers: [0, 0, 0, 0, 0, 0, 0, 0, 1] })).toContain(
      "Item 9 is above 0",
    );
    expect(alarmOf(phq9, { form: "items", answers: [0, 0, 0, 0, 0, 0, 0, 0, N] })).toContain("left blank");
  });
  it.each([
    [4, "minimal"],
    [5, "mild"],
    [9, "mild"],
    [10, "moderate"],
    [14, "moderate"],
    [15, "moderately severe"],
    [19, "moderately severe"],
    [20, "severe"],
    [27, "severe"],
  ])("PHQ-9 %i is %s", (total, band) => expect(bandOf(mood, total)).toBe(band));
  it("one or two blanks take the mean of the rest; three give no score", () => {
    expect(shown(phq9, "mood", [2, 2, 2, 2, 2, 2, 2, N, N])).toBe("18");
    expect(shown(phq9, "mood", [2, 2, 2, 2, 2, 2, N, N, N])).toBe("no score");
    expect(shown(gad7, "anxiety", [1, 1, 1, 1, 1, N, N])).toBe("7");
    expect(shown(gad7, "anxiety", [1, 1, 1, 1, N, N, N])).toBe("no score");
  });
  it.each([
    [4, "minimal"],
    [5, "mild"],
    [9, "mild"],
    [10, "moderate"],
    [14, "moderate"],
    [15, "severe"],
    [21, "severe"],
  ])("GAD-7 %i is %s", (total, band) => expect(bandOf(scale(gad7, "anxiety"), total)).toBe(band));
  it("PHQ-2 is positive from 3, and needs both", () => {
    expect(bandOf(scale(phq2, "mood"), 3)).toContain("positive");
    expect(bandOf(scale(phq2, "mood"), 2)).toContain("negative at 3");
    expect(bandOf(scale(phq2, "mood"), 1)).toBe("negative");
    expect(shown(phq2, "mood", [3, N])).toBe("no score");
  });
});

// Institute for Work & Health, DASH scoring sheet: (mean - 1) x 25, at most one blank.
describe("licensed totals", () => {
  const answers: Answer[] = [2, 3, 2, 1, 4, 2, 3, 2, 3, 2, 3];
  const shownTotal = (given: readonly Answer[]) => {
    const score = scoreQuickDash(given);
    return score.value === null ? "no score" : formatScore(score.value, 2);
  };
  it("QuickDASH 36.36; last blank 35.00; two blank none", () => {
    expect(shownTotal(answers)).toBe("36.36");
    expect(shownTotal([...answers.slice(0, 10), N])).toBe("35.00");
    expect(shownTotal([...answers.slice(0, 9), N, N])).toBe("no score");
  });
  // Gummesson and others 2006, as quoted: 14 points. Stratford and others 1999, as quoted: MDC90 4.7.
  it("QuickDASH 14 points matter; NDI 4.7 is the error", () => {
    expect(met(quickDash.scale, 50, 36, "14 points")).toBe("yes");
    expect(met(quickDash.scale, 50, 37, "14 points")).toBe("no");
    expect(change(neckDisability.scale, 20, 15).isBeyondError).toBe(true);
    expect(change(neckDisability.scale, 20, 16).isBeyondError).toBe(false);
  });
  // Keele University, online calculator.
  it.each<[string, number[], boolean, number, number, string, string]>([
    ["1, 2, 3", [1, 2, 3], false, 3, 0, "low", "945621000000107"],
    ["1, 2, 3, 4, 6", [1, 2, 3, 4, 6], false, 5, 1, "medium", "45641000000100"],
    ["1, 5, 6, 7 and extremely", [1, 5, 6, 7], true, 5, 4, "high", "45601000000103"],
  ])("STarT Back %s", (_name, agreedItems, isVeryBothersome, total, subscore, group, code) => {
    const agreed = Array.from({ length: 8 }, (_, i) => agreedItems.includes(i + 1));
    expect(groupStartBack({ agreed, isVeryBothersome })).toEqual({ total, subscore, group, code });
  });
  it("no scale of a licensed measure has items", () => {
    expect(findScale(quickDash, "total")).not.toHaveProperty("items");
  });
});
