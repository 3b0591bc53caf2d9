const outward = [
  "[A-PR-UWYZ]\\d{1,2}",
  "[A-PR-UWYZ][A-HK-Y]\\d{1,2}",
  "[A-PR-UWYZ]\\d[A-HJKPSTUW]",
  "[A-PR-UWYZ][A-HK-Y]\\d[ABEHMNPRVWXY]",
];
const shape = new RegExp(`^(?:GIR 0AA|(?:${outward.join("|")}) \\d[ABD-HJLNP-UW-Z]{2})$`);

/** Upper case with one space before the last three: "sw1a1aa" to "SW1A 1AA". Says nothing about validity. */
export function normalisePostcode(text: string): string {
  const bare = text.toUpperCase().replace(/[^A-Z0-9]/g, "");
  return bare.length > 3 ? `${bare.slice(0, -3)} ${bare.slice(-3)}` : bare;
}

/**
 * Whether the text has the shape of a UK postcode. Source: the BS 7666 pattern in the Cabinet Office address
 * schema, with P added to the third-letter set (N1P). A screen warns where this says no; it does not refuse.
 */
export function hasPostcodeShape(text: string): boolean {
  return shape.test(normalisePostcode(text));
}
