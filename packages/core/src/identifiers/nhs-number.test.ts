import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { formatNhsNumber, isNhsNumber, nhsCheckDigit, readNhsNumber } from "./nhs-number";

// Values that are published stand in tests/published; here are the laws that hold for every number.
const bases = fc.stringMatching(/^\d{9}$/);
const numbers = bases
  .map((base) => ({ base, check: nhsCheckDigit(base) }))
  .filter(({ check }) => check !== null)
  .map(({ base, check }) => `${base}${check}`)
  .filter((digits) => !/^(\d)\1{9}$/.test(digits));
const place = fc.nat({ max: 9 });

describe("the check digit", () => {
  it("is the one digit that completes nine others, or there is none", () => {
    fc.assert(
      fc.property(bases, (base) => {
        fc.pre(!/^(\d)\1{8}$/.test(base));
        const fitting = Array.from({ length: 10 }, (_, d) => d).filter((d) => isNhsNumber(`${base}${d}`));
        const check = nhsCheckDigit(base);
        expect(fitting).toEqual(check === null ? [] : [check]);
      }),
    );
  });

  it("makes the weighted sum of all ten a multiple of eleven", () => {
    fc.assert(
      fc.property(numbers, (digits) => {
        const sum = [...digits].reduce((total, digit, i) => total + Number(digit) * (10 - i), 0);
        expect(sum % 11).toBe(0);
      }),
    );
  });

  it("finds one digit mistyped", () => {
    fc.assert(
      fc.property(numbers, place, fc.integer({ min: 1, max: 9 }), (digits, at, by) => {
        const wrong = `${digits.slice(0, at)}${(Number(digits[at]) + by) % 10}${digits.slice(at + 1)}`;
        expect(isNhsNumber(wrong)).toBe(false);
      }),
    );
  });

  it("finds any two digits changed round", () => {
    fc.assert(
      fc.property(numbers, place, place, (digits, i, j) => {
        fc.pre(digits[i] !== digits[j]);
        const swapped = [...digits];
        [swapped[i], swapped[j]] = [digits[j] ?? "", digits[i] ?? ""];
        expect(isNhsNumber(swapped.join(""))).toBe(false);
      }),
    );
  });
});

describe("as it is typed and shown", () => {
  it("what is shown is read back", () => {
    fc.assert(
      fc.property(numbers, (digits) => {
        expect(formatNhsNumber(digits)).toMatch(/^\d{3} \d{3} \d{4}$/);
        expect(readNhsNumber(formatNhsNumber(digits))).toBe(digits);
      }),
    );
  });

  it.each(["9990000018", "999-000-0018", " 999 000 0018 ", "99 90 00 00 18", "999\t000\u00A00018"])(
    "%s is read",
    (text) => expect(readNhsNumber(text)).toBe("9990000018"),
  );

  it.each(["999.000.0018", "999/000/0018", "+9990000018", "9990000018 NHS", "٩٩٩٠٠٠٠٠١٨", "- -"])(
    "%s is not",
    (text) => expect(readNhsNumber(text)).toBeNull(),
  );
});
