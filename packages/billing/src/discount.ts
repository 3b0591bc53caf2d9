import { type Pence, shareOf } from "@withy/core/money";
import { type Refusal, refusal } from "@withy/core/refusal";

export type Discount =
  | { readonly kind: "percent"; readonly basisPoints: number }
  | { readonly kind: "amount"; readonly pence: Pence };

/** Null where the discount may be given on a line of `amountPence`; never more than the line itself. */
export function checkDiscount(amountPence: Pence, discount: Discount): Refusal | null {
  const size = discount.kind === "percent" ? discount.basisPoints : discount.pence;
  if (!Number.isSafeInteger(size) || size < 0) {
    return refusal("discount-below-zero", "Enter a discount of zero or more.", "discount");
  }
  if (discount.kind === "percent" && discount.basisPoints > 10_000) {
    return refusal("discount-too-large", "Enter a discount of 100% or less.", "discount");
  }
  if (discount.kind === "amount" && discount.pence > amountPence) {
    return refusal("discount-too-large", "Enter a discount no larger than the line itself.", "discount");
  }
  return null;
}

/** The discount in pence, halves rounded up, on a line's amount before discount. */
export function discountPence(amountPence: Pence, discount: Discount | null): Pence {
  if (discount === null) return 0;
  return discount.kind === "percent" ? shareOf(amountPence, discount.basisPoints) : discount.pence;
}
