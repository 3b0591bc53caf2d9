import { keepPreviousData, useQuery } from "@tanstack/react-query";
import type { ListAuditInput } from "@withy/contracts/audit";
import { listAudit } from "../api-client";
import { practiceKeys } from "../query-keys";

export function useAudit(filter: ListAuditInput) {
  return useQuery({
    queryKey: practiceKeys.audit(filter),
    queryFn: ({ signal }) => listAudit(filter, signal),
    placeholderData: keepPreviousData,
  });
}
