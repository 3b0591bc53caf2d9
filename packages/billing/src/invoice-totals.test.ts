import { sumPence } from "@withy/core/money";
import { Decimal } from "decimal.js";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { invoiceTotals, type TotalsLine, usualVatRounding, type VatRounding } from "./invoice-totals";
import { vatTreatments } from "./vat";

const line = (unitPricePence: number, more: Partial<TotalsLine> = {}): TotalsLine => ({
  quantity: 1,
  unitPricePence,
  isVatInclusive: false,
  discount: null,
  vatTreatment: "standard",
  ...more,
});

const rules: VatRounding[] = [
  { per: "line", rounding: "nearest" },
  { per: "line", rounding: "down" },
  { per: "invoice", rounding: "nearest" },
  { per: "invoice", rounding: "down" },
];

const lines = fc.array(
  fc.record<TotalsLine>({
    quantity: fc.integer({ min: 1, max: 40 }),
    unitPricePence: fc.integer({ min: 0, max: 500_000 }),
    isVatInclusive: fc.boolean(),
    vatTreatment: fc.constantFrom(...vatTreatments),
    discount: fc.option(
      fc.record({ kind: fc.constant("percent" as const), basisPoints: fc.integer({ min: 0, max: 10_000 }) }),
    ),
  }),
  { maxLength: 12 },
);

describe("invoice totals", () => {
  it("charges VAT on the goods only", () => {
    const totals = invoiceTotals(
      [line(6200, { quantity: 3, vatTreatment: "exempt" }), line(1000)],
      usualVatRounding,
      true,
    );
    expect(totals).toMatchObject({ netPence: 19600, vatPence: 200, grossPence: 19800 });
    expect(totals.byTreatment).toEqual([
      { treatment: "exempt", netPence: 18600, vatPence: 0 },
      { treatment: "standard", netPence: 1000, vatPence: 200 },
    ]);
  });

  it("keeps a shelf price whole", () => {
    const totals = invoiceTotals([line(999, { isVatInclusive: true })], usualVatRounding, true);
    expect(totals.lines[0]).toEqual({ discountPence: 0, netPence: 832, vatPence: 167, grossPence: 999 });
  });

  it("charges no VAT where the practice is not registered", () => {
    expect(invoiceTotals([line(1799)], usualVatRounding, false)).toMatchObject({
      vatPence: 0,
      grossPence: 1799,
    });
  });

  it("adds up to nothing without lines", () => {
    expect(invoiceTotals([], usualVatRounding, true)).toMatchObject({
      netPence: 0,
      grossPence: 0,
      byTreatment: [],
    });
  });

  it("prints columns that add up, under every rule", () => {
    fc.assert(
      fc.property(lines, fc.constantFrom(...rules), fc.boolean(), (items, rule, isRegistered) => {
        const totals = invoiceTotals(items, rule, isRegistered);
        for (const column of ["netPence", "vatPence", "grossPence", "discountPence"] as const) {
          expect(sumPence(totals.lines.map((l) => l[column]))).toBe(totals[column]);
        }
        expect(sumPence(totals.byTreatment.map((t) => t.vatPence))).toBe(totals.vatPence);
        totals.lines.forEach((l, i) => {
          expect(l.netPence + l.vatPence).toBe(l.grossPence);
          expect(l.vatPence).toBeGreaterThanOrEqual(0);
          if (items[i]?.vatTreatment !== "standard") expect(l.vatPence).toBe(0);
        });
      }),
    );
  });

  it("agrees with decimal.js on VAT that comes on top", () => {
    const onTop = lines.map((items) => items.map((l) => ({ ...l, isVatInclusive: false, discount: null })));
    fc.assert(
      fc.property(onTop, fc.constantFrom(...rules), (items, rule) => {
        const exact = items.map((l) =>
          new Decimal(l.unitPricePence).times(l.quantity).times(l.vatTreatment === "standard" ? "0.2" : 0),
        );
        const mode = rule.rounding === "nearest" ? Decimal.ROUND_HALF_UP : Decimal.ROUND_DOWN;
        const places = rule.per === "invoice" ? 20 : rule.rounding === "nearest" ? 0 : 1;
        const sum = exact.reduce((a, v) => a.plus(v.toDecimalPlaces(places, mode)), new Decimal(0));
        expect(invoiceTotals(items, rule, true).vatPence).toBe(sum.toDecimalPlaces(0, mode).toNumber());
      }),
    );
  });

  it("agrees with decimal.js on VAT inside shelf prices, which is never rounded down", () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 10_000_000 }), fc.constantFrom(...rules), (gross, rule) => {
        const expected = new Decimal(gross).div(6).toDecimalPlaces(0, Decimal.ROUND_HALF_UP).toNumber();
        const totals = invoiceTotals([line(gross, { isVatInclusive: true })], rule, true);
        expect(totals.vatPence).toBe(expected);
        expect(totals.grossPence).toBe(gross);
      }),
    );
  });

  it("refuses sums that a computer cannot hold exactly", () => {
    expect(() =>
      invoiceTotals([line(Number.MAX_SAFE_INTEGER, { quantity: 2 })], usualVatRounding, true),
    ).toThrow(RangeError);
  });
});
