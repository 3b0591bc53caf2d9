import { useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import type { ToIssueView } from "@withy/contracts/billing";
import { useChanges } from "@withy/ui/recent-changes";
import { draftVisits, fetchToIssue } from "../api-client";
import { billingKeys } from "../query-keys";
import { timeNow } from "../time-now";

export function useToIssue(first: ToIssueView): ToIssueView {
  const { data } = useQuery({
    queryKey: billingKeys.toIssue,
    queryFn: ({ signal }) => fetchToIssue(signal),
    initialData: first,
  });
  return data;
}

export function useDraftVisits() {
  const client = useQueryClient();
  const { announce } = useChanges();
  return useMutation({
    mutationFn: draftVisits,
    onSuccess: ({ visitsDrafted, invoiceIds }) => {
      const drafts = `${invoiceIds.length} ${invoiceIds.length === 1 ? "draft" : "drafts"}`;
      announce({ at: timeNow(), said: `${visitsDrafted} visits put on ${drafts}` });
    },
    onSettled: () => client.invalidateQueries({ queryKey: billingKeys.all }),
  });
}
