import { type Refusal, refusal } from "@withy/core/refusal";

/** How many visits a payer has agreed to pay for, and how many of them are spoken for. */
export interface PayerLimit {
  readonly payerName: string;
  readonly authorised: number;
  /** Visits since the authorisation was written down that were attended or still stand. */
  readonly used: number;
}

export const visitsLeft = ({ authorised, used }: PayerLimit): number => Math.max(0, authorised - used);

const visitsWords = (n: number): string => (n === 1 ? "1 visit" : `${n} visits`);

/** Whether so many more visits are within what the payer has authorised; without a limit they always are. */
export function checkAuthorisation(limit: PayerLimit | null, wanted: number): Refusal | null {
  if (limit === null) return null;
  const left = visitsLeft(limit);
  if (wanted <= left) return null;
  const { payerName, authorised, used } = limit;
  const stands = `${payerName} has authorised ${visitsWords(authorised)} and ${used === 1 ? "1 is" : `${used} are`} used or booked.`;
  const todo =
    left === 0
      ? "Write down a new authorisation on the patient's record first."
      : `Book ${visitsWords(left)}${left === 1 ? "" : " or fewer"}, or write down a new authorisation on the patient's record first.`;
  return refusal("not-authorised", `${stands} ${todo}`, "visits");
}
