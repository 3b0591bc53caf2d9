import type { MonthFigure, UtilisationRow } from "@withy/contracts/reports";
import { proportion } from "./arithmetic";
import type { MonthFacts } from "./gather-month";
import type { UtilisationCell } from "./reckon-utilisation";

type Cells = readonly UtilisationCell[];
const sum = (cells: Cells, of: (cell: UtilisationCell) => number) => cells.reduce((n, c) => n + of(c), 0);

export function utilisationRow(
  cells: Cells,
  before: Cells,
  who: { id: string; name: string; siteNames: readonly string[] },
): UtilisationRow {
  const onOfferMinutes = sum(cells, (c) => c.onOfferMinutes);
  const bookedMinutes = sum(cells, (c) => c.bookedMinutes);
  const deliveredMinutes = sum(cells, (c) => c.deliveredMinutes);
  return {
    ...who,
    onOfferMinutes,
    bookedMinutes,
    deliveredMinutes,
    booked: proportion(bookedMinutes, onOfferMinutes),
    delivered: proportion(deliveredMinutes, onOfferMinutes),
    bookedBefore: proportion(
      sum(before, (c) => c.bookedMinutes),
      sum(before, (c) => c.onOfferMinutes),
    ),
  };
}

type Draft = Omit<MonthFigure, "value" | "before"> & { value: (facts: MonthFacts) => number | null };

/** The headline figures, each with its denominator and its definition. */
export function monthFigures(facts: MonthFacts, before: MonthFacts): MonthFigure[] {
  return drafts(facts).map(({ value, ...figure }) => ({
    ...figure,
    value: value(facts),
    before: value(before),
  }));
}

function drafts(f: MonthFacts): Draft[] {
  const onOffer = sum(f.cells, (c) => c.onOfferMinutes);
  const share = (of: (c: UtilisationCell) => number) => (facts: MonthFacts) =>
    proportion(
      sum(facts.cells, of),
      sum(facts.cells, (c) => c.onOfferMinutes),
    );
  return [
    {
      key: "booked",
      unit: "share",
      numerator: sum(f.cells, (c) => c.bookedMinutes),
      denominator: onOffer,
      of: "on-offer",
      value: share((c) => c.bookedMinutes),
      definition:
        "Minutes of visits that were not cancelled, over working minutes on offer: patterns less breaks, leave, blocks and closed days. Time that visits share counts once.",
    },
    {
      key: "delivered",
      unit: "share",
      numerator: sum(f.cells, (c) => c.deliveredMinutes),
      denominator: onOffer,
      of: "on-offer",
      value: share((c) => c.deliveredMinutes),
      definition: "Minutes of attended visits, over the same working minutes on offer.",
    },
    {
      key: "billed",
      unit: "pence",
      numerator: f.billed.reduce((n, b) => n + b.invoices, 0),
      denominator: null,
      of: null,
      value: (facts) => facts.billedPence,
      definition: "Net sums of invoices issued in the month and not made void, before VAT.",
    },
    {
      key: "collected",
      unit: "pence",
      numerator: f.collected.payments,
      denominator: null,
      of: null,
      value: (facts) => facts.collected.pence,
      definition: "Payments received in the month less refunds made in it, for invoices of any month.",
    },
    {
      key: "did-not-attend",
      unit: "share",
      numerator: f.missed,
      denominator: f.due,
      of: "due",
      value: (facts) => proportion(facts.missed, facts.due),
      definition:
        "Visits marked did not attend, over visits attended or not attended. Cancelled ones are out.",
    },
    {
      key: "cancelled",
      unit: "share",
      numerator: f.cancelled,
      denominator: f.all,
      of: "all-visits",
      value: (facts) => proportion(facts.cancelled, facts.all),
      definition: "Cancelled visits over all visits that were booked for the month.",
    },
    {
      key: "new-patients",
      unit: "count",
      numerator: f.newPatients,
      denominator: null,
      of: null,
      value: (facts) => facts.newPatients,
      definition: "People whose first attended visit with the practice was in the month.",
    },
  ];
}
