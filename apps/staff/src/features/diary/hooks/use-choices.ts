import { useQuery } from "@tanstack/react-query";
import { fetchChoices } from "../api-client";
import { diaryKeys } from "../query-keys";

/** Services, therapists, sites and rooms to choose from; they change seldom. */
export function useChoices(enabled = true) {
  return useQuery({
    queryKey: diaryKeys.choices,
    queryFn: ({ signal }) => fetchChoices(signal),
    staleTime: 300_000,
    enabled,
  });
}
