import { useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import type { CoverPlanView } from "@withy/contracts/diary";
import { timeOf } from "@withy/core/wall-clock";
import { useChanges } from "@withy/ui/recent-changes";
import { applyCoverPlan, decideCoverMove, fetchCoverPlan, undoCoverPlan } from "../cover-api";
import { counted } from "../cover-words";
import { diaryKeys } from "../query-keys";

const askEveryMs = 700;

const isUnderWay = (plan: CoverPlanView | undefined): boolean =>
  plan?.state === "solving" && plan.job?.state !== "failed";

/** One plan: asked for until the worker has it, decided, applied and taken back. */
export function useCoverPlan(first: CoverPlanView) {
  const client = useQueryClient();
  const { announce } = useChanges();
  const queryKey = diaryKeys.cover(first.id);
  const { data: plan = first } = useQuery({
    queryKey,
    queryFn: ({ signal }) => fetchCoverPlan(first.id, signal),
    initialData: first,
    refetchInterval: ({ state }) => (isUnderWay(state.data) ? askEveryMs : false),
  });
  const settle = (view: CoverPlanView) => client.setQueryData(queryKey, view);
  const moved = (view: CoverPlanView, said: string) => {
    settle(view);
    announce({ at: timeOf(new Date(), view.zone), said });
    void client.invalidateQueries({ queryKey: diaryKeys.all });
  };
  const visits = (view: CoverPlanView) => counted(view.moves.filter((m) => m.place !== null).length, "visit");
  const decide = useMutation({ mutationFn: decideCoverMove, onSuccess: settle });
  const apply = useMutation({
    mutationFn: () => applyCoverPlan(plan),
    onSuccess: (view) => moved(view, `Cover for ${view.cause.name} applied, ${visits(view)} moved`),
  });
  const undo = useMutation({
    mutationFn: () => undoCoverPlan(plan),
    onSuccess: (view) => moved(view, `Cover for ${view.cause.name} undone, ${visits(view)} moved back`),
  });
  return { plan, isUnderWay: isUnderWay(plan), decide, apply, undo };
}
