import { type AppointmentView, undoInput } from "@withy/contracts/diary";
import { refuseIf } from "@withy/core/errors";
import { refusal } from "@withy/core/refusal";
import type { AppointmentState } from "@withy/diary/appointment-states";
import { once } from "../once";
import { verb } from "../verb";
import { readAppointment } from "./appointment-view";
import { type AppointmentRow, saveAppointment, takeAppointment } from "./change-appointment";
import { recordChange } from "./record-change";
import { closeChange, findUndo } from "./undo-change";

/** The instants that belong to states which the visit has not reached once it is put back. */
function cleared(to: AppointmentState): Partial<AppointmentRow> {
  if (to === "in-session") return { sessionEndedAt: null };
  if (to === "arrived") return { sessionStartedAt: null, sessionEndedAt: null };
  return { arrivedAt: null, sessionStartedAt: null, sessionEndedAt: null };
}

/** Takes back the last mark of a visit, one step, while nothing depends on it. */
export const undoMark = verb("diary.mark", undoInput, async (ctx, input): Promise<AppointmentView> => {
  await once(ctx, "appointment.undo-mark", async (tx) => {
    const before = await takeAppointment(tx, "diary.mark", input);
    if (before.state === "cancelled")
      refuseIf(refusal("wrong-state", "This visit is cancelled. Undo the cancellation instead."));
    const undo = await findUndo(tx, before);
    const after = await saveAppointment(tx, before, { state: undo.to, ...cleared(undo.to) });
    await closeChange(tx, before, undo);
    await recordChange(tx, "undone", before, after);
    return { appointmentId: before.id };
  });
  return readAppointment(ctx, input.appointmentId);
});
