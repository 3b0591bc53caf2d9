import type { FigureKey, MonthFigure, PayerKind } from "@withy/contracts/reports";
import { formatMoney } from "@withy/core/money";

export const figureLabels: Record<FigureKey, string> = {
  booked: "Booked",
  delivered: "Delivered",
  "on-offer": "Hours on offer",
  billed: "Billed",
  collected: "Collected",
  "did-not-attend": "Did not attend",
  due: "Visits due",
  cancelled: "Cancelled",
  "all-visits": "All visits booked",
  attended: "Attended visits",
  "new-patients": "New patients",
};

export const payerKindWords: Record<PayerKind, string> = {
  patient: "Patients paying themselves",
  insurer: "Insurers",
  employer: "Employers",
};

export const noData = "no data";

/** "83%" from 8333 basis points; one decimal where it is under ten. */
export function percentWords(basisPoints: number | null): string {
  if (basisPoints === null) return noData;
  return basisPoints < 1000 && basisPoints % 100 !== 0
    ? `${(basisPoints / 100).toFixed(1)}%`
    : `${Math.round(basisPoints / 100)}%`;
}

/** "918" hours from minutes, one decimal under a hundred. */
export function hoursWords(minutes: number): string {
  const hours = minutes / 60;
  return hours < 100 && minutes % 60 !== 0 ? hours.toFixed(1) : Math.round(hours).toLocaleString("en-GB");
}

export function hundredthsWords(hundredths: number | null): string {
  return hundredths === null ? noData : (hundredths / 100).toFixed(1);
}

export function figureWords({ unit, value }: MonthFigure): string {
  if (value === null) return noData;
  if (unit === "share") return percentWords(value);
  return unit === "pence" ? formatMoney(value) : value.toLocaleString("en-GB");
}

const counted = (n: number, one: string, many: string) =>
  `${n.toLocaleString("en-GB")} ${n === 1 ? one : many}`;

/** What the figure is made of: "918 of 1,110 hours on offer". */
export function madeOfWords({ key, numerator, denominator }: MonthFigure): string {
  switch (key) {
    case "booked":
      return `${hoursWords(numerator)} of ${hoursWords(denominator ?? 0)} hours on offer`;
    case "delivered":
      return `${hoursWords(numerator)} hours attended`;
    case "billed":
      return counted(numerator, "invoice", "invoices");
    case "collected":
      return counted(numerator, "payment", "payments");
    case "did-not-attend":
      return `${numerator.toLocaleString("en-GB")} of ${counted(denominator ?? 0, "visit due", "visits due")}`;
    case "cancelled":
      return `${numerator.toLocaleString("en-GB")} of ${counted(denominator ?? 0, "visit booked", "visits booked")}`;
    default:
      return "";
  }
}

/** "up 1 point", "down £1,212.00", "no change", against the month before. */
export function changeWords({ unit, value, before }: MonthFigure): string {
  if (value === null || before === null) return "no month before to compare";
  const difference = unit === "share" ? Math.round(value / 100) - Math.round(before / 100) : value - before;
  if (difference === 0) return "no change";
  const direction = difference > 0 ? "up" : "down";
  const size = Math.abs(difference);
  if (unit === "pence") return `${direction} ${formatMoney(size)}`;
  return unit === "share" ? `${direction} ${counted(size, "point", "points")}` : `${direction} ${size}`;
}

/** "+3", "−1" or "0" points between two shares; nothing where one has no data. */
export function pointsWords(now: number | null, before: number | null): string {
  if (now === null || before === null) return "";
  return signed(Math.round(now / 100) - Math.round(before / 100));
}

export function signed(n: number): string {
  return n > 0 ? `+${n}` : n < 0 ? `−${Math.abs(n)}` : "0";
}
