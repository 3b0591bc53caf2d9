import type { Pence } from "@withy/core/money";
import type { PlainDateText } from "@withy/core/plain-date";
import type { VatTreatment } from "./vat";

/** One row of the price list. A null site or payer means any. */
export interface Price {
  readonly id: string;
  /** The service or the product that is priced. */
  readonly itemId: string;
  readonly siteId: string | null;
  readonly payerId: string | null;
  readonly validFrom: PlainDateText;
  /** The last day on which it holds; null while it still does. */
  readonly validUntil: PlainDateText | null;
  /** Without VAT. */
  readonly amountPence: Pence;
  readonly vatTreatment: VatTreatment;
}

export interface PriceWish {
  readonly itemId: string;
  readonly siteId: string;
  readonly payerId: string | null;
  /** The day of the visit, not of the invoice. */
  readonly on: PlainDateText;
}

const fits = (price: Price, wish: PriceWish): boolean =>
  price.itemId === wish.itemId &&
  (price.siteId === null || price.siteId === wish.siteId) &&
  (price.payerId === null || price.payerId === wish.payerId) &&
  price.validFrom <= wish.on &&
  (price.validUntil === null || wish.on <= price.validUntil);

/** A price agreed with the payer beats a site's own price, which beats the general one. */
const closeness = (price: Price): number =>
  (price.payerId === null ? 0 : 2) + (price.siteId === null ? 0 : 1);

/**
 * The price that holds for a visit: the closest fit, and among equals the one that began last. Null where the
 * price list has none, which a person must settle before the visit can be invoiced.
 */
export function choosePrice(prices: readonly Price[], wish: PriceWish): Price | null {
  const [best] = prices
    .filter((p) => fits(p, wish))
    .sort(
      (a, b) =>
        closeness(b) - closeness(a) || b.validFrom.localeCompare(a.validFrom) || b.id.localeCompare(a.id),
    );
  return best ?? null;
}
