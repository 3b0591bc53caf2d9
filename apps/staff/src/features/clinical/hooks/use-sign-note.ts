import { useMutation, useQueryClient } from "@tanstack/react-query";
import type { NoteView } from "@withy/contracts/clinical";
import { useChanges } from "@withy/ui/recent-changes";
import { useRouter } from "next/navigation";
import { signNote } from "../api-client";
import { clinicalKeys } from "../query-keys";
import { clockAt } from "../site-time";
import type { NoteDraft } from "./use-note-draft";

/** Saves what is on the page, then signs exactly that. */
export function useSignNote(note: NoteView, draft: NoteDraft) {
  const client = useQueryClient();
  const { announce } = useChanges();
  const router = useRouter();
  return useMutation({
    mutationFn: async () => {
      if (!(await draft.keeper.flush())) return null;
      return signNote({ noteId: note.id, version: draft.keeper.version });
    },
    onSuccess: async (signed) => {
      if (!signed) return;
      client.setQueryData(clinicalKeys.note(note.id), signed);
      announce({ at: clockAt(new Date(), note.zone), said: `Note of ${note.patient.name} signed` });
      await client.invalidateQueries({ queryKey: clinicalKeys.all });
      router.refresh();
    },
  });
}
