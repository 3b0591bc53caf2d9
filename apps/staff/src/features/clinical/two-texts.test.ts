import { describe, expect, it } from "vitest";
import { isoDayAt } from "./site-time";
import { bothTexts, differingHeadings } from "./two-texts";

describe("two texts of one note", () => {
  const mine = { history: "Walks further", plan: "Twice a week" };
  const theirs = { history: "Walks further ", plan: "Three times a week", advice: "Keep moving" };
  it("names the headings that differ in more than space", () => {
    expect(differingHeadings("session", mine, theirs).map((h) => h.key)).toEqual(["advice", "plan"]);
  });
  it("keeps the words of both", () => {
    expect(bothTexts("session", mine, theirs)).toEqual({
      history: "Walks further",
      plan: "Twice a week\nThree times a week",
      advice: "Keep moving",
    });
  });
});

describe("the site's day", () => {
  it("is not that of UTC after eleven on a summer evening", () => {
    expect(isoDayAt("2026-06-30T23:30:00Z", "Europe/London")).toBe("2026-07-01");
    expect(isoDayAt("2026-12-01T23:30:00Z", "Europe/London")).toBe("2026-12-01");
  });
});
