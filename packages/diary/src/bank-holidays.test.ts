import { weekdayOf } from "@withy/core/zoned-time";
import { describe, expect, it } from "vitest";
import { bankHolidayOn, bankHolidays, nations } from "./bank-holidays";

describe("bank holidays", () => {
  it("never fall on a weekend, over twenty years and all four nations", () => {
    for (const nation of nations)
      for (let year = 2020; year < 2040; year += 1) {
        const days = bankHolidays(nation, year).map((h) => h.on);
        expect(days.every((d) => weekdayOf(d) <= 5)).toBe(true);
        expect(new Set(days).size).toBe(days.length);
        expect(days.length).toBeGreaterThanOrEqual(8);
      }
  });

  it("differ between nations", () => {
    expect(bankHolidayOn("england", "2026-04-06")?.name).toBe("Easter Monday");
    expect(bankHolidayOn("scotland", "2026-04-06")).toBeNull();
    expect(bankHolidayOn("scotland", "2026-06-15")?.name).toBe("World Cup bank holiday");
    expect(bankHolidayOn("wales", "2026-06-15")).toBeNull();
    expect(bankHolidayOn("northern-ireland", "2026-03-17")).not.toBeNull();
  });
});
