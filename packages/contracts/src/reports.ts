import { z } from "zod";
import type { AgedDebtView } from "./billing";
import { idField, pageFields } from "./fields";
import type { Page } from "./page";

const monthField = z.string().regex(/^20\d\d-(0[1-9]|1[0-2])$/, "Choose a month, such as 2026-11.");
const blank = z.literal("").transform(() => undefined);

/** As a query string carries it. Without a site: every site whose figures the person may read. */
export const getMonthInput = z.strictObject({
  month: monthField,
  siteId: z.union([blank, idField]).optional(),
});

export const figureKeys = [
  "booked",
  "delivered",
  "on-offer",
  "billed",
  "collected",
  "did-not-attend",
  "due",
  "cancelled",
  "all-visits",
  "attended",
  "new-patients",
] as const;
export type FigureKey = (typeof figureKeys)[number];

export const payerKinds = ["patient", "insurer", "employer"] as const;
export type PayerKind = (typeof payerKinds)[number];

export const listFigureRowsInput = z.strictObject({
  month: monthField,
  siteId: z.union([blank, idField]).optional(),
  figure: z.enum(figureKeys),
  therapistId: z.union([blank, idField]).optional(),
  payerKind: z.union([blank, z.enum(payerKinds)]).optional(),
  ...pageFields,
});
export type ListFigureRowsInput = z.input<typeof listFigureRowsInput>;

/** One headline figure with what it is made of. A share is in basis points: 8333 is 83.33 %. */
export interface MonthFigure {
  readonly key: FigureKey;
  readonly unit: "share" | "pence" | "count";
  /** Null: its denominator is zero, so there is no data. */
  readonly value: number | null;
  /** The same a month earlier. */
  readonly before: number | null;
  readonly numerator: number;
  readonly denominator: number | null;
  /** The figure that the denominator opens. */
  readonly of: FigureKey | null;
  /** What is counted over what, in one sentence. */
  readonly definition: string;
}

export interface UtilisationRow {
  readonly id: string;
  readonly name: string;
  readonly siteNames: readonly string[];
  readonly onOfferMinutes: number;
  readonly bookedMinutes: number;
  readonly deliveredMinutes: number;
  /** Basis points of the minutes on offer; null where none were. */
  readonly booked: number | null;
  readonly delivered: number | null;
  readonly bookedBefore: number | null;
}

export interface HeatView {
  /** Hours of the day with anything on offer, 7 for 07:00 to 08:00. */
  readonly hours: readonly number[];
  readonly rows: readonly {
    /** 1 Monday to 7 Sunday. */
    readonly weekday: number;
    /** Percent booked in each hour; null where nothing is on offer. */
    readonly percent: readonly (number | null)[];
  }[];
}

export interface IncomeRow {
  readonly kind: PayerKind;
  readonly invoices: number;
  readonly netPence: number;
  readonly netPenceBefore: number;
}

/** One month of the practice, or of one of its sites. */
export interface MonthView {
  readonly month: string;
  readonly firstOn: string;
  readonly lastOn: string;
  /** Its last day has passed. */
  readonly isOver: boolean;
  readonly today: string;
  readonly practiceName: string;
  readonly site: { readonly id: string; readonly name: string } | null;
  readonly sites: readonly { readonly id: string; readonly name: string }[];
  /** Whole percent of the time on offer that the owner aims to book. */
  readonly targetPercent: number;
  readonly figures: readonly MonthFigure[];
  /** Attended visits for each new patient, in hundredths; null without a new patient. */
  readonly visitsPerNewPatient: number | null;
  /** Net pence billed for each attended hour; null without one. */
  readonly pencePerAttendedHour: number | null;
  readonly lateCancellations: number;
  readonly therapists: readonly UtilisationRow[];
  readonly bySite: readonly UtilisationRow[];
  readonly whole: UtilisationRow;
  readonly heat: HeatView;
  readonly income: readonly IncomeRow[];
  /** As it stands today, whatever the month; null for whoever may not read invoices. */
  readonly debts: AgedDebtView | null;
}

export interface FigureRow {
  readonly id: string;
  readonly day: string;
  readonly time: string | null;
  readonly title: string;
  readonly detail: string;
  readonly minutes: number | null;
  readonly pence: number | null;
  /** What it leads to; null where it has no page. */
  readonly opens: { readonly kind: "patient" | "invoice"; readonly id: string } | null;
}

/** The rows behind one figure. The sums are of the whole figure, not of the page. */
export interface FigureRowsView extends Page<FigureRow> {
  readonly sumMinutes: number | null;
  readonly sumPence: number | null;
}
