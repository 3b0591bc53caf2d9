import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { formatPhone, readPhone } from "./phone";

/** Numbers set aside for drama, the thousand of each range. */
const invented = fc
  .tuple(fc.constantFrom("+447700900", "+441632960", "+442079460", "+441134960", "+443069990"), fc.nat(999))
  .map(([range, n]) => `${range}${String(n).padStart(3, "0")}`);

describe("a phone number as it is typed", () => {
  it.each([
    [" 07700 900731 ", "+447700900731"],
    ["07700900731", "+447700900731"],
    ["7700 900731", "+447700900731"],
    ["07700.900.731", "+447700900731"],
    ["+44 7700 900731", "+447700900731"],
    ["+44 (0) 7700 900731", "+447700900731"],
    ["(01632) 960731", "+441632960731"],
    ["+33 1 99 00 12 34", "+33199001234"],
    ["+33 (0)1 99 00 12 34", "+33199001234"],
    // In Italy the nought is part of the number.
    ["+39 (0)6 0000 1234", "+390600001234"],
    ["0033 1 99 00 12 34", "+33199001234"],
  ])("%s is kept as %s", (text, kept) => expect(readPhone(text)).toBe(kept));

  it.each([
    "",
    "   ",
    "07700",
    "07700 900731 or 01632 960731",
    "ring after six",
    "+",
    "+999 1234 5678",
    "07700 900731 07700 900732",
  ])("%s is none", (text) => expect(readPhone(text)).toBeNull());

  it("what is kept is E.164, whatever is typed", () => {
    fc.assert(
      fc.property(fc.oneof(fc.string(), fc.stringMatching(/^[+0][\d ()-]{5,20}$/)), (text) => {
        expect(readPhone(text) ?? "+1").toMatch(/^\+[1-9]\d{0,14}$/);
      }),
    );
  });
});

describe("a phone number as it is shown", () => {
  it.each([
    ["+447700900731", "07700 900731"],
    ["+441632960731", "01632 960731"],
    ["+442079460123", "020 7946 0123"],
    ["+33199001234", "+33 1 99 00 12 34"],
    ["no number", "no number"],
  ])("%s is shown as %s", (kept, shown) => expect(formatPhone(kept)).toBe(shown));

  it("what is shown is read back", () => {
    fc.assert(
      fc.property(invented, (kept) => {
        expect(formatPhone(kept)).toMatch(/^0[\d ]+$/);
        expect(readPhone(formatPhone(kept))).toBe(kept);
      }),
    );
  });
});
