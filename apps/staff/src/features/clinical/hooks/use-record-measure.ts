import { useMutation, useQueryClient } from "@tanstack/react-query";
import type { RecordMeasureInput } from "@withy/contracts/clinical";
import { useState } from "react";
import { recordMeasure } from "../api-client";
import { clinicalKeys } from "../query-keys";

export function useRecordMeasure(episodeId: string) {
  const client = useQueryClient();
  const [key, setKey] = useState(() => crypto.randomUUID());
  return useMutation({
    mutationFn: (input: Omit<RecordMeasureInput, "episodeId">) => recordMeasure({ episodeId, ...input }, key),
    onSuccess: async () => {
      setKey(crypto.randomUUID());
      await client.invalidateQueries({ queryKey: clinicalKeys.measures(episodeId) });
    },
  });
}
