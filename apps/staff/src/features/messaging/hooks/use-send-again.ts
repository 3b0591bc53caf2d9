import { useMutation, useQueryClient } from "@tanstack/react-query";
import { useRef } from "react";
import { sendMessageAgain } from "../api-client";
import { messageKeys } from "../query-keys";

/** One key until the answer is here: a second press before that sends nothing more. */
export function useSendAgain() {
  const client = useQueryClient();
  const key = useRef<string | null>(null);
  return useMutation({
    mutationFn: (messageId: string) => {
      key.current ??= crypto.randomUUID();
      return sendMessageAgain(messageId, key.current);
    },
    onSuccess: () => {
      key.current = null;
    },
    onSettled: () => client.invalidateQueries({ queryKey: messageKeys.all }),
  });
}
