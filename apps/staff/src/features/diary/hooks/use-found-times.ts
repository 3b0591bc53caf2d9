import { keepPreviousData, useQuery } from "@tanstack/react-query";
import { fetchTimes } from "../api-client";
import { diaryKeys } from "../query-keys";

export function useFoundTimes(wishes: Parameters<typeof fetchTimes>[0] | null) {
  return useQuery({
    queryKey: diaryKeys.times(wishes ?? {}),
    queryFn: ({ signal }) => fetchTimes(wishes ?? {}, signal),
    enabled: wishes !== null,
    placeholderData: keepPreviousData,
  });
}
