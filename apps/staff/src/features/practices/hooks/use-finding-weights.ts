import { useMutation } from "@tanstack/react-query";
import { changeFindingWeights } from "../api-client";

export function useChangeFindingWeights() {
  return useMutation({ mutationFn: changeFindingWeights });
}
