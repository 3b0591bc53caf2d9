import { useMutation, useQueryClient } from "@tanstack/react-query";
import type { NoteView } from "@withy/contracts/clinical";
import { useChanges } from "@withy/ui/recent-changes";
import { useState } from "react";
import { addAddendum } from "../api-client";
import { clinicalKeys } from "../query-keys";
import { clockAt } from "../site-time";

export function useAddAddendum(note: NoteView) {
  const client = useQueryClient();
  const { announce } = useChanges();
  const [key, setKey] = useState(() => crypto.randomUUID());
  return useMutation({
    mutationFn: (input: { reason: string; text: string }) => addAddendum({ noteId: note.id, ...input }, key),
    onSuccess: async (changed) => {
      setKey(crypto.randomUUID());
      client.setQueryData(clinicalKeys.note(note.id), changed);
      announce({ at: clockAt(new Date(), note.zone), said: `Addendum to the note of ${note.patient.name}` });
      await client.invalidateQueries({ queryKey: clinicalKeys.all });
    },
  });
}
