import { useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import type { EpisodeView } from "@withy/contracts/clinical";
import { fetchEpisode } from "../api-client";
import { clinicalKeys } from "../query-keys";

export function useEpisode(first: EpisodeView) {
  return useQuery({
    queryKey: clinicalKeys.episode(first.id),
    queryFn: ({ signal }) => fetchEpisode(first.id, signal),
    initialData: first,
    staleTime: 60_000,
    refetchOnWindowFocus: false,
  });
}

/** A write that answers with the whole episode: the answer takes its place, lists are read again. */
export function useEpisodeWrite<Input>(run: (input: Input) => Promise<EpisodeView>) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: run,
    onSuccess: async (view) => {
      client.setQueryData(clinicalKeys.episode(view.id), view);
      await client.invalidateQueries({ queryKey: clinicalKeys.episodes(view.patient.id) });
    },
  });
}
