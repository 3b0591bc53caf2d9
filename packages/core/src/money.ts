/** Money is a whole number of pence in the practice's currency, safe as a JavaScript integer. */
export type Pence = number;

/** @throws RangeError when the value is not a safe whole number of pence. */
export function assertPence(value: number): Pence {
  if (!Number.isSafeInteger(value)) throw new RangeError("Money must be a whole number of pence.");
  return value;
}

export type Rounding = "nearest" | "down";

/**
 * The one rounding function: `numerator / denominator` to a whole number. "nearest" takes halves away from zero,
 * "down" goes towards zero. Exact for any safe integers, since the division is done on big integers.
 */
export function divideRounded(
  numerator: number | bigint,
  denominator: number | bigint,
  rounding: Rounding = "nearest",
): number {
  const d = BigInt(denominator);
  if (d === 0n) throw new RangeError("Cannot divide by zero.");
  const n = d < 0n ? -BigInt(numerator) : BigInt(numerator);
  const size = d < 0n ? -d : d;
  const negative = n < 0n;
  const magnitude = negative ? -n : n;
  let whole = magnitude / size;
  if (rounding === "nearest" && (magnitude % size) * 2n >= size) whole += 1n;
  return assertPence(Number(negative ? -whole : whole));
}

/** `amount × basisPoints / 10 000`, for example 2000 basis points = 20 %. */
export function shareOf(amount: Pence, basisPoints: number, rounding: Rounding = "nearest"): Pence {
  return divideRounded(BigInt(amount) * BigInt(basisPoints), 10_000n, rounding);
}

export function sumPence(amounts: Iterable<Pence>): Pence {
  let total = 0;
  for (const amount of amounts) total = assertPence(total + amount);
  return total;
}

/**
 * Splits an amount by whole-number weights so that the parts always add up to it: each gets its floor, and the
 * pennies left go one each to the earliest parts. 100.00 three ways is 33.34, 33.33, 33.33.
 */
export function allocate(amount: Pence, weights: readonly number[]): Pence[] {
  if (weights.some((w) => !Number.isSafeInteger(w) || w < 0) || weights.every((w) => w === 0)) {
    throw new RangeError("Weights must be whole numbers, none below zero, and not all zero.");
  }
  const total = weights.reduce((sum, w) => sum + BigInt(w), 0n);
  const sign = amount < 0 ? -1 : 1;
  const size = Math.abs(assertPence(amount));
  const parts = weights.map((w) => divideRounded(BigInt(size) * BigInt(w), total, "down"));
  let left = size - sumPence(parts);
  for (let i = 0; left > 0; i = (i + 1) % parts.length) {
    if ((weights[i] ?? 0) === 0) continue;
    parts[i] = (parts[i] ?? 0) + 1;
    left -= 1;
  }
  return parts.map((p) => (p === 0 ? 0 : p * sign));
}

/** "£1,234.50"; a negative amount is "−£5.00". */
export function formatMoney(amount: Pence, currency = "GBP"): string {
  const symbol = currency === "GBP" ? "£" : currency === "EUR" ? "€" : `${currency} `;
  const size = Math.abs(assertPence(amount));
  const pounds = Math.floor(size / 100)
    .toString()
    .replace(/\B(?=(\d{3})+(?!\d))/g, ",");
  return `${amount < 0 ? "−" : ""}${symbol}${pounds}.${(size % 100).toString().padStart(2, "0")}`;
}

/** Reads "65", "65.5", "£1,234.50" as pence; null where it is not an amount of money with at most two decimals. */
export function parseMoney(text: string): Pence | null {
  const match = /^\s*(-|−)?\s*£?\s*(\d{1,3}(?:,\d{3})+|\d{1,11})(?:\.(\d{1,2}))?\s*$/.exec(text);
  if (!match) return null;
  const [, minus, pounds = "0", pence = ""] = match;
  const value = Number(pounds.replaceAll(",", "")) * 100 + Number(pence.padEnd(2, "0"));
  if (!Number.isSafeInteger(value)) return null;
  return minus ? 0 - value : value;
}
