import { useQuery } from "@tanstack/react-query";
import type { NoteView } from "@withy/contracts/clinical";
import { fetchNote } from "../api-client";
import { clinicalKeys } from "../query-keys";

/** The note as the page was rendered with it; read again only when asked, since every read is recorded. */
export function useNote(first: NoteView) {
  return useQuery({
    queryKey: clinicalKeys.note(first.id),
    queryFn: ({ signal }) => fetchNote(first.id, signal),
    initialData: first,
    staleTime: Number.POSITIVE_INFINITY,
    refetchOnWindowFocus: false,
  });
}
