import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { paymentMethods } from "./check-payment";
import { checkRefund, type RefundablePayment, type RefundWish } from "./check-refund";

const cash: RefundablePayment = { method: "cash", amountPence: 6200, refundedPence: 0 };
const wish: RefundWish = { amountPence: 6200, method: "cash", reason: "Class was cancelled" };

describe("giving money back", () => {
  it.each<[Partial<RefundablePayment>, Partial<RefundWish>, string | null]>([
    [{}, {}, null],
    [{}, { amountPence: 6201 }, "more-than-paid"],
    [{ refundedPence: 200 }, { amountPence: 6001 }, "more-than-paid"],
    [{ refundedPence: 200 }, { amountPence: 6000 }, null],
    [{ refundedPence: 6200 }, {}, "already-refunded"],
    [{}, { amountPence: 0 }, "amount-not-positive"],
    [{}, { method: "card" }, "not-paid-by-card"],
    [{ method: "card" }, { method: "cash" }, "card-to-card"],
    [{ method: "card" }, { method: "card" }, null],
    [{ method: "terminal" }, { method: "bank" }, null],
    [{}, { reason: "  " }, "reason-missing"],
  ])("%o with %o answers %s", (payment, more, kind) => {
    expect(checkRefund({ ...cash, ...payment }, { ...wish, ...more })?.kind ?? null).toBe(kind);
  });

  it("never gives back more than was paid", () => {
    const method = fc.constantFrom(...paymentMethods);
    const money = fc.integer({ min: 0, max: 100_000 });
    fc.assert(
      fc.property(
        method,
        money,
        money,
        method,
        fc.integer(),
        (paidBy, amountPence, refundedPence, by, amount) => {
          const payment = { method: paidBy, amountPence, refundedPence };
          if (checkRefund(payment, { amountPence: amount, method: by, reason: "Paid twice" }) !== null)
            return;
          expect(amount).toBeGreaterThan(0);
          expect(refundedPence + amount).toBeLessThanOrEqual(amountPence);
        },
      ),
    );
  });
});
