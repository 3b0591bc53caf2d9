import { stateFacts } from "@withy/diary/appointment-states";
import { undoCancel, undoMark } from "../api-client";
import { useDiaryMutation } from "./use-diary-mutation";

/** Takes back the last mark, or a cancellation. */
export function useUndoMark() {
  const run = ({
    isCancelled,
    ...input
  }: {
    appointmentId: string;
    version: number;
    isCancelled: boolean;
  }) => (isCancelled ? undoCancel(input) : undoMark(input));
  return useDiaryMutation(run, (view) => ({
    said: `${view.patient.name}: back to ${stateFacts[view.state].word.toLowerCase()}`,
  }));
}
