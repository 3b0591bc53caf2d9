import { useMutation, useQueryClient } from "@tanstack/react-query";
import { timeOf } from "@withy/core/wall-clock";
import { stateFacts } from "@withy/diary/appointment-states";
import { useChanges } from "@withy/ui/recent-changes";
import { markArrival, undoArrival } from "../api-client";
import { todayKeys } from "../query-keys";

/** Marks a visit from its line, and offers the undo. */
export function useMarkArrival() {
  const client = useQueryClient();
  const { announce } = useChanges();
  const refresh = () => {
    void client.invalidateQueries({ queryKey: todayKeys.all });
  };
  return useMutation({
    mutationFn: markArrival,
    onSuccess: (view, input) => {
      announce({
        at: timeOf(new Date(), view.site.zone),
        said: `${view.patient.name}: ${stateFacts[input.to].word.toLowerCase()}`,
        ...(view.undoTo ? { undo: () => undoArrival(view).then(refresh) } : {}),
      });
    },
    onSettled: refresh,
  });
}
