import { useMutation, useQueryClient } from "@tanstack/react-query";
import { useRouter } from "next/navigation";
import { startNote } from "../api-client";
import { clinicalKeys } from "../query-keys";

/** Begins the note of a visit, or opens the one that is begun, and goes there. */
export function useStartNote() {
  const client = useQueryClient();
  const router = useRouter();
  return useMutation({
    mutationFn: startNote,
    onSuccess: async (note) => {
      await client.invalidateQueries({ queryKey: clinicalKeys.all });
      router.push(`/notes/${note.id}`);
    },
  });
}
