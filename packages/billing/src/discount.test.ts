import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { checkDiscount, type Discount, discountPence } from "./discount";

describe("discount", () => {
  it.each<[number, Discount | null, number]>([
    [6500, { kind: "percent", basisPoints: 1000 }, 650],
    [1799, { kind: "percent", basisPoints: 1000 }, 180],
    [1799, { kind: "amount", pence: 99 }, 99],
    [1799, null, 0],
  ])("%i less %o is %i off", (amount, discount, off) => {
    expect(discountPence(amount, discount)).toBe(off);
  });

  it.each<[Discount, string | null]>([
    [{ kind: "percent", basisPoints: 10_000 }, null],
    [{ kind: "percent", basisPoints: 10_001 }, "discount-too-large"],
    [{ kind: "amount", pence: 500 }, null],
    [{ kind: "amount", pence: 501 }, "discount-too-large"],
    [{ kind: "amount", pence: -1 }, "discount-below-zero"],
    [{ kind: "amount", pence: 0.5 }, "discount-below-zero"],
  ])("on £5.00, %o answers %s", (discount, kind) => {
    expect(checkDiscount(500, discount)?.kind ?? null).toBe(kind);
  });

  it("never takes off more than there is", () => {
    const discounts = fc.oneof(
      fc.record({ kind: fc.constant("percent" as const), basisPoints: fc.integer({ min: 0, max: 10_000 }) }),
      fc.record({ kind: fc.constant("amount" as const), pence: fc.integer({ min: 0, max: 100_000_000 }) }),
    );
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 100_000_000 }), discounts, (amount, discount) => {
        fc.pre(checkDiscount(amount, discount) === null);
        const off = discountPence(amount, discount);
        expect(off).toBeGreaterThanOrEqual(0);
        expect(off).toBeLessThanOrEqual(amount);
      }),
    );
  });
});
