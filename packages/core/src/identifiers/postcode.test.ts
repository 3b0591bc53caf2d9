import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { hasPostcodeShape, normalisePostcode } from "./postcode";

// ZZ is no postcode area, and Z is no second letter: these can be put in order and have not the shape.
describe("putting a postcode in order", () => {
  it.each([
    ["zz11aa", "ZZ1 1AA"],
    ["ZZ1 1AA", "ZZ1 1AA"],
    [" z z 1 1 a a ", "ZZ1 1AA"],
    ["zz10-1aa", "ZZ10 1AA"],
    ["ZZ1A.1AA", "ZZ1A 1AA"],
    ["gir0aa", "GIR 0AA"],
    ["zz1", "ZZ1"],
    ["", ""],
    ["D02 X285", "D02X 285"],
  ])("%s becomes %s", (text, expected) => expect(normalisePostcode(text)).toBe(expected));

  it("leaves alone what is in order, and asks the same of any writing of it", () => {
    const typed = fc.oneof(fc.string(), fc.stringMatching(/^[a-z]{1,2}\d[a-z\d]? ?\d[a-z]{2}$/));
    fc.assert(
      fc.property(typed, (text) => {
        const ordered = normalisePostcode(text);
        expect(normalisePostcode(ordered)).toBe(ordered);
        expect(normalisePostcode(text.toLowerCase())).toBe(
          normalisePostcode(text.toLowerCase().toUpperCase()),
        );
        expect(hasPostcodeShape(text)).toBe(hasPostcodeShape(ordered));
      }),
    );
  });
});

describe("the shape", () => {
  it.each(["sw1a1aa", "m1-1ae", " n1c 4ag ", "gir 0aa"])("%s has it", (text) => {
    expect(hasPostcodeShape(text)).toBe(true);
  });

  it.each([
    "",
    "ZZ1",
    "1AA",
    "M 1AE",
    "ZZ1 1AA",
    "ABC1 1AA",
    "M1 AAA",
    "M1 11A",
    "GIR 1AA",
    "XGIR 0AA",
    "D02 X285",
  ])("%s has not", (text) => expect(hasPostcodeShape(text)).toBe(false));
});
