import { ageDebts, bucketOf, bucketOfDays } from "@withy/billing/ageing";
import { checkDiscount } from "@withy/billing/discount";
import { invoiceFields, maySimplify, missingFields, requiredFields } from "@withy/billing/invoice-form";
import { invoiceTotals, type TotalsLine, usualVatRounding } from "@withy/billing/invoice-totals";
import { annualInterest, fixedRecoverySum, statutoryInterest } from "@withy/billing/late-interest";
import { splitGross, vatNote, vatTenthsDown } from "@withy/billing/vat";
import { type Supply, usualVatLiability } from "@withy/billing/vat-liability";
import { allocate, divideRounded, formatMoney, parseMoney, shareOf } from "@withy/core/money";
import { Decimal } from "decimal.js";
import { dinero, allocate as dineroAllocate, toSnapshot } from "dinero.js";
import { GBP } from "dinero.js/currencies";
import { describe, expect, it } from "vitest";

const standard = (unitPricePence: number, more: Partial<TotalsLine> = {}): TotalsLine => ({
  quantity: 1,
  unitPricePence,
  isVatInclusive: false,
  discount: null,
  vatTreatment: "standard",
  ...more,
});
const exempt = (unitPricePence: number, more: Partial<TotalsLine> = {}) =>
  standard(unitPricePence, { vatTreatment: "exempt", ...more });

describe("liability (VAT Act 1994, Schedule 9, Group 7; HMRC VATHLT2010, VATHLT2290; Tax Adviser, December 2016)", () => {
  it.each<[Supply, string]>([
    ["treatment", "exempt"],
    ["supervised-class", "exempt"],
    ["consumable-in-treatment", "exempt"],
    ["goods", "standard"],
    ["unregistered-practitioner", "standard"],
    ["third-party-report", "standard"],
    ["subject-access-copy", "outside-scope"],
    ["room-rent", "exempt"],
    ["opted-room-rent", "standard"],
  ])("%s is %s", (supply, treatment) => {
    expect(usualVatLiability(supply).treatment).toBe(treatment);
  });

  it("flags occupational health and missed appointments for an adviser (VATHLT2310; Brief 13/2018 from memory)", () => {
    expect(usualVatLiability("occupational-health").needsAdviser).toBe(true);
    expect(usualVatLiability("missed-appointment-fee").needsAdviser).toBe(true);
  });

  it("shows no VAT and no number for a practice that is not registered", () => {
    const totals = invoiceTotals([standard(1799)], usualVatRounding, false);
    expect(totals.vatPence).toBe(0);
    expect(vatNote(totals.byTreatment, { vatNumber: null })).toEqual([]);
  });
});

describe("rounding (HMRC Notice 700, 17.5; VATREC12010)", () => {
  it.each([
    [1799, 360, 359, 2159],
    [3333, 667, 666, 4000],
    [12, 2, 2, 14],
    [1002, 200, 200, 1202],
    // 140.98 and 140.97: worked in a thread of the AAT's forum.
    [70488, 14098, 14097, 84586],
  ])("net %i: nearest %i, down %i, gross %i", (net, nearest, down, gross) => {
    const near = invoiceTotals([standard(net)], usualVatRounding, true);
    expect(near.vatPence).toBe(nearest);
    expect(near.grossPence).toBe(gross);
    expect(invoiceTotals([standard(net)], { per: "invoice", rounding: "down" }, true).vatPence).toBe(down);
    expect(new Decimal(net).times("0.2").toDecimalPlaces(0, Decimal.ROUND_HALF_UP).toNumber()).toBe(nearest);
  });

  it("rounds a line's 86.76p down to 86.7p, or to the nearest 87p (Notice 700's own example, from memory)", () => {
    expect(divideRounded(8676, 10, "down")).toBe(867);
    expect(divideRounded(8676, 100)).toBe(87);
    // 4.34 at 20% is 86.8p exactly: a line's tenth is kept as it stands.
    expect(vatTenthsDown(434, "standard")).toBe(868);
  });

  it.each([
    [1799, 1080, 1079],
    [1002, 600, 601],
  ])("three lines of %i: %i by line, %i by invoice", (net, byLine, byInvoice) => {
    const three = [standard(net), standard(net), standard(net)];
    expect(invoiceTotals(three, usualVatRounding, true).vatPence).toBe(byLine);
    expect(invoiceTotals(three, { per: "invoice", rounding: "nearest" }, true).vatPence).toBe(byInvoice);
  });

  it.each([
    [12000, 2000, 10000],
    [2500, 417, 2083],
    [999, 167, 832],
    [10000, 1667, 8333],
    [3000, 500, 2500],
  ])("gross %i holds VAT %i and net %i (VAT fraction 1/6)", (gross, vatPence, netPence) => {
    expect(splitGross(gross, "standard")).toEqual({ vatPence, netPence });
    expect(invoiceTotals([standard(gross, { isVatInclusive: true })], usualVatRounding, true)).toMatchObject({
      vatPence,
      netPence,
      grossPence: gross,
    });
  });

  it("charges a mixed invoice on its goods only", () => {
    const totals = invoiceTotals([exempt(6500), standard(1799)], usualVatRounding, true);
    expect(totals).toMatchObject({ netPence: 8299, vatPence: 360, grossPence: 8659 });
    expect(totals.byTreatment.find((t) => t.treatment === "standard")?.netPence).toBe(1799);
  });

  it("takes 10% off each line before VAT", () => {
    const discount = { kind: "percent", basisPoints: 1000 } as const;
    const totals = invoiceTotals(
      [exempt(6500, { discount }), standard(1799, { discount })],
      usualVatRounding,
      true,
    );
    expect(totals.lines.map((l) => l.netPence)).toEqual([5850, 1619]);
    expect(totals).toMatchObject({ vatPence: 324, grossPence: 7793 });
    expect(checkDiscount(6500, discount)).toBeNull();
  });

  it("does not fall into the binary trap of 1.005 (decimal.js)", () => {
    expect((1.005).toFixed(2)).toBe("1.00");
    expect(divideRounded(1005, 10)).toBe(101);
    expect(new Decimal("1.005").toDecimalPlaces(2, Decimal.ROUND_HALF_UP).toString()).toBe("1.01");
  });
});

describe("invoice fields (VAT record keeping: VAT invoices, gov.uk; VAT Regulations 1995, regulation 16A)", () => {
  it.each([
    [24999, true],
    [25000, true],
    [25001, false],
  ])("%i pence may be simplified: %s", (pence, may) => {
    expect(maySimplify(pence)).toBe(may);
  });

  it("asks the full form for what the table asks", () => {
    for (const field of [
      "number",
      "supplierName",
      "vatNumber",
      "issuedOn",
      "customerName",
      "customerAddress",
      "totalNet",
      "totalVat",
      "lineUnitPrice",
      "lineQuantity",
      "discountRate",
      "lineDescription",
      "lineVatRate",
    ] as const) {
      expect(requiredFields.full).toContain(field);
    }
    expect(requiredFields.full).not.toContain("totalGross");
  });

  it("asks the simplified form for the total with VAT, and for no customer", () => {
    expect(requiredFields.simplified).toContain("totalGross");
    for (const field of [
      "issuedOn",
      "customerName",
      "totalNet",
      "totalVat",
      "lineUnitPrice",
      "lineQuantity",
      "discountRate",
    ] as const) {
      expect(requiredFields.simplified).not.toContain(field);
    }
    const present = new Set(invoiceFields.filter((f) => f !== "totalGross"));
    const facts = { present, isVatRegistered: true, hasDiscount: false, hasOtherTaxPoint: false };
    expect(missingFields("simplified", facts)).toEqual(["totalGross"]);
  });
});

describe("late payment between businesses (Late commercial payments, gov.uk)", () => {
  it.each([
    // The first row is gov.uk's own example: 8.5%, £85.00 a year, 23p a day, £11.50.
    [100_000, 50, 50, 8500, 1164, 1150, 7000],
    [100_000, 375, 50, 11750, 1610, 1600, 7000],
    [250_000, 375, 90, 29375, 7243, 7200, 7000],
  ])(
    "%i pence at %i basis points for %i days",
    (debtPence, bankRateBasisPoints, daysLate, annual, exact, daily, fixed) => {
      const debt = { debtPence, bankRateBasisPoints, daysLate };
      expect(annualInterest(debt)).toBe(annual);
      expect(statutoryInterest(debt, "exact")).toBe(exact);
      expect(statutoryInterest(debt, "daily")).toBe(daily);
      expect(fixedRecoverySum(debtPence)).toBe(fixed);
    },
  );

  it.each([
    [99_999, 4000],
    [100_000, 7000],
    [999_999, 7000],
    [1_000_000, 10_000],
  ])("a debt of %i has the fixed sum %i", (debt, sum) => {
    expect(fixedRecoverySum(debt)).toBe(sum);
  });
});

describe("aged debt (buckets are common practice)", () => {
  const on = "2026-12-01";
  it.each([
    ["2026-11-01", "0-30"],
    ["2026-10-31", "31-60"],
    ["2026-10-02", "31-60"],
    ["2026-10-01", "61-90"],
    ["2026-09-02", "61-90"],
    ["2026-09-01", "over-90"],
  ])("%s falls into %s", (day, bucket) => {
    expect(bucketOf({ issuedOn: day, dueOn: day, owedPence: 1 }, on, "issued")).toBe(bucket);
    expect(bucketOf({ issuedOn: day, dueOn: day, owedPence: 1 }, on, "due")).toBe(bucket);
  });

  it("keeps what is not yet due in a column of its own", () => {
    const aged = ageDebts([{ issuedOn: "2026-09-01", dueOn: "2026-12-31", owedPence: 37200 }], on, "issued");
    expect(aged["not-due"]).toBe(37200);
    expect(aged.totalPence).toBe(37200);
    expect(bucketOfDays(91)).toBe("over-90");
  });
});

describe("splits and shares", () => {
  it("splits £100.00 three ways as dinero.js does", () => {
    const parts = dineroAllocate(dinero({ amount: 10000, currency: GBP }), [1, 1, 1]).map(
      (d) => toSnapshot(d).amount,
    );
    expect(parts).toEqual([3334, 3333, 3333]);
    expect(allocate(10000, [1, 1, 1])).toEqual(parts);
  });

  it("reckons a card fee of 1.4% and 20p on £65.00: an expense, not off the invoice", () => {
    const fee = shareOf(6500, 140) + 20;
    expect(fee).toBe(111);
    expect(6500 - fee).toBe(6389);
  });

  it("reads and writes money alike", () => {
    expect(parseMoney("£1,234.50")).toBe(123450);
    expect(formatMoney(123450)).toBe("£1,234.50");
  });
});
