import { keepPreviousData, useQuery, useQueryClient } from "@tanstack/react-query";
import type { DiaryDayView } from "@withy/contracts/diary";
import { useEffect } from "react";
import { useLiveDiary } from "@/components/use-live-diary";
import { type DayFilters, fetchDay, fetchPulse } from "../api-client";
import { diaryKeys } from "../query-keys";

/** Where there is no stream, another desk's change still shows within two seconds: a cheap question every second and a half. */
const pulseMs = 1500;

/** The day, kept up to date with what other desks do. `first` is what the page was rendered with. */
export function useDiaryDay(filters: DayFilters, first: { filters: DayFilters; day: DiaryDayView }) {
  const client = useQueryClient();
  const isFirst = JSON.stringify(filters) === JSON.stringify(first.filters);
  const query = useQuery({
    queryKey: diaryKeys.day(filters),
    queryFn: ({ signal }) => fetchDay(filters, signal),
    placeholderData: keepPreviousData,
    ...(isFirst ? { initialData: first.day } : {}),
  });
  const siteIds = query.data?.sites.map((site) => site.id) ?? [];
  const isLive = useLiveDiary(siteIds);
  const pulse = useQuery({
    queryKey: diaryKeys.pulse(siteIds),
    queryFn: ({ signal }) => fetchPulse(siteIds, signal),
    enabled: siteIds.length > 0 && !isLive,
    refetchInterval: pulseMs,
    staleTime: 0,
  });
  const theirs = pulse.data?.pulse;
  const ours = query.data?.pulse;
  const isIdle = !query.isFetching;
  useEffect(() => {
    if (!isLive && theirs !== undefined && isIdle && theirs !== ours)
      void client.invalidateQueries({ queryKey: diaryKeys.all });
  }, [isLive, theirs, ours, isIdle, client]);
  return query;
}
