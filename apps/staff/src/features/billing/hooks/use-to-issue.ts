import { useQuery } from "@tanstack/react-query";
import type { ToIssueView } from "@withy/contracts/billing";
import { fetchToIssue } from "../api-client";
import { billingKeys } from "../query-keys";

export function useToIssue(first: ToIssueView): ToIssueView {
  const { data } = useQuery({
    queryKey: billingKeys.toIssue,
    queryFn: ({ signal }) => fetchToIssue(signal),
    initialData: first,
  });
  return data;
}
