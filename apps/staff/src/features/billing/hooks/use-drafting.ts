import { useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import { mostVisitsAtOnce } from "@withy/billing/draft-groups";
import type { DraftingJobView } from "@withy/contracts/billing";
import { useChanges } from "@withy/ui/recent-changes";
import { useEffect, useRef, useState } from "react";
import { draftVisits, fetchDrafting, startDrafting } from "../api-client";
import { billingKeys } from "../query-keys";
import { timeNow } from "../time-now";

const askEveryMs = 700;

const isLive = (job: DraftingJobView | undefined): boolean =>
  job?.state === "waiting" || job?.state === "running";

const counted = (count: number, one: string): string => `${count} ${one}${count === 1 ? "" : "s"}`;

const draftedWords = (visits: number, drafts: number): string =>
  `${counted(visits, "visit")} put on ${counted(drafts, "draft")}`;

/**
 * Drafts what waits: a few visits at once, many by the worker, whose progress is asked for until it ends.
 * @param live what was under way already when the screen was opened
 */
export function useDrafting(live: DraftingJobView | null) {
  const client = useQueryClient();
  const { announce } = useChanges();
  const refresh = () => client.invalidateQueries({ queryKey: billingKeys.all });
  const [followed, follow] = useState(live);
  const atOnce = useMutation({
    mutationFn: () => draftVisits({}),
    onSuccess: ({ visitsDrafted, invoiceIds }) =>
      announce({ at: timeNow(), said: draftedWords(visitsDrafted, invoiceIds.length) }),
    onSettled: refresh,
  });
  const start = useMutation({ mutationFn: startDrafting, onSuccess: follow });
  const job = useJob(followed, (ended) => {
    if (ended.result)
      announce({ at: timeNow(), said: draftedWords(ended.result.visitsDrafted, ended.result.drafts) });
    void refresh();
  });
  return {
    /** @param visits how many will be drafted; null where nobody knows how many there are */
    run: (visits: number | null) => {
      follow(null);
      const isMany = visits === null || visits > mostVisitsAtOnce;
      (isMany ? atOnce : start).reset();
      (isMany ? start : atOnce).mutate();
    },
    isBusy: atOnce.isPending || start.isPending || isLive(job),
    progress: job && isLive(job) ? job : null,
    problem: atOnce.error?.message ?? start.error?.message ?? job?.problem ?? null,
  };
}

/** The job as it stands, asked for until it has ended, which is told once. */
function useJob(started: DraftingJobView | null, onEnd: (job: DraftingJobView) => void) {
  const id = started?.id;
  const { data } = useQuery({
    queryKey: billingKeys.drafting(id),
    queryFn: ({ signal }) => fetchDrafting(id ?? "", signal),
    enabled: id !== undefined,
    refetchInterval: ({ state }) => (isLive(state.data) ? askEveryMs : false),
    ...(started && { initialData: started, initialDataUpdatedAt: 0 }),
  });
  const told = useRef<string | null>(null);
  const end = useRef(onEnd);
  useEffect(() => {
    end.current = onEnd;
  });
  useEffect(() => {
    if (!data || isLive(data) || told.current === data.id) return;
    told.current = data.id;
    end.current(data);
  }, [data]);
  return data;
}
