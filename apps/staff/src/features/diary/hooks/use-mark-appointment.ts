import { stateFacts } from "@withy/diary/appointment-states";
import { markAppointment, undoMark } from "../api-client";
import { useDiaryMutation } from "./use-diary-mutation";

export function useMarkAppointment() {
  return useDiaryMutation(markAppointment, (view, input) => ({
    said: `${view.patient.name}: ${stateFacts[input.to].word.toLowerCase()}`,
    undo: view.undoTo ? () => undoMark({ appointmentId: view.id, version: view.version }) : undefined,
  }));
}
