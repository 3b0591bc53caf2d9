import type { ListFigureRowsInput } from "@withy/contracts/reports";

export const reportKeys = {
  rows: (asked: ListFigureRowsInput | null) => ["reports", "rows", asked] as const,
};
