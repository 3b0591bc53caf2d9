import { useQuery } from "@tanstack/react-query";
import type { MeasureSeriesView } from "@withy/contracts/clinical";
import { fetchMeasures } from "../api-client";
import { clinicalKeys } from "../query-keys";

export function useMeasures(episodeId: string, first: MeasureSeriesView[]) {
  return useQuery({
    queryKey: clinicalKeys.measures(episodeId),
    queryFn: ({ signal }) => fetchMeasures(episodeId, signal),
    initialData: first,
    staleTime: 60_000,
    refetchOnWindowFocus: false,
  });
}
