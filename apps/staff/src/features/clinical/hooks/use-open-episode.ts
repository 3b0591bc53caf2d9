import { useMutation, useQueryClient } from "@tanstack/react-query";
import type { OpenEpisodeInput } from "@withy/contracts/clinical";
import { useState } from "react";
import { openEpisode } from "../api-client";
import { clinicalKeys } from "../query-keys";

export function useOpenEpisode() {
  const client = useQueryClient();
  const [key] = useState(() => crypto.randomUUID());
  return useMutation({
    mutationFn: (input: OpenEpisodeInput) => openEpisode(input, key),
    onSuccess: (view) => client.invalidateQueries({ queryKey: clinicalKeys.episodes(view.patient.id) }),
  });
}
