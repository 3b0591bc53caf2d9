import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  clockDuration,
  longDate,
  plainDateWords,
  proseTime,
  readDate,
  shortDate,
  titleDate,
  weekdayDate,
} from "./date-words";
import { addDays, datePartsOf, plainDateOf } from "./plain-date";

const today = "2026-12-01";
const days = fc.integer({ min: -60_000, max: 60_000 }).map((n) => addDays(today, n));

describe("dates in words and back", () => {
  it("what is written is read back", () => {
    fc.assert(
      fc.property(days, (day) => {
        for (const text of [plainDateWords(day), shortDate(day), longDate(day)]) {
          expect(readDate(text, today)).toBe(day);
        }
      }),
    );
  });

  it("what is written without its year is read back in that year", () => {
    fc.assert(
      fc.property(days, days, (day, other) => {
        const sameYear = plainDateOf(datePartsOf(day).year, datePartsOf(other).month, 28) ?? "";
        for (const text of [shortDate(day, sameYear), titleDate(day), weekdayDate(day)]) {
          expect(readDate(text, sameYear)).toBe(day);
        }
      }),
    );
  });
});

describe("dates in words", () => {
  it.each([
    [longDate, "Wednesday 6 May 2026"],
    [titleDate, "Wednesday 6 May"],
    [plainDateWords, "6 May 2026"],
    [weekdayDate, "Wed 6 May"],
  ])("$name", (write, text) => expect(write("2026-05-06")).toBe(text));

  it("a short date leaves out the year that it is", () => {
    expect(shortDate("2026-09-06", today)).toBe("6 Sep");
    expect(shortDate("2025-09-06", today)).toBe("6 Sep 2025");
    expect(shortDate("2026-09-06")).toBe("6 Sep 2026");
  });
});

it.each([
  ["00:00", "12am"],
  ["00:15", "12:15am"],
  ["09:05", "9:05am"],
  ["11:59", "11:59am"],
  ["12:00", "noon"],
  ["12:01", "12:01pm"],
  ["13:00", "1pm"],
  ["17:30", "5:30pm"],
  ["23:59", "11:59pm"],
])("%s is said %s", (time, words) => expect(proseTime(time)).toBe(words));

it.each([
  [0, "00:00"],
  [9, "00:09"],
  [59.4, "00:59"],
  [59.5, "01:00"],
  [1200, "20:00"],
  [3599, "59:59"],
  [3599.5, "1:00:00"],
  [3661, "1:01:01"],
  [36_000, "10:00:00"],
])("%d seconds show as %s", (seconds, text) => expect(clockDuration(seconds)).toBe(text));
