import { keepPreviousData, useQuery } from "@tanstack/react-query";
import type { PatientPage } from "@withy/contracts/patients";
import { listPatients } from "../api-client";
import { patientKeys } from "../query-keys";

/**
 * One page of the search; the page before stays in sight until the new one is here.
 * @param painted the page that the server painted, and what it was asked
 */
export function usePatientList(
  search: string,
  page: number,
  painted: { search: string; first: PatientPage },
) {
  const isPainted = search === painted.search && page === painted.first.page;
  return useQuery({
    queryKey: patientKeys.list(search, page),
    queryFn: ({ signal }) => listPatients(search, page, signal),
    placeholderData: keepPreviousData,
    ...(isPainted ? { initialData: painted.first } : {}),
  });
}
