import { useQuery } from "@tanstack/react-query";
import type { UnsignedItem } from "@withy/contracts/clinical";
import { fetchUnsigned } from "../api-client";
import { clinicalKeys } from "../query-keys";

export function useUnsignedNotes(first: UnsignedItem[]) {
  return useQuery({
    queryKey: clinicalKeys.unsigned,
    queryFn: ({ signal }) => fetchUnsigned(signal),
    initialData: first,
  });
}
