import type { FigureRow, PayerKind } from "@withy/contracts/reports";
import type { MonthSpan } from "../month-span";

/** What the rows behind a figure are asked for, checked and within reach. */
export interface Asked {
  readonly span: MonthSpan;
  readonly siteIds: readonly string[];
  readonly therapistId: string | undefined;
  readonly payerKind: PayerKind | undefined;
  readonly limit: number;
  readonly offset: number;
}

export interface RowsAnswer {
  readonly rows: readonly FigureRow[];
  readonly total: number;
  readonly sumMinutes: number | null;
  readonly sumPence: number | null;
}
