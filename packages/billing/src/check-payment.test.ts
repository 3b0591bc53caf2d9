import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { checkPayment, type PayableInvoice } from "./check-payment";
import { invoiceStates, owingStates } from "./invoice-states";

const owing: PayableInvoice = { state: "issued", owedPence: 18600, freePence: 18600 };

describe("taking a payment", () => {
  it.each<[Partial<PayableInvoice>, number, string | null]>([
    [{}, 18600, null],
    [{}, 1, null],
    [{}, 18601, "more-than-owed"],
    [{}, 0, "amount-not-positive"],
    [{}, -5, "amount-not-positive"],
    [{}, 10.5, "amount-not-positive"],
    [{ freePence: 0 }, 1, "card-payment-open"],
    [{ freePence: 8600 }, 8600, null],
    [{ freePence: 8600 }, 8601, "card-payment-open"],
    [{ state: "draft" }, 100, "invoice-draft"],
    [{ state: "void" }, 100, "invoice-void"],
    [{ state: "paid", owedPence: 0 }, 100, "invoice-paid"],
    [{ state: "refunded", owedPence: 0 }, 100, "invoice-refunded"],
  ])("%o and %i pence answers %s", (more, amount, kind) => {
    expect(checkPayment({ ...owing, ...more }, amount)?.kind ?? null).toBe(kind);
  });

  it("names the field and what is owed", () => {
    expect(checkPayment(owing, 20000)).toEqual({
      kind: "more-than-owed",
      message: "Only £186.00 is owed. Enter that or less.",
      field: "amountPence",
    });
  });

  it("never lets more in than is owed and free", () => {
    const money = fc.integer({ min: 0, max: 1_000_000 });
    fc.assert(
      fc.property(
        fc.constantFrom(...invoiceStates),
        money,
        money,
        fc.integer(),
        (state, owedPence, freePence, amount) => {
          if (checkPayment({ state, owedPence, freePence }, amount) !== null) return;
          expect(owingStates).toContain(state);
          expect(amount).toBeGreaterThan(0);
          expect(amount).toBeLessThanOrEqual(Math.min(owedPence, freePence));
        },
      ),
    );
  });
});
