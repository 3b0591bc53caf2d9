import { useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import type { SessionRow } from "@withy/contracts/practices";
import { endAllSessions, endSession, listMySessions } from "../api-client";
import { practiceKeys } from "../query-keys";

/** @param first the list as the server painted it */
export function useSessions(first: SessionRow[]) {
  return useQuery({
    queryKey: practiceKeys.sessions,
    queryFn: ({ signal }) => listMySessions(signal),
    initialData: first,
  });
}

export function useEndSession() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: endSession,
    onSettled: () => client.invalidateQueries({ queryKey: practiceKeys.sessions }),
  });
}

export function useEndAllSessions() {
  return useMutation({ mutationFn: endAllSessions });
}
