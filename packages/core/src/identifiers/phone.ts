import { parsePhoneNumberFromString } from "libphonenumber-js/max";

/**
 * Any usual way of writing a phone number to E.164, or null where it cannot be one. Only the possible length is
 * asked for: numbers reserved for drama are possible but never assigned.
 */
export function readPhone(text: string): string | null {
  const parsed = parsePhoneNumberFromString(text.trim(), "GB");
  return parsed?.isPossible() ? parsed.number : null;
}

/** "07700 900731" at home, "+33 1 99 00 12 34" abroad. */
export function formatPhone(e164: string): string {
  const parsed = parsePhoneNumberFromString(e164, "GB");
  if (!parsed) return e164;
  return parsed.country === "GB" || parsed.countryCallingCode === "44"
    ? parsed.formatNational()
    : parsed.formatInternational();
}
