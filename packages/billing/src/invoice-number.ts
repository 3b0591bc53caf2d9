/** How a practice writes its invoice numbers: "SG" and 5 give SG-04187. An empty prefix gives 04187. */
export interface NumberForm {
  readonly prefix: string;
  readonly digits: number;
}

export const usualDigits = 5;

const prefixForm = /^[A-Z0-9]{0,8}$/;

export const isInvoicePrefix = (text: string): boolean => prefixForm.test(text);

/**
 * Writes the counter's value as an invoice number. A counter that outgrows its digits is written in full, so a
 * number is never cut and never comes twice.
 * @throws RangeError where the counter is below 1 or the form is not one we can read back
 */
export function formatInvoiceNumber(form: NumberForm, counter: number): string {
  if (!Number.isSafeInteger(counter) || counter < 1) throw new RangeError("Invoice numbers count from 1.");
  if (!isInvoicePrefix(form.prefix)) throw new RangeError("A prefix is up to 8 capital letters or digits.");
  const digits = counter.toString().padStart(form.digits, "0");
  return form.prefix === "" ? digits : `${form.prefix}-${digits}`;
}

/** Reads a number as people type it ("sg 4187", "SG-04187"); null where it is none. */
export function readInvoiceNumber(text: string): { prefix: string; counter: number } | null {
  const match = /^\s*(?:([A-Za-z0-9]{1,8})[\s-]+)?0*([1-9]\d{0,14})\s*$/.exec(text);
  if (!match) return null;
  return { prefix: (match[1] ?? "").toUpperCase(), counter: Number(match[2]) };
}
