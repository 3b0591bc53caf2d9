import { useMutation, useQueryClient } from "@tanstack/react-query";
import type { LetterView } from "@withy/contracts/letters";
import { letterKeys } from "../query-keys";

/** A write on one letter: puts the answer in place and reads the lists again. */
export function useLetterWrite<Input>(run: (input: Input) => Promise<LetterView>) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: run,
    onSuccess: async (view) => {
      client.setQueryData(letterKeys.letter(view.id), view);
      await client.invalidateQueries({ queryKey: letterKeys.lists });
    },
  });
}
