import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { formatInvoiceNumber, readInvoiceNumber } from "./invoice-number";

describe("invoice numbers", () => {
  it.each([
    [{ prefix: "SG", digits: 5 }, 4187, "SG-04187"],
    [{ prefix: "", digits: 5 }, 4187, "04187"],
    [{ prefix: "SG", digits: 5 }, 123456, "SG-123456"],
    [{ prefix: "INV26", digits: 1 }, 1, "INV26-1"],
  ])("%o and %i make %s", (form, counter, number) => {
    expect(formatInvoiceNumber(form, counter)).toBe(number);
  });

  it.each([0, -1, 1.5])("refuses the counter %d", (counter) => {
    expect(() => formatInvoiceNumber({ prefix: "SG", digits: 5 }, counter)).toThrow(RangeError);
  });

  it("refuses a prefix that could not be read back", () => {
    expect(() => formatInvoiceNumber({ prefix: "S G", digits: 5 }, 1)).toThrow(RangeError);
  });

  it.each([
    [" sg 4187 ", { prefix: "SG", counter: 4187 }],
    ["SG-04187", { prefix: "SG", counter: 4187 }],
    ["04187", { prefix: "", counter: 4187 }],
    ["SG-", null],
    ["00000", null],
    ["lamptey", null],
  ])("reads %s", (text, read) => {
    expect(readInvoiceNumber(text)).toEqual(read);
  });

  it("reads back what it wrote, and two counters never share a number", () => {
    const counter = fc.integer({ min: 1, max: 999_999_999 });
    const prefix = fc.constantFrom("", "SG", "TL", "INV26", "7");
    fc.assert(
      fc.property(prefix, fc.integer({ min: 1, max: 9 }), counter, counter, (p, digits, a, b) => {
        const form = { prefix: p, digits };
        expect(readInvoiceNumber(formatInvoiceNumber(form, a))).toEqual({ prefix: p, counter: a });
        expect(formatInvoiceNumber(form, a) === formatInvoiceNumber(form, b)).toBe(a === b);
      }),
    );
  });
});
