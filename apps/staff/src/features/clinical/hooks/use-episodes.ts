import { useQuery } from "@tanstack/react-query";
import { fetchEpisodes } from "../api-client";
import { clinicalKeys } from "../query-keys";

/** A patient's episodes, asked for only when someone must choose one. */
export function useEpisodes(patientId: string) {
  return useQuery({
    queryKey: clinicalKeys.episodes(patientId),
    queryFn: ({ signal }) => fetchEpisodes(patientId, signal),
  });
}
