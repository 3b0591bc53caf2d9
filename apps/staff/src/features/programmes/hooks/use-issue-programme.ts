import { useMutation } from "@tanstack/react-query";
import { newId } from "@withy/core/ids";
import { useRef } from "react";
import { issueProgramme } from "../api-client";

export function useIssueProgramme() {
  const key = useRef<string | null>(null);
  return useMutation({
    mutationFn: (input: { programmeId: string; version: number }) => {
      key.current ??= newId();
      return issueProgramme(input, key.current);
    },
    onSettled: () => {
      key.current = null;
    },
  });
}
