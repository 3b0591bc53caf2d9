import { divideRounded, type Pence } from "@withy/core/money";
import type { PlainDateText } from "@withy/core/plain-date";
import { type Refusal, refusal } from "@withy/core/refusal";

export type PayerKind = "patient" | "insurer" | "employer";

/** Statutory interest is 8 percentage points above the Bank Rate. Source: "Late commercial payments", gov.uk. */
export const statutoryMarginBasisPoints = 800;

/** A Bank Rate and the day from which it held. */
export interface BankRate {
  readonly from: PlainDateText;
  readonly basisPoints: number;
}

/**
 * The Bank Rate that fixes statutory interest for a debt late on a day: the one of 31 December for January to
 * June, of 30 June for July to December (SI 2002/1675, from memory). Null where the table does not reach back.
 */
export function referenceRate(rates: readonly BankRate[], lateOn: PlainDateText): number | null {
  const year = Number(lateOn.slice(0, 4));
  const fixedOn = lateOn.slice(5, 7) <= "06" ? `${year - 1}-12-31` : `${year}-06-30`;
  const [held] = rates.filter((r) => r.from <= fixedOn).sort((a, b) => b.from.localeCompare(a.from));
  return held?.basisPoints ?? null;
}

export interface LateDebt {
  readonly debtPence: Pence;
  readonly bankRateBasisPoints: number;
  readonly daysLate: number;
}

const yearly = (debt: LateDebt): bigint =>
  BigInt(debt.debtPence) * BigInt(debt.bankRateBasisPoints + statutoryMarginBasisPoints);

/** A year's simple interest in pence. */
export const annualInterest = (debt: LateDebt): Pence => divideRounded(yearly(debt), 10_000n);

/**
 * Simple interest in pence. "daily" rounds a day's interest to the penny first, as the worked example on gov.uk
 * does (23p × 50 days = £11.50); "exact" rounds once at the end (£11.64).
 */
export function statutoryInterest(debt: LateDebt, rule: "daily" | "exact"): Pence {
  const days = Math.max(0, debt.daysLate);
  if (rule === "exact") return divideRounded(yearly(debt) * BigInt(days), 3_650_000n);
  return divideRounded(yearly(debt), 3_650_000n) * days;
}

/** The fixed sum for the cost of recovery, in pence. Source: "Late commercial payments", gov.uk. */
export function fixedRecoverySum(debtPence: Pence): Pence {
  if (debtPence < 1_000_00) return 40_00;
  return debtPence < 10_000_00 ? 70_00 : 100_00;
}

/** Null where statutory interest may be claimed: from a business, after the debt is late. */
export function checkLateInterest(payer: PayerKind, daysLate: number): Refusal | null {
  if (payer === "patient") {
    return refusal(
      "not-a-business",
      "Statutory interest is for insurers and employers only. Send the patient a reminder.",
    );
  }
  if (daysLate <= 0) return refusal("not-late", "This debt is not late yet. Come back after its due date.");
  return null;
}
