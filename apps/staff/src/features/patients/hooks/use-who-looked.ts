import { keepPreviousData, useQuery } from "@tanstack/react-query";
import { whoLooked } from "../api-client";
import { patientKeys } from "../query-keys";

export function useWhoLooked(patientId: string, page: number) {
  return useQuery({
    queryKey: patientKeys.looks(patientId, page),
    queryFn: ({ signal }) => whoLooked(patientId, page, signal),
    placeholderData: keepPreviousData,
  });
}
