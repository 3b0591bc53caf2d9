import {
  formatNhsNumber,
  isNhsNumber,
  nhsCheckDigit,
  readNhsNumber,
} from "@withy/core/identifiers/nhs-number";
import { formatPhone, readPhone } from "@withy/core/identifiers/phone";
import { hasPostcodeShape, normalisePostcode } from "@withy/core/identifiers/postcode";
import { readHcpcNumber } from "@withy/core/identifiers/registration";
import fc from "fast-check";
import nhsNumberValidator from "nhs-number-validator";
import { describe, expect, test } from "vitest";

const { validate } = nhsNumberValidator;

// Modulus 11 over weights 10 to 2. Source: NHS Data Dictionary, NHS NUMBER; 943 476 5919 is its public example.
describe("NHS number", () => {
  test.each(["943 476 5919", "450 557 7104", "123 456 7881", "999 000 0018", "999 000 0123"])(
    "%s is valid",
    (text) => {
      const digits = text.replaceAll(" ", "");
      expect(readNhsNumber(text)).toBe(digits);
      expect(formatNhsNumber(digits)).toBe(text);
      expect(validate(digits)).toBe(true);
    },
  );

  test.each([
    ["a wrong check digit", "943 476 5918"],
    ["a check digit that does not exist", "123 456 7890"],
    ["digits changed round", "934 376 5919"],
    ["digits changed round at the end", "943 476 9519"],
    ["nine digits", "943476591"],
    ["eleven digits", "94347659190"],
    ["a letter", "943476591X"],
    ["nothing", ""],
  ])("%s is refused", (_what, text) => {
    expect(readNhsNumber(text)).toBeNull();
  });

  test.each(["999123456", "999000000", "999000014", "999000028", "999000031"])(
    "%s has no check digit",
    (base) => {
      expect(nhsCheckDigit(base)).toBeNull();
    },
  );

  // Numbers from 999 000 0000 are set aside for tests (docs of the nhs-number library, "ranges").
  test.each(["0018", "0026", "0034", "0042", "0050", "0069", "0077", "0085", "0093", "0107", "0115", "0123"])(
    "999 000 %s is a ready number for tests",
    (end) => expect(isNhsNumber(`999000${end}`)).toBe(true),
  );

  // All ten pass modulus 11, as the library shows, and none is ever issued.
  test.each([..."0123456789"])("ten times the digit %s is refused", (digit) => {
    expect(validate(digit.repeat(10))).toBe(true);
    expect(isNhsNumber(digit.repeat(10))).toBe(false);
  });

  test("agrees with an independent library on any ten digits", () => {
    fc.assert(
      fc.property(fc.stringMatching(/^\d{10}$/), (digits) => {
        // Ten equal digits pass the sum but are never issued; we refuse them.
        fc.pre(!/^(\d)\1{9}$/.test(digits));
        expect(isNhsNumber(digits)).toBe(validate(digits));
      }),
      { numRuns: 2_000 },
    );
  });
});

// "PH" and up to six digits. Source: HCPC, "How to check the Register".
describe("HCPC registration of a physiotherapist", () => {
  test.each([
    ["PH123456", "PH123456"],
    ["PH12345", "PH12345"],
    ["ph 123456", "PH123456"],
  ])("%s is read as %s", (text, expected) => expect(readHcpcNumber(text)).toBe(expected));

  test.each(["PH1234567", "PH", "PYL123456", "OT12345"])("%s is refused", (text) =>
    expect(readHcpcNumber(text)).toBeNull(),
  );
});

// BS 7666 pattern of the Cabinet Office's address schema (National Archives); P as a third letter from memory.
describe("postcode", () => {
  test.each([
    "SW1A 1AA",
    "M1 1AE",
    "M60 1NW",
    "CR2 6XH",
    "DN55 1PT",
    "W1A 1HQ",
    "EC1A 1BB",
    "N1C 4AG",
    "N1P 1AA",
    "BT48 6DQ",
    "GIR 0AA",
  ])("%s has the shape", (text) => expect(hasPostcodeShape(text)).toBe(true));

  test.each([
    "Q1 1AA",
    "V1 1AA",
    "X1 1AA",
    "AJ1 1AA",
    "M1 1CI",
    "M1 1AO",
    "SW1A 1A",
    "M111 1AA",
    "W1L 1AA",
    "EC1C 1BB",
  ])("%s has not", (text) => expect(hasPostcodeShape(text)).toBe(false));

  // The pattern's sets of letters, place by place: all but those named, or only those named.
  test.each([
    ["first", (x: string) => `${x}1 1AA`, [..."ABCDEFGHIJKLMNOPRSTUWYZ"]],
    ["second", (x: string) => `S${x}1 1AA`, [..."ABCDEFGHKLMNOPQRSTUVWXY"]],
    ["third, behind one letter and one digit", (x: string) => `W1${x} 1AA`, [..."ABCDEFGHJKPSTUW"]],
    ["fourth, behind two letters and one digit", (x: string) => `EC1${x} 1BB`, [..."ABEHMNPRVWXY"]],
    ["last but one", (x: string) => `M1 1${x}E`, [..."ABDEFGHJLNPQRSTUWXYZ"]],
    ["last", (x: string) => `M1 1A${x}`, [..."ABDEFGHJLNPQRSTUWXYZ"]],
  ])("the letters that may stand %s", (_place, write, letters) => {
    const taken = [..."ABCDEFGHIJKLMNOPQRSTUVWXYZ"].filter((letter) => hasPostcodeShape(write(letter)));
    expect(taken).toEqual(letters);
  });

  test("any spacing and case is put in order", () => expect(normalisePostcode("sw1a1aa")).toBe("SW1A 1AA"));
});

// Ranges kept for drama. Source: Ofcom, as cited in code and by the BBC; E.164 form by libphonenumber.
describe("phone", () => {
  test.each([
    ["07700 900123", "+447700900123"],
    ["01632 960001", "+441632960001"],
    ["020 7946 0123", "+442079460123"],
    ["+44 (0)7700 900123", "+447700900123"],
    ["0044 7700 900123", "+447700900123"],
    ["07700-900-123", "+447700900123"],
    // The ranges from here on: Ofcom, from memory.
    ["0113 496 0123", "+441134960123"],
    ["0131 496 0123", "+441314960123"],
    ["029 2018 0123", "+442920180123"],
    ["028 9649 6123", "+442896496123"],
    ["03069 990123", "+443069990123"],
    ["08081 570123", "+448081570123"],
  ])("%s is kept as %s", (text, expected) => expect(readPhone(text)).toBe(expected));

  test.each(["12", "not a number", "077009001234567"])("%s is refused", (text) =>
    expect(readPhone(text)).toBeNull(),
  );

  test("is shown as it is said at home, and with its country abroad", () => {
    expect(formatPhone("+447700900123")).toBe("07700 900123");
    expect(formatPhone("+441632960001")).toBe("01632 960001");
    expect(formatPhone("+33199001234")).toMatch(/^\+33 /);
  });
});
