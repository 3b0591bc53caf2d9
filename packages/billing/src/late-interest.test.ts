import { describe, expect, it } from "vitest";
import {
  annualInterest,
  checkLateInterest,
  fixedRecoverySum,
  referenceRate,
  statutoryInterest,
} from "./late-interest";

describe("statutory interest", () => {
  it("is simple: twice the days, twice the daily sum", () => {
    const debt = { debtPence: 100_000, bankRateBasisPoints: 50, daysLate: 50 };
    expect(annualInterest(debt)).toBe(8500);
    expect(statutoryInterest({ ...debt, daysLate: 100 }, "daily")).toBe(2 * statutoryInterest(debt, "daily"));
    expect(statutoryInterest({ ...debt, daysLate: 0 }, "exact")).toBe(0);
    expect(statutoryInterest({ ...debt, daysLate: -3 }, "daily")).toBe(0);
  });

  it("takes the Bank Rate that was fixed for the half-year", () => {
    const rates = [
      { from: "2025-01-01", basisPoints: 475 },
      { from: "2026-03-01", basisPoints: 400 },
      { from: "2026-08-01", basisPoints: 375 },
    ];
    expect(referenceRate(rates, "2026-06-30")).toBe(475);
    expect(referenceRate(rates, "2026-07-01")).toBe(400);
    expect(referenceRate(rates, "2027-01-01")).toBe(375);
    expect(referenceRate(rates, "2024-05-05")).toBeNull();
  });

  it("is never claimed from a patient, nor before the debt is late", () => {
    expect(checkLateInterest("patient", 40)?.kind).toBe("not-a-business");
    expect(checkLateInterest("insurer", 0)?.kind).toBe("not-late");
    expect(checkLateInterest("employer", 1)).toBeNull();
  });

  it.each([
    [99_999, 4000],
    [100_000, 7000],
    [999_999, 7000],
    [1_000_000, 10_000],
  ])("%i pence: fixed sum %i", (debt, sum) => {
    expect(fixedRecoverySum(debt)).toBe(sum);
  });
});
