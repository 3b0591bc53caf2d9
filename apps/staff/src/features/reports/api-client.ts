import type { FigureRowsView, ListFigureRowsInput } from "@withy/contracts/reports";
import { get } from "@/api/request";

export const listFigureRows = (asked: ListFigureRowsInput, signal?: AbortSignal) =>
  get<FigureRowsView>("/api/reports/rows", { ...asked } as Record<string, string | number>, signal);
