/**
 * HCPC registration of a physiotherapist: PH and one to six digits. Source: HCPC, "How to check the Register".
 * Returns "PH123456", or null.
 */
export function readHcpcNumber(text: string): string | null {
  const bare = text.toUpperCase().replace(/\s+/g, "");
  return /^PH\d{1,6}$/.test(bare) ? bare : null;
}
