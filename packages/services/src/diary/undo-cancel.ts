import { type AppointmentView, undoInput } from "@withy/contracts/diary";
import { refuseIf } from "@withy/core/errors";
import { refusal } from "@withy/core/refusal";
import { addMinutes, minutesBetween } from "@withy/core/zoned-time";
import { services, sites } from "@withy/db/schema";
import { loadRecord } from "../load-record";
import { once } from "../once";
import { verb } from "../verb";
import { readAppointment } from "./appointment-view";
import { notCancelled } from "./cancellation";
import { saveAppointment, takeAppointment } from "./change-appointment";
import { claimSlots } from "./claim-slots";
import { recordChange } from "./record-change";
import { sendVisitMessage } from "./send-visit-message";
import { slotTaken } from "./slot-taken";
import { closeChange, findUndo } from "./undo-change";

/** Brings a cancelled visit back to what it was, unless its time has gone to someone else since. */
export const undoCancel = verb("diary.cancel", undoInput, async (ctx, input): Promise<AppointmentView> => {
  await once(ctx, "appointment.undo-cancel", async (tx) => {
    const before = await takeAppointment(tx, "diary.cancel", input);
    if (before.state !== "cancelled")
      refuseIf(refusal("wrong-state", "This visit is not cancelled. Reload to see what changed."));
    const undo = await findUndo(tx, before);
    const { id, therapistId, roomId, startsAt, endsAt, cleanDownMinutes } = before;
    const claim = {
      appointmentId: id,
      therapistId,
      roomId,
      startsAt,
      until: addMinutes(endsAt, cleanDownMinutes),
    };
    if (!(await claimSlots(tx, claim))) {
      const site = await loadRecord(tx, sites, before.siteId, "site");
      const { roomKind, needsEquipment } = await loadRecord(tx, services, before.serviceId, "service");
      const durationMinutes = minutesBetween(startsAt, endsAt);
      const needs = { kind: roomKind, equipment: needsEquipment, isStepFree: false };
      throw await slotTaken(tx, { ...claim, site, needs, durationMinutes, cleanDownMinutes });
    }
    const after = await saveAppointment(tx, before, { state: undo.to, ...notCancelled });
    await closeChange(tx, before, undo);
    await recordChange(tx, "undone", before, after);
    await sendVisitMessage(tx, "booking-confirmed", id);
    return { appointmentId: id };
  });
  return readAppointment(ctx, input.appointmentId);
});
