import { type Refusal, refusal } from "@withy/core/refusal";
import { addMonths } from "@withy/core/zoned-time";

/** A date of birth lies neither ahead of the practice's day nor more than 125 years back. */
export function checkBirthDate(bornOn: string, today: string): Refusal | null {
  if (bornOn > today) return refusal("born-ahead", "Date of birth must be in the past.", "bornOn");
  if (bornOn < addMonths(today, -125 * 12))
    return refusal("born-too-long-ago", "Check the year in the date of birth.", "bornOn");
  return null;
}
