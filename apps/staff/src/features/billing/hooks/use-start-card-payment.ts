import { useMutation, useQueryClient } from "@tanstack/react-query";
import { type StartCardPayment, startCardPayment } from "../api-client";
import { billingKeys } from "../query-keys";

/** Begins a card payment and goes to the card company's page. */
export function useStartCardPayment() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (input: StartCardPayment) => startCardPayment(input, crypto.randomUUID()),
    onSuccess: ({ url }) => window.location.assign(url),
    onError: () => client.invalidateQueries({ queryKey: billingKeys.all }),
  });
}
