const slack = 1e-9;

/**
 * Rounds half away from zero, for showing only. Comparisons use the unrounded value.
 * @param decimals places after the point
 */
export function roundForDisplay(value: number, decimals: number): number {
  const scaled = Math.abs(value) * 10 ** decimals;
  const rounded = Math.floor(scaled + 0.5 + slack) / 10 ** decimals;
  return rounded === 0 ? 0 : Math.sign(value) * rounded;
}

/** The value with exactly that many decimals: "66.2", "13", "1.60". */
export function formatScore(value: number, decimals: number): string {
  return roundForDisplay(value, decimals).toFixed(decimals);
}

/** True where a reaches b, forgiving the last binary digit (16/3 minus 10/3 is exactly two to a reader). */
export function reaches(a: number, b: number): boolean {
  return a >= b - slack;
}
