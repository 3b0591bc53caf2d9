import { appointmentMessagePayload } from "@withy/contracts/diary";
import { appointments, patients } from "@withy/db/schema";
import { visitReminder } from "@withy/documents/message/appointment-emails";
import { findRecord } from "../load-record";
import { isConsentWithdrawn } from "../patients/is-consent-withdrawn";
import type { Renderer } from "./message-renderer";
import { messageOf } from "./render-appointment-message";

/** Null where the visit was cancelled, moved or has begun since, or where the patient wants no e-mail any more. */
export const renderVisitReminder: Renderer = async (ctx, row) => {
  const payload = appointmentMessagePayload.parse(row.payload);
  const at = { db: ctx.db, practiceId: row.practiceId };
  const visit = await findRecord(at, appointments, payload.appointmentId);
  const isOpen = visit?.state === "booked" || visit?.state === "confirmed";
  if (!visit || !isOpen || visit.startsAt <= ctx.clock.now()) return null;
  if (visit.startsAt.getTime() !== new Date(payload.startsAt).getTime()) return null;
  const patient = await findRecord(at, patients, visit.patientId);
  if (patient?.preferredChannel !== "email" || patient.email === null) return null;
  if (await isConsentWithdrawn(at, patient.id, "email")) return null;
  return visitReminder(messageOf(payload));
};
