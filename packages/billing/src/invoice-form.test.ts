import { describe, expect, it } from "vitest";
import { type InvoiceField, invoiceFields, maySimplify, missingFields } from "./invoice-form";

const all = {
  present: new Set(invoiceFields),
  isVatRegistered: true,
  hasOtherTaxPoint: true,
  hasDiscount: true,
};
const without = (...fields: InvoiceField[]) => ({
  ...all,
  present: new Set(invoiceFields.filter((f) => !fields.includes(f))),
});

describe("invoice forms", () => {
  it.each([
    [24999, true],
    [25000, true],
    [25001, false],
  ])("%i pence may be simplified: %s", (pence, may) => {
    expect(maySimplify(pence)).toBe(may);
  });

  it("asks nothing more of a whole invoice", () => {
    expect(missingFields("full", all)).toEqual([]);
    expect(missingFields("simplified", all)).toEqual([]);
  });

  it("needs the customer on the full form only", () => {
    expect(missingFields("full", without("customerName", "customerAddress"))).toEqual([
      "customerName",
      "customerAddress",
    ]);
    expect(missingFields("simplified", without("customerName", "customerAddress"))).toEqual([]);
  });

  it("needs the total with VAT on the simplified form only", () => {
    expect(missingFields("simplified", without("totalGross"))).toEqual(["totalGross"]);
    expect(missingFields("full", without("totalGross"))).toEqual([]);
  });

  it("asks for no VAT number of a practice that is not registered", () => {
    const facts = { ...without("vatNumber", "lineVatRate", "totalVat"), isVatRegistered: false };
    expect(missingFields("full", facts)).toEqual([]);
  });

  it("asks for discount and tax point only where there is one", () => {
    const facts = { ...without("discountRate", "taxPoint"), hasDiscount: false, hasOtherTaxPoint: false };
    expect(missingFields("full", facts)).toEqual([]);
    expect(missingFields("full", without("discountRate", "taxPoint"))).toEqual(["taxPoint", "discountRate"]);
  });
});
