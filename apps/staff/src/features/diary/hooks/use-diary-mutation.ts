import { useMutation, useQueryClient } from "@tanstack/react-query";
import type { AppointmentView } from "@withy/contracts/diary";
import { timeOf } from "@withy/core/wall-clock";
import { useChanges } from "@withy/ui/recent-changes";
import { diaryKeys } from "../query-keys";

interface Said {
  said: string;
  undo?: (() => Promise<AppointmentView>) | undefined;
}

/** A write on one visit: puts the answer in place, reads the rest again, and adds a line to the recent changes. */
export function useDiaryMutation<Input>(
  run: (input: Input) => Promise<AppointmentView>,
  describe: (view: AppointmentView, input: Input) => Said,
) {
  const client = useQueryClient();
  const { announce } = useChanges();
  // Reading everything again is not waited for: the answer itself already stands in its place.
  const settle = (view: AppointmentView) => {
    client.setQueryData(diaryKeys.appointment(view.id), view);
    void client.invalidateQueries({ queryKey: diaryKeys.all });
  };
  return useMutation({
    mutationFn: run,
    onSuccess: (view, input) => {
      const { said, undo } = describe(view, input);
      const at = timeOf(new Date(), view.site.zone);
      announce({ at, said, ...(undo ? { undo: () => undo().then(settle) } : {}) });
      settle(view);
    },
  });
}
