import { keepPreviousData, useQuery } from "@tanstack/react-query";
import type { TherapistWeekView } from "@withy/contracts/diary";
import { fetchWeek } from "../api-client";
import { diaryKeys } from "../query-keys";

export function useTherapistWeek(therapistId: string, day: string, first: TherapistWeekView) {
  const isFirst = first.therapist.id === therapistId && first.days.some((d) => d.day === day);
  return useQuery({
    queryKey: diaryKeys.week(therapistId, day),
    queryFn: ({ signal }) => fetchWeek(therapistId, day, signal),
    placeholderData: keepPreviousData,
    refetchInterval: 5000,
    ...(isFirst ? { initialData: first } : {}),
  });
}
