import { allocate, divideRounded, type Pence, type Rounding, sumPence } from "@withy/core/money";
import { type Discount, discountPence } from "./discount";
import {
  type TreatmentTotal,
  type VatFraction,
  type VatTreatment,
  vatOnNet,
  vatTenthsDown,
  vatTreatments,
  vatWithinGross,
} from "./vat";

/**
 * Where VAT is rounded. A line may be rounded to the nearest penny, or down to a tenth of a penny with the
 * invoice's total rounded down; an invoice's total may be rounded either way. Shelf prices that include VAT are
 * always rounded to the nearest penny, since retailers may not round down. Source: HMRC Notice 700, 17.5;
 * VATREC12010.
 */
export interface VatRounding {
  readonly per: "line" | "invoice";
  readonly rounding: Rounding;
}

export const vatRoundings = {
  "line-nearest": { per: "line", rounding: "nearest" },
  "line-down": { per: "line", rounding: "down" },
  "invoice-nearest": { per: "invoice", rounding: "nearest" },
  "invoice-down": { per: "invoice", rounding: "down" },
} as const satisfies Record<string, VatRounding>;
export type VatRoundingCode = keyof typeof vatRoundings;

export const usualVatRounding: VatRounding = { per: "line", rounding: "nearest" };

export interface TotalsLine {
  readonly quantity: number;
  readonly unitPricePence: Pence;
  /** Whether the unit price holds the VAT already (a shelf price) or VAT comes on top. */
  readonly isVatInclusive: boolean;
  readonly discount: Discount | null;
  readonly vatTreatment: VatTreatment;
}

export interface LineTotals {
  readonly discountPence: Pence;
  readonly netPence: Pence;
  readonly vatPence: Pence;
  readonly grossPence: Pence;
}

export interface InvoiceTotals {
  readonly lines: readonly LineTotals[];
  readonly discountPence: Pence;
  readonly netPence: Pence;
  readonly vatPence: Pence;
  readonly grossPence: Pence;
  readonly byTreatment: readonly TreatmentTotal[];
}

interface PricedLine {
  readonly line: TotalsLine;
  readonly amountPence: Pence;
  readonly discountPence: Pence;
}

const nearest = (f: VatFraction): Pence => divideRounded(f.numerator, f.denominator);

function priced(line: TotalsLine): PricedLine {
  const before = sumPence([line.quantity * line.unitPricePence]);
  const off = discountPence(before, line.discount);
  return { line, amountPence: before - off, discountPence: off };
}

/** Shares a rounded total among the lines that made it, so that the printed column adds up to the printed total. */
function shared(total: Pence, amounts: readonly Pence[]): Pence[] {
  return sumPence(amounts) === 0 ? amounts.map(() => 0) : allocate(total, amounts);
}

function vatOnTop(amounts: readonly Pence[], treatment: VatTreatment, rule: VatRounding): Pence[] {
  if (rule.per === "line" && rule.rounding === "nearest")
    return amounts.map((a) => nearest(vatOnNet(a, treatment)));
  if (rule.per === "line") {
    const tenths = amounts.map((a) => vatTenthsDown(a, treatment));
    return shared(
      divideRounded(
        tenths.reduce((a, b) => a + b, 0),
        10,
        "down",
      ),
      amounts,
    );
  }
  const exact = vatOnNet(sumPence(amounts), treatment);
  return shared(divideRounded(exact.numerator, exact.denominator, rule.rounding), amounts);
}

function vatInside(amounts: readonly Pence[], treatment: VatTreatment, rule: VatRounding): Pence[] {
  if (rule.per === "line") return amounts.map((a) => nearest(vatWithinGross(a, treatment)));
  return shared(nearest(vatWithinGross(sumPence(amounts), treatment)), amounts);
}

function vatOfLines(lines: readonly PricedLine[], rule: VatRounding): Pence[] {
  const vat = lines.map(() => 0);
  for (const treatment of vatTreatments) {
    for (const isVatInclusive of [false, true]) {
      const at = lines.flatMap((l, i) =>
        l.line.vatTreatment === treatment && l.line.isVatInclusive === isVatInclusive ? [i] : [],
      );
      const amounts = at.map((i) => lines[i]?.amountPence ?? 0);
      const parts = isVatInclusive ? vatInside(amounts, treatment, rule) : vatOnTop(amounts, treatment, rule);
      at.forEach((i, n) => {
        vat[i] = parts[n] ?? 0;
      });
    }
  }
  return vat;
}

/**
 * Adds up an invoice in pence. Each line's net and VAT make its gross, and each column adds up to its total.
 * A practice that is not registered charges no VAT: its prices are what the payer pays.
 */
export function invoiceTotals(
  lines: readonly TotalsLine[],
  rule: VatRounding,
  isVatRegistered: boolean,
): InvoiceTotals {
  const all = lines.map(priced);
  const vat = isVatRegistered ? vatOfLines(all, rule) : all.map(() => 0);
  const totals = all.map((l, i): LineTotals => {
    const vatPence = vat[i] ?? 0;
    const netPence = l.line.isVatInclusive ? l.amountPence - vatPence : l.amountPence;
    return { discountPence: l.discountPence, netPence, vatPence, grossPence: netPence + vatPence };
  });
  const byTreatment = vatTreatments.flatMap((treatment): TreatmentTotal[] => {
    const own = totals.filter((_, i) => lines[i]?.vatTreatment === treatment);
    if (own.length === 0) return [];
    return [
      {
        treatment,
        netPence: sumPence(own.map((l) => l.netPence)),
        vatPence: sumPence(own.map((l) => l.vatPence)),
      },
    ];
  });
  return {
    lines: totals,
    discountPence: sumPence(totals.map((l) => l.discountPence)),
    netPence: sumPence(totals.map((l) => l.netPence)),
    vatPence: sumPence(totals.map((l) => l.vatPence)),
    grossPence: sumPence(totals.map((l) => l.grossPence)),
    byTreatment,
  };
}
