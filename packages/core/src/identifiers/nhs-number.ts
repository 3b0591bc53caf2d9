/** Strips spaces and dashes; the ten digits, or null where the text is no well-formed NHS number. */
export function readNhsNumber(text: string): string | null {
  const digits = text.replace(/[\s-]/g, "");
  return isNhsNumber(digits) ? digits : null;
}

/**
 * Modulus 11 over weights 10 to 2; remainder 0 gives check digit 0, a check digit of 10 does not exist.
 * Ten equal digits pass the sum but are never issued. Source: NHS Data Dictionary, NHS NUMBER.
 */
export function isNhsNumber(digits: string): boolean {
  if (!/^\d{10}$/.test(digits) || /^(\d)\1{9}$/.test(digits)) return false;
  const check = nhsCheckDigit(digits.slice(0, 9));
  return check !== null && check === Number(digits[9]);
}

/** Check digit of nine digits, or null where none exists. */
export function nhsCheckDigit(base: string): number | null {
  let sum = 0;
  for (let i = 0; i < 9; i += 1) sum += Number(base[i]) * (10 - i);
  const check = 11 - (sum % 11);
  if (check === 11) return 0;
  return check === 10 ? null : check;
}

/** "999 314 2786". */
export function formatNhsNumber(digits: string): string {
  return `${digits.slice(0, 3)} ${digits.slice(3, 6)} ${digits.slice(6)}`;
}
