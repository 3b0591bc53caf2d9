import { keepPreviousData, useQuery } from "@tanstack/react-query";
import type { LetterRow } from "@withy/contracts/letters";
import type { Page } from "@withy/contracts/page";
import { fetchLetters, type LetterFilters } from "../api-client";
import { letterKeys } from "../query-keys";

export function useLetters(filters: LetterFilters, first: Page<LetterRow>) {
  return useQuery({
    queryKey: letterKeys.list(filters),
    queryFn: ({ signal }) => fetchLetters(filters, signal),
    initialData: first,
    placeholderData: keepPreviousData,
    staleTime: 10_000,
  });
}
