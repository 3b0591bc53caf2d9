import { useMutation } from "@tanstack/react-query";
import { makeApiKey, revokeApiKey } from "../api-client";

export function useMakeApiKey() {
  return useMutation({ mutationFn: makeApiKey });
}

export function useRevokeApiKey() {
  return useMutation({ mutationFn: revokeApiKey });
}
