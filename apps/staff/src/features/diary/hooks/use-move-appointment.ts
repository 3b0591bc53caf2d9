import { weekdayDate } from "@withy/core/date-words";
import { type MoveAppointment, moveAppointment } from "../api-client";
import { useDiaryMutation } from "./use-diary-mutation";

/** Where the visit was, so that a move can be taken back. */
export type Origin = Pick<
  MoveAppointment,
  "startsAt" | "siteId" | "therapistId" | "roomId" | "durationMinutes"
>;

export function useMoveAppointment() {
  const run = ({ origin: _, ...input }: MoveAppointment & { origin: Origin }) => moveAppointment(input);
  return useDiaryMutation(run, (view, { origin }) => ({
    said: `${view.patient.name} moved to ${weekdayDate(view.day)}, ${view.startTime} with ${view.therapist.name}`,
    undo: () => moveAppointment({ ...origin, appointmentId: view.id, version: view.version }),
  }));
}
