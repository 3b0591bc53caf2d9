import { useQuery } from "@tanstack/react-query";
import { fetchAppointment } from "../api-client";
import { diaryKeys } from "../query-keys";

export function useAppointment(id: string | null) {
  return useQuery({
    queryKey: diaryKeys.appointment(id ?? ""),
    queryFn: ({ signal }) => fetchAppointment(id ?? "", signal),
    enabled: id !== null,
  });
}
