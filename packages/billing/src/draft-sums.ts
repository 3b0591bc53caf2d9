import type { Pence } from "@withy/core/money";
import { type InvoiceTotals, invoiceTotals, type VatRoundingCode, vatRoundings } from "./invoice-totals";
import { isVatRegistered, type VatRegistration, type VatTreatment, vatBasisPoints } from "./vat";

/** What of a draft's line makes its sums. Prices are without VAT. */
export interface DraftLine {
  readonly quantity: number;
  readonly unitPence: Pence;
  /** 1000 is a tenth off; 0 is no discount. */
  readonly discountBasisPoints: number;
  readonly vatTreatment: VatTreatment;
}

/** The four columns that a line carries beside its price, all in pence but the rate. */
export interface DraftLineSums {
  readonly vatBasisPoints: number;
  readonly netPence: Pence;
  readonly vatPence: Pence;
  readonly totalPence: Pence;
}

export interface DraftSums {
  /** In the order of the lines given. */
  readonly lines: readonly DraftLineSums[];
  readonly totals: InvoiceTotals;
}

/**
 * Adds up a whole draft by the practice's rounding and registration. Always give every line: where VAT is rounded
 * on the invoice, one more line can change the share of another.
 */
export function draftSums(
  lines: readonly DraftLine[],
  practice: VatRegistration & { readonly vatRounding: VatRoundingCode },
): DraftSums {
  const isRegistered = isVatRegistered(practice);
  const totals = invoiceTotals(
    lines.map(({ quantity, unitPence, discountBasisPoints, vatTreatment }) => ({
      quantity,
      unitPricePence: unitPence,
      isVatInclusive: false,
      discount: discountBasisPoints === 0 ? null : { kind: "percent", basisPoints: discountBasisPoints },
      vatTreatment,
    })),
    vatRoundings[practice.vatRounding],
    isRegistered,
  );
  const sums = lines.map(({ vatTreatment }, i): DraftLineSums => {
    const { netPence = 0, vatPence = 0, grossPence = 0 } = totals.lines[i] ?? {};
    const rate = isRegistered ? vatBasisPoints[vatTreatment] : 0;
    return { vatBasisPoints: rate, netPence, vatPence, totalPence: grossPence };
  });
  return { lines: sums, totals };
}
