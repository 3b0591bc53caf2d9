import { keepPreviousData, useQuery } from "@tanstack/react-query";
import { listPatients } from "../api-client";
import { patientKeys } from "../query-keys";

/** One page of the search; the page before stays in sight until the new one is here. */
export function usePatientList(search: string, page: number) {
  return useQuery({
    queryKey: patientKeys.list(search, page),
    queryFn: ({ signal }) => listPatients(search, page, signal),
    placeholderData: keepPreviousData,
  });
}
