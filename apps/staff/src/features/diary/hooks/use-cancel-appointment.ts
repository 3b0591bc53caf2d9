import { cancelAppointment, undoCancel } from "../api-client";
import { useDiaryMutation } from "./use-diary-mutation";

export function useCancelAppointment() {
  return useDiaryMutation(cancelAppointment, (view) => ({
    said: `${view.patient.name}, ${view.startTime} with ${view.therapist.name}: cancelled`,
    undo: () => undoCancel({ appointmentId: view.id, version: view.version }),
  }));
}
