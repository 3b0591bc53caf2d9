import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { ageBuckets, ageDebts, bucketOf, bucketOfDays } from "./ageing";

const on = "2026-12-01";

describe("ageing", () => {
  it.each([
    [0, "0-30"],
    [30, "0-30"],
    [31, "31-60"],
    [60, "31-60"],
    [61, "61-90"],
    [90, "61-90"],
    [91, "over-90"],
  ] as const)("%i days fall into %s", (days, bucket) => {
    expect(bucketOfDays(days)).toBe(bucket);
  });

  it("keeps what is not yet due apart, on either basis", () => {
    const debt = { issuedOn: "2026-10-01", dueOn: "2026-12-02", owedPence: 100 };
    expect(bucketOf(debt, on, "due")).toBe("not-due");
    expect(bucketOf(debt, on, "issued")).toBe("not-due");
    expect(bucketOf(debt, "2026-12-02", "due")).toBe("0-30");
    expect(bucketOf(debt, "2026-12-02", "issued")).toBe("61-90");
  });

  it("sorts every debt into one bucket", () => {
    const date = fc
      .integer({ min: 0, max: 400 })
      .map((d) => new Date(Date.UTC(2026, 0, 1 + d)).toISOString().slice(0, 10));
    const debts = fc.array(
      fc.record({ issuedOn: date, dueOn: date, owedPence: fc.integer({ min: 0, max: 90_000 }) }),
    );
    fc.assert(
      fc.property(debts, fc.constantFrom("issued" as const, "due" as const), (owed, basis) => {
        const aged = ageDebts(owed, on, basis);
        expect(ageBuckets.reduce((sum, b) => sum + aged[b], 0)).toBe(aged.totalPence);
      }),
    );
  });
});
