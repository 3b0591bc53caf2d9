import { useMutation, useQueryClient } from "@tanstack/react-query";
import type { CardPaymentView } from "@withy/contracts/billing";
import { useChanges } from "@withy/ui/recent-changes";
import { cancelCardPayment, checkCardPayment } from "../api-client";
import { billingKeys } from "../query-keys";
import { timeNow } from "../time-now";

const sentences: Record<CardPaymentView["state"], string> = {
  paid: "The card payment was made",
  expired: "The card payment was closed; nothing was taken",
  failed: "The card payment failed; nothing was taken",
  open: "The card payment is still open",
  asked: "The card company has not answered yet",
};

/** Asks how an open card payment stands, or closes it; both post what the card company says. */
export function useCardPayment(verb: "check" | "cancel") {
  const client = useQueryClient();
  const { announce } = useChanges();
  return useMutation({
    mutationFn: verb === "check" ? checkCardPayment : cancelCardPayment,
    onSuccess: ({ state }) => announce({ at: timeNow(), said: sentences[state] }),
    onSettled: () => client.invalidateQueries({ queryKey: billingKeys.all }),
  });
}
