import { useMutation, useQueryClient } from "@tanstack/react-query";
import type { InvoiceView } from "@withy/contracts/billing";
import { useChanges } from "@withy/ui/recent-changes";
import { useRef } from "react";
import { billingKeys } from "../query-keys";
import { timeNow } from "../time-now";

/**
 * A write on one invoice: puts the answer in place, reads the lists again and says what was done. The key is one for
 * each wording: pressing twice acts once, a corrected form is a new act.
 */
export function useInvoiceWrite<Input>(
  run: (input: Input, key: string) => Promise<InvoiceView>,
  describe: (view: InvoiceView, input: Input) => string,
) {
  const client = useQueryClient();
  const { announce } = useChanges();
  const last = useRef({ body: "", key: "" });
  return useMutation({
    mutationFn: (input: Input) => {
      const body = JSON.stringify(input);
      if (body !== last.current.body) last.current = { body, key: crypto.randomUUID() };
      return run(input, last.current.key);
    },
    onSuccess: async (view, input) => {
      last.current = { body: "", key: "" };
      client.setQueryData(billingKeys.invoice(view.id), view);
      announce({ at: timeNow(), said: describe(view, input) });
      await client.invalidateQueries({ queryKey: billingKeys.all });
    },
    onError: () => client.invalidateQueries({ queryKey: billingKeys.all }),
  });
}
