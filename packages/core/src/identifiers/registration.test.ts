import { expect, it } from "vitest";
import { readHcpcNumber } from "./registration";

// The regulator's own examples stand in tests/published.
it.each([
  ["PH1", "PH1"],
  [" ph 12 34 56 ", "PH123456"],
  ["Ph\u00A0000001", "PH000001"],
])("%s is read as %s", (text, number) => expect(readHcpcNumber(text)).toBe(number));

it.each(["", "123456", "PH-123456", "PH12345A", "XPH12345", "PH123456 CH12345", "PH١٢٣"])(
  "%s is refused",
  (text) => expect(readHcpcNumber(text)).toBeNull(),
);
