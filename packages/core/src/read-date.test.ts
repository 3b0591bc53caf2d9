import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { readDate } from "./date-words";
import { addDays, datePartsOf, daysBetween, weekdayOf } from "./plain-date";

/** A Tuesday. */
const today = "2026-12-01";
const days = fc.integer({ min: -60_000, max: 60_000 }).map((n) => addDays(today, n));
const two = (n: number) => String(n).padStart(2, "0");

describe("a date as it is typed", () => {
  it.each([
    "6/5/2026",
    "06/05/2026",
    "6-5-2026",
    "6.5.26",
    "6 5 26",
    "6 / 5 / 2026",
    "06052026",
    "6 May 2026",
    "6 MAY 26",
    "6may",
    "6may26",
    "6th May",
    "6 may, 2026",
    "06-May-2026",
    "Wed 6 May",
    "Wednesday, 6 May 2026",
    "2026-05-06",
    "6/5",
    "  6   may  ",
  ])("%s is the sixth of May", (text) => expect(readDate(text, today)).toBe("2026-05-06"));

  it.each([
    ["1 jan", "2026-01-01"],
    ["2nd feb", "2026-02-02"],
    ["3rd sept", "2026-09-03"],
    ["21st december", "2026-12-21"],
    ["1 mar", "2026-03-01"],
    ["1 jun", "2026-06-01"],
    ["1 jul", "2026-07-01"],
  ])("%s is %s", (text, day) => expect(readDate(text, today)).toBe(day));

  it.each([
    ["29 2 2028", "2028-02-29"],
    ["29 feb 24", "2024-02-29"],
    ["29/2/2026", null],
    ["29 feb", null],
    ["29/2/1900", null],
    ["29/2/2000", "2000-02-29"],
  ])("the leap day %s is %s", (text, day) => expect(readDate(text, today)).toBe(day));

  it("every date is read in figures, solid and in ISO form", () => {
    fc.assert(
      fc.property(days, (date) => {
        const { year, month, day } = datePartsOf(date);
        const texts = [
          `${day}/${month}/${year}`,
          `${two(day)}.${two(month)}.${year}`,
          `${two(day)}${two(month)}${year}`,
          date,
        ];
        for (const text of texts) expect(readDate(text, today)).toBe(date);
      }),
    );
  });
});

describe("a date in relation to today, a Tuesday", () => {
  it.each([
    ["yesterday", "2026-11-30"],
    ["Today", today],
    ["TOMORROW", "2026-12-02"],
    ["thu", "2026-12-03"],
    ["next thurs", "2026-12-03"],
    ["this thursday", "2026-12-03"],
    ["last thu", "2026-11-26"],
    ["tue", "2026-12-08"],
    ["next tuesday", "2026-12-08"],
    ["this tue", today],
    ["last tue", "2026-11-24"],
    ["mon", "2026-12-07"],
    ["last mon", "2026-11-30"],
    ["in 2 weeks", "2026-12-15"],
    ["2 weeks", "2026-12-15"],
    ["1 day", "2026-12-02"],
    ["3 days ago", "2026-11-28"],
    ["in 1 month", "2027-01-01"],
    ["6 months ago", "2026-06-01"],
    ["in 0 days", today],
  ])("%s is %s", (text, day) => expect(readDate(text, today)).toBe(day));

  it("a month on from a long month's end is a short one's end", () => {
    expect(readDate("in 1 month", "2027-01-31")).toBe("2027-02-28");
    expect(readDate("in 1 month", "2028-01-31")).toBe("2028-02-29");
  });

  it("a weekday lies in the week ahead, in the week behind, or from today on", () => {
    const names = fc.constantFrom(...["Mon", "Tues", "Wednesday", "Thur", "Fri", "Satur", "Sun"].entries());
    fc.assert(
      fc.property(days, names, (from, [i, name]) => {
        const off = (text: string) => {
          const day = readDate(text, from) ?? "";
          expect(weekdayOf(day)).toBe(i + 1);
          return daysBetween(from, day);
        };
        expect(off(name)).toBe(off(`next ${name}`));
        expect(off(name)).toBeGreaterThanOrEqual(1);
        expect(off(name)).toBeLessThanOrEqual(7);
        expect(off(`this ${name}`)).toBe(off(name) % 7);
        expect(off(`last ${name}`)).toBeLessThanOrEqual(-1);
        expect(off(`last ${name}`)).toBeGreaterThanOrEqual(-7);
      }),
    );
  });
});

describe("a date of birth", () => {
  const born = (text: string, on = today) => readDate(text, on, { past: true });

  it.each([
    ["22 6 63", "1963-06-22"],
    ["22 6 26", "2026-06-22"],
    ["1 12 26", "2026-12-01"],
    ["2 12 26", "1926-12-02"],
    ["22/6/1926", "1926-06-22"],
    ["22 jun 63", "1963-06-22"],
    ["1 12", "2026-12-01"],
    ["2 12", "2025-12-02"],
    ["29 2", "2024-02-29"],
    ["29 2 00", "2000-02-29"],
    ["29 2 26", null],
    ["31 2", null],
  ])("%s is %s", (text, day) => expect(born(text)).toBe(day));

  it("a year of four figures is taken at its word", () => expect(born("2 12 2027")).toBe("2027-12-02"));

  it("the latest leap day may lie eight years back", () => {
    expect(born("29 2", "2104-02-28")).toBe("2096-02-29");
  });

  it("a last day of a month is not taken for one that is past", () => {
    expect(born("31 12", "2026-12-30")).toBe("2025-12-31");
    expect(born("31 12 26", "2026-12-30")).toBe("1926-12-31");
  });

  it("with two figures or none for the year it is the latest such day, and never after today", () => {
    fc.assert(
      fc.property(days, fc.nat({ max: 36_000 }), (on, ago) => {
        const date = addDays(on, -ago);
        const { year, month, day } = datePartsOf(date);
        expect(born(`${day} ${month} ${two(year % 100)}`, on)).toBe(date);
        const latest = born(`${day} ${month}`, on) ?? "";
        expect(latest <= on && latest >= date).toBe(true);
        expect(latest.slice(5)).toBe(date.slice(5));
      }),
    );
  });
});

describe("what is no date", () => {
  it.each([
    "",
    " ",
    "soon",
    "may",
    "mo",
    "6",
    "6 ma",
    "6 maybe",
    "0/5/2026",
    "6/0/2026",
    "32/1/2026",
    "6/13/2026",
    "31/4/2026",
    "6/5/226",
    "6/5/20266",
    "6//",
    "060526",
    "2026-5-6",
    "2026-02-30",
    "2026-13-01",
    "in weeks",
    "next",
    "next month",
    "last 6 may",
    "ana 6 may 2026",
    "constructor",
    "__proto__",
  ])("%s", (text) => expect(readDate(text, today)).toBeNull());

  it("nothing that is typed brings it down, and all that it gives is a date", () => {
    const piece = fc.constantFrom(
      "6",
      "31",
      "2026",
      "may",
      "feb",
      "thu",
      "next",
      "in",
      "ago",
      "weeks",
      "/",
      " ",
    );
    const typed = fc.oneof(
      fc.string(),
      fc.array(piece, { maxLength: 6 }).map((pieces) => pieces.join("")),
      fc.array(piece, { maxLength: 6 }).map((pieces) => pieces.join(" ")),
    );
    fc.assert(
      fc.property(typed, fc.boolean(), (text, past) => {
        const day = readDate(text, today, { past });
        if (day !== null) expect(addDays(day, 0)).toBe(day);
      }),
      { numRuns: 2000 },
    );
  });
});
