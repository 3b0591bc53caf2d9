import { useMutation, useQueryClient } from "@tanstack/react-query";
import { formatMoney } from "@withy/core/money";
import { useChanges } from "@withy/ui/recent-changes";
import { discardDraft, editDraft, issueInvoice, voidInvoice } from "../api-client";
import { billingKeys } from "../query-keys";
import { timeNow } from "../time-now";
import { useInvoiceWrite } from "./use-invoice-write";

export function useEditDraft() {
  return useInvoiceWrite(
    editDraft,
    (view) => `Draft for ${view.patient.name} saved, ${formatMoney(view.totalPence)}`,
  );
}

export function useIssueInvoice() {
  return useInvoiceWrite(issueInvoice, (view) => `${view.reference} issued, ${formatMoney(view.totalPence)}`);
}

export function useVoidInvoice() {
  return useInvoiceWrite(voidInvoice, (view) => `${view.reference} made void`);
}

export function useDiscardDraft() {
  const client = useQueryClient();
  const { announce } = useChanges();
  return useMutation({
    mutationFn: discardDraft,
    onSuccess: () => {
      announce({ at: timeNow(), said: "Draft discarded; its visits wait to be invoiced" });
      return client.invalidateQueries({ queryKey: billingKeys.toIssue });
    },
  });
}
