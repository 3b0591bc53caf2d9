import { Decimal } from "decimal.js";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  allocate,
  assertPence,
  divideRounded,
  formatMoney,
  parseMoney,
  type Rounding,
  shareOf,
  sumPence,
} from "./money";

// Whole quotients of two safe integers need far fewer digits than these to be told from a half.
const Exact = Decimal.clone({ precision: 60 });
const modes = [
  ["nearest", Decimal.ROUND_HALF_UP],
  ["down", Decimal.ROUND_DOWN],
] as const;
const safe = fc.maxSafeInteger();
const divisor = safe.filter((n) => n !== 0);

describe("a division rounded to whole pence", () => {
  it.each<[number, number, Rounding, number]>([
    [5, 2, "nearest", 3],
    [-5, 2, "nearest", -3],
    [5, -2, "nearest", -3],
    [-5, -2, "nearest", 3],
    [7, 3, "nearest", 2],
    [8, 3, "nearest", 3],
    [8, 3, "down", 2],
    [-8, 3, "down", -2],
    [0, 7, "nearest", 0],
    [-1, 3, "nearest", 0],
  ])("%i / %i, %s, is %i", (numerator, denominator, rounding, whole) => {
    expect(divideRounded(numerator, denominator, rounding)).toBe(whole);
  });

  it.each(modes)("%s agrees with decimal.js for any whole numbers", (rounding, mode) => {
    const check = (n: number, d: number) => {
      const expected = new Exact(n).div(d).toDecimalPlaces(0, mode).plus(0).toNumber();
      expect(divideRounded(n, d, rounding)).toBe(expected === 0 ? 0 : expected);
    };
    fc.assert(fc.property(safe, divisor, check));
    // Small numbers meet the halves, which chance does not find among large ones.
    fc.assert(fc.property(fc.integer({ min: -999, max: 999 }), fc.integer({ min: 1, max: 20 }), check));
  });

  it("is exact where numbers no longer are", () => {
    expect(divideRounded(10n ** 30n + 1n, 10n ** 20n)).toBe(10_000_000_000);
    expect(divideRounded(15n * 10n ** 29n, 10n ** 30n)).toBe(2);
  });

  it("refuses to divide by nothing, parts of a penny and sums too large to keep", () => {
    expect(() => divideRounded(1, 0)).toThrow(RangeError);
    expect(() => divideRounded(0.5, 2)).toThrow(RangeError);
    expect(() => divideRounded(10n ** 30n, 1)).toThrow(RangeError);
  });
});

describe("a share in basis points", () => {
  it.each([
    [1799, 2000, 360],
    [-1799, 2000, -360],
    [50, 100, 1],
    [49, 100, 0],
    [12_345, 10_000, 12_345],
    [12_345, 0, 0],
  ])("%i at %i is %i", (amount, basisPoints, share) => expect(shareOf(amount, basisPoints)).toBe(share));

  it("goes towards zero when it is told to", () => {
    expect(shareOf(1799, 2000, "down")).toBe(359);
    expect(shareOf(-1799, 2000, "down")).toBe(-359);
  });
});

it("a sum stays whole and safe", () => {
  expect(sumPence([])).toBe(0);
  expect(sumPence([1, -2, 300])).toBe(299);
  expect(() => sumPence([0.1, 0.2])).toThrow(RangeError);
  expect(() => sumPence([Number.MAX_SAFE_INTEGER, 1])).toThrow(RangeError);
  expect(() => assertPence(Number.NaN)).toThrow("whole number of pence");
});

describe("an amount split by weights", () => {
  const weights = fc
    .array(fc.oneof(fc.maxSafeNat(), fc.nat({ max: 12 })), { minLength: 1, maxLength: 12 })
    .filter((list) => list.some((w) => w > 0));

  it.each([
    [100, [1, 1, 1], [34, 33, 33]],
    [-100, [1, 1, 1], [-34, -33, -33]],
    [5, [0, 3, 7], [0, 2, 3]],
    [2, [0, 1, 0, 1, 1], [0, 1, 0, 1, 0]],
    [0, [1, 2], [0, 0]],
    [1, [1], [1]],
  ])("%i by %j is %j", (amount, by, parts) => expect(allocate(amount, by)).toEqual(parts));

  it("adds up to it again", () => {
    fc.assert(
      fc.property(safe, weights, (amount, by) => {
        expect(sumPence(allocate(amount, by))).toBe(amount);
      }),
    );
  });

  it("gives each part its exact share to within a penny, and nothing for no weight", () => {
    fc.assert(
      fc.property(safe, weights, (amount, by) => {
        const total = by.reduce((sum, w) => sum + BigInt(w), 0n);
        for (const [i, part] of allocate(amount, by).entries()) {
          const off = BigInt(part) * total - BigInt(amount) * BigInt(by[i] ?? 0);
          expect(off <= total && off >= -total).toBe(true);
          if (by[i] === 0) expect(part).toBe(0);
        }
      }),
    );
  });

  it("treats equals alike, the first by a penny better at most", () => {
    fc.assert(
      fc.property(fc.maxSafeNat(), fc.integer({ min: 1, max: 40 }), (amount, count) => {
        const parts = allocate(
          amount,
          Array.from({ length: count }, () => 1),
        );
        expect(parts).toEqual([...parts].sort((a, b) => b - a));
        expect((parts.at(0) ?? 0) - (parts.at(-1) ?? 0)).toBeLessThanOrEqual(1);
      }),
    );
  });

  it.each([[[]], [[0, 0]], [[1, -1]], [[0.5]], [[Number.NaN]]])("refuses the weights %j", (by) => {
    expect(() => allocate(100, by)).toThrow("Weights must be whole numbers");
  });
});

describe("money in words", () => {
  it.each([
    [0, "£0.00"],
    [5, "£0.05"],
    [50, "£0.50"],
    [-500, "−£5.00"],
    [99_999, "£999.99"],
    [100_000, "£1,000.00"],
    [123_456_789, "£1,234,567.89"],
  ])("%i is written %s", (pence, text) => expect(formatMoney(pence)).toBe(text));

  it("names other currencies", () => {
    expect(formatMoney(6500, "EUR")).toBe("€65.00");
    expect(formatMoney(-6500, "USD")).toBe("−USD 65.00");
  });

  it.each([
    ["65", 6500],
    ["65.5", 6550],
    [" £ 65.05 ", 6505],
    ["1,234.50", 123_450],
    ["-5", -500],
    ["−£5.00", -500],
    ["-0", 0],
    ["007", 700],
  ])("%s is read as %i", (text, pence) => expect(parseMoney(text)).toBe(pence));

  it.each([
    "",
    "£",
    "65.",
    ".50",
    "65.005",
    "1,23",
    "12,34,567",
    "1234,567",
    "€65",
    "65p",
    "1e3",
    "--5",
    "sixty",
    "999,999,999,999,999,999",
    "£90,071,992,547,409.92",
  ])("%s is no amount", (text) => expect(parseMoney(text)).toBeNull());

  it("what is written is read back", () => {
    fc.assert(
      fc.property(safe, (pence) => {
        expect(parseMoney(formatMoney(pence))).toBe(pence);
      }),
    );
  });
});
