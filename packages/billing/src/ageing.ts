import { type Pence, sumPence } from "@withy/core/money";
import { daysBetween, type PlainDateText } from "@withy/core/plain-date";

export const ageBuckets = ["not-due", "0-30", "31-60", "61-90", "over-90"] as const;
export type AgeBucket = (typeof ageBuckets)[number];

export const ageBucketWords: Record<AgeBucket, string> = {
  "not-due": "not due",
  "0-30": "up to 30",
  "31-60": "31 to 60",
  "61-90": "61 to 90",
  "over-90": "over 90",
};

/** From which date a debt ages. The screen must say which: the two give different buckets. */
export type AgeingBasis = "issued" | "due";

export interface AgeingDebt {
  readonly issuedOn: PlainDateText;
  readonly dueOn: PlainDateText;
  readonly owedPence: Pence;
}

/** Whole days past the due date; zero or less while it is not past. */
export const daysPastDue = (dueOn: PlainDateText, on: PlainDateText): number => daysBetween(dueOn, on);

/** The bucket of an age in days. Bucket edges are common practice: 0 to 30, 31 to 60, 61 to 90, over 90. */
export function bucketOfDays(days: number): Exclude<AgeBucket, "not-due"> {
  if (days <= 30) return "0-30";
  if (days <= 60) return "31-60";
  return days <= 90 ? "61-90" : "over-90";
}

/**
 * The bucket of a debt on a day. What is not yet due has its own, whichever date the rest ages from; a debt due
 * today is due.
 */
export function bucketOf(debt: AgeingDebt, on: PlainDateText, basis: AgeingBasis): AgeBucket {
  if (on < debt.dueOn) return "not-due";
  return bucketOfDays(daysBetween(basis === "due" ? debt.dueOn : debt.issuedOn, on));
}

export type AgedDebt = Record<AgeBucket, Pence> & { readonly totalPence: Pence };

/** Sums debts into buckets; the buckets always add up to the total. */
export function ageDebts(debts: readonly AgeingDebt[], on: PlainDateText, basis: AgeingBasis): AgedDebt {
  const of = (bucket: AgeBucket): Pence =>
    sumPence(debts.filter((d) => bucketOf(d, on, basis) === bucket).map((d) => d.owedPence));
  return {
    "not-due": of("not-due"),
    "0-30": of("0-30"),
    "31-60": of("31-60"),
    "61-90": of("61-90"),
    "over-90": of("over-90"),
    totalPence: sumPence(debts.map((d) => d.owedPence)),
  };
}
