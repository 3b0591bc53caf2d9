import { divideRounded, formatMoney, type Pence } from "@withy/core/money";

export const vatTreatments = ["exempt", "standard", "zero", "outside-scope"] as const;
export type VatTreatment = (typeof vatTreatments)[number];

/** Rate in basis points: 2000 is 20 %, the standard rate since 4 January 2011. */
export const vatBasisPoints: Record<VatTreatment, number> = {
  exempt: 0,
  standard: 2000,
  zero: 0,
  "outside-scope": 0,
};

/** The word in an invoice's VAT column. */
export const vatWords: Record<VatTreatment, string> = {
  exempt: "exempt",
  standard: "20%",
  zero: "0%",
  "outside-scope": "no VAT",
};

/** Why a line carries the VAT that it does, as printed. The standard rate needs none: its sum is printed instead. */
export const vatReasons: Record<VatTreatment, string> = {
  exempt: "Care by a registered health professional is exempt.",
  standard: "Goods and services at the standard rate of 20%.",
  zero: "Zero rated items carry VAT at 0%.",
  "outside-scope": "Items marked no VAT are outside the scope of VAT.",
};

/** How a practice stands with VAT. Without a registration no number and no VAT may be shown or charged. */
export interface VatRegistration {
  readonly vatNumber: string | null;
}

export const isVatRegistered = (practice: VatRegistration): boolean => practice.vatNumber !== null;

/** Exact VAT is `numerator / denominator` pence; kept as a fraction so that it is rounded once only. */
export interface VatFraction {
  readonly numerator: bigint;
  readonly denominator: bigint;
}

/** VAT on an amount without VAT, in pence, not yet rounded. */
export function vatOnNet(net: Pence, treatment: VatTreatment): VatFraction {
  return { numerator: BigInt(net) * BigInt(vatBasisPoints[treatment]), denominator: 10_000n };
}

/** VAT held in an amount that includes it, in pence, not yet rounded: at 20 % one sixth. */
export function vatWithinGross(gross: Pence, treatment: VatTreatment): VatFraction {
  const rate = BigInt(vatBasisPoints[treatment]);
  return { numerator: BigInt(gross) * rate, denominator: 10_000n + rate };
}

/**
 * Takes a price that includes VAT apart. The two parts always add up to the price.
 * Source: the VAT fraction for 20 % is 1/6 (HMRC, VAT fractions).
 */
export function splitGross(gross: Pence, treatment: VatTreatment): { netPence: Pence; vatPence: Pence } {
  const { numerator, denominator } = vatWithinGross(gross, treatment);
  const vatPence = divideRounded(numerator, denominator);
  return { netPence: gross - vatPence, vatPence };
}

/**
 * VAT of one line in tenths of a penny, rounded down: the finest rounding down that a line may have.
 * Source: HMRC Notice 700, 17.5.1 (86.76p becomes 86.7p).
 */
export function vatTenthsDown(net: Pence, treatment: VatTreatment): number {
  const { numerator, denominator } = vatOnNet(net, treatment);
  return divideRounded(numerator * 10n, denominator, "down");
}

export interface TreatmentTotal {
  readonly treatment: VatTreatment;
  readonly netPence: Pence;
  readonly vatPence: Pence;
}

/**
 * The sentences of an invoice's VAT note: reasons, registration, and the sum at each rate that is charged.
 * Empty where the practice is not registered.
 */
export function vatNote(totals: readonly TreatmentTotal[], practice: VatRegistration): string[] {
  if (practice.vatNumber === null) return [];
  const present = vatTreatments.flatMap((t) => totals.filter((total) => total.treatment === t));
  const reasons = present.filter((t) => t.treatment !== "standard").map((t) => vatReasons[t.treatment]);
  const charged = present
    .filter((t) => t.treatment === "standard")
    .map((t) => `${formatMoney(t.netPence)} at ${vatWords[t.treatment]} is ${formatMoney(t.vatPence)}.`);
  return [...reasons, `VAT registration ${practice.vatNumber}.`, ...charged];
}
