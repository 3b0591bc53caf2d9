import { keepPreviousData, useQuery } from "@tanstack/react-query";
import type { ListFigureRowsInput } from "@withy/contracts/reports";
import { listFigureRows } from "../api-client";
import { reportKeys } from "../query-keys";

export function useFigureRows(asked: ListFigureRowsInput) {
  return useQuery({
    queryKey: reportKeys.rows(asked),
    queryFn: ({ signal }) => listFigureRows(asked, signal),
    placeholderData: keepPreviousData,
  });
}
