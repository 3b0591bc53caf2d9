import { expect, test } from "vitest";
import { monthAddress, monthOn, usualMonth } from "./month-address";

test.each([
  ["2026-11", 1, "2026-12"],
  ["2026-12", 1, "2027-01"],
  ["2026-01", -1, "2025-12"],
  ["2026-06", 0, "2026-06"],
])("%s and %i is %s", (month, by, expected) => {
  expect(monthOn(month, by)).toBe(expected);
});

test("the month just ended in the first week, then the present one", () => {
  expect(usualMonth("2026-12-01")).toBe("2026-11");
  expect(usualMonth("2026-12-08")).toBe("2026-12");
  expect(usualMonth("2027-01-07")).toBe("2026-12");
});

test("an address keeps the site", () => {
  expect(monthAddress("2026-11", "s1")).toBe("/reports/month?month=2026-11&siteId=s1");
  expect(monthAddress("2026-11", null)).toBe("/reports/month?month=2026-11");
});
