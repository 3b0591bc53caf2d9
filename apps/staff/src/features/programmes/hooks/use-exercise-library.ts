import { keepPreviousData, useQuery } from "@tanstack/react-query";
import type { ExerciseLibraryView, ExerciseSearchInput } from "@withy/contracts/programmes";
import { fetchLibrary } from "../api-client";
import { programmeKeys } from "../query-keys";

/** The library under a filter. The library ships with the app, so an answer stays good. */
export function useExerciseLibrary(
  filter: ExerciseSearchInput,
  first: { filter: string; view: ExerciseLibraryView },
) {
  return useQuery({
    queryKey: programmeKeys.library(filter),
    queryFn: ({ signal }) => fetchLibrary(filter, signal),
    ...(first.filter === JSON.stringify(filter) ? { initialData: first.view } : {}),
    placeholderData: keepPreviousData,
    staleTime: Number.POSITIVE_INFINITY,
  });
}
