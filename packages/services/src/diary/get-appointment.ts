import { getAppointmentInput } from "@withy/contracts/diary";
import { verb } from "../verb";
import { readAppointment } from "./appointment-view";

/** One visit, with what may be done to it now. */
export const getAppointment = verb("diary.read", getAppointmentInput, (ctx, input) =>
  readAppointment(ctx, input.appointmentId),
);
