import { useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import { useChanges } from "@withy/ui/recent-changes";
import { deskKeys, fetchPutAside, type PutAside, putAside, removePutAside } from "../desk-client";

/** What lies in one's own tray. */
export function useTray(enabled: boolean) {
  const query = useQuery({
    queryKey: deskKeys.aside,
    queryFn: ({ signal }) => fetchPutAside(signal),
    enabled,
  });
  return query.data ?? [];
}

export function usePutAside() {
  const client = useQueryClient();
  const { announce } = useChanges();
  return useMutation({
    mutationFn: (input: PutAside) => putAside(input),
    onSuccess: ({ time }, input) => {
      announce({ at: time, said: `Put aside: ${input.title}` });
      void client.invalidateQueries({ queryKey: deskKeys.aside });
    },
  });
}

export function useRemovePutAside() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: removePutAside,
    onSettled: () => client.invalidateQueries({ queryKey: deskKeys.aside }),
  });
}
