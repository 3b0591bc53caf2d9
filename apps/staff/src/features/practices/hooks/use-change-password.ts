import { useMutation, useQueryClient } from "@tanstack/react-query";
import { changePassword } from "../api-client";
import { practiceKeys } from "../query-keys";

export function useChangePassword() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: changePassword,
    onSuccess: () => client.invalidateQueries({ queryKey: practiceKeys.sessions }),
  });
}
