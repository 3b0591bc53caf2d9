import { useQuery, useQueryClient } from "@tanstack/react-query";
import type { NoteView } from "@withy/contracts/clinical";
import { useCallback } from "react";
import { fetchNote } from "../api-client";
import { newerNote } from "../newer-note";
import { clinicalKeys } from "../query-keys";

/** The note as this window last knew it; read again only when asked, since every read is recorded. */
export function useNote(first: NoteView): NoteView {
  const { data } = useQuery({
    queryKey: clinicalKeys.note(first.id),
    queryFn: ({ signal }) => fetchNote(first.id, signal),
    initialData: first,
    staleTime: Number.POSITIVE_INFINITY,
    refetchOnWindowFocus: false,
  });
  return newerNote(data, first);
}

/** Keeps what this window has just saved, so that coming back to the page shows it. */
export function useNoteChange(note: NoteView) {
  const client = useQueryClient();
  return useCallback(
    (change: (held: NoteView) => NoteView) =>
      client.setQueryData<NoteView>(clinicalKeys.note(note.id), (held) =>
        change(held ? newerNote(held, note) : note),
      ),
    [client, note],
  );
}
