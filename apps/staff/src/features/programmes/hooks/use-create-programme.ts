import { useMutation, useQueryClient } from "@tanstack/react-query";
import type { CreateProgrammeInput } from "@withy/contracts/programmes";
import { newId } from "@withy/core/ids";
import { useRef } from "react";
import { createProgramme } from "../api-client";
import { programmeKeys } from "../query-keys";

/** Starts a programme; a press repeated after a lost answer finds the one that was made. */
export function useCreateProgramme(patientId: string) {
  const client = useQueryClient();
  const key = useRef<string | null>(null);
  return useMutation({
    mutationFn: (input: CreateProgrammeInput) => {
      key.current ??= newId();
      return createProgramme(input, key.current);
    },
    onSuccess: () => {
      key.current = null;
      return client.invalidateQueries({ queryKey: programmeKeys.ofPatient(patientId) });
    },
  });
}
