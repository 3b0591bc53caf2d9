import { useInfiniteQuery } from "@tanstack/react-query";
import type { TimelineKind, TimelineView } from "@withy/contracts/patients";
import { getTimeline } from "../api-client";
import { patientKeys } from "../query-keys";

/** The timeline as far back as it has been asked for. @param first the newest page, as the server painted it */
export function useTimeline(patientId: string, kind: TimelineKind, first: TimelineView) {
  return useInfiniteQuery({
    queryKey: patientKeys.timeline(patientId, kind),
    queryFn: ({ pageParam, signal }) =>
      getTimeline({ patientId, kind, ...(pageParam === null ? {} : { before: pageParam }) }, signal),
    initialPageParam: null as string | null,
    getNextPageParam: (page) => page.next,
    refetchOnWindowFocus: false,
    ...(kind === "all" ? { initialData: { pages: [first], pageParams: [null] } } : {}),
  });
}
