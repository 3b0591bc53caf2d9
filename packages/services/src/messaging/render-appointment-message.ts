import { type AppointmentMessagePayload, appointmentMessagePayload } from "@withy/contracts/diary";
import { appointments } from "@withy/db/schema";
import {
  type AppointmentMessage,
  bookingCancelled,
  bookingConfirmed,
  bookingMoved,
} from "@withy/documents/message/appointment-emails";
import type { SystemContext } from "../context";
import { findRecord } from "../load-record";
import type { OutboxRow } from "./claim-messages";
import type { Renderer } from "./message-renderer";

/** The payload as the message's writer wants it. */
export function messageOf(payload: AppointmentMessagePayload): AppointmentMessage {
  return {
    appointment: {
      id: payload.appointmentId,
      version: payload.version,
      startsAt: new Date(payload.startsAt),
      endsAt: new Date(payload.endsAt),
      practiceEmail: payload.practiceEmail,
      place: payload.place,
      withWhom: payload.withWhom,
      attendee: payload.attendee,
      at: new Date(payload.at),
    },
    sender: { practice: payload.practice, contactLines: payload.contactLines },
    phone: payload.phone,
    zone: payload.zone,
    greetingName: payload.greetingName,
    noticeHours: payload.noticeHours,
  };
}

/** Whether the visit still stands as the message says: people act on what they read last. */
async function isStillTrue(
  ctx: SystemContext,
  row: OutboxRow,
  payload: AppointmentMessagePayload,
): Promise<boolean> {
  const visit = await findRecord(
    { db: ctx.db, practiceId: row.practiceId },
    appointments,
    payload.appointmentId,
  );
  if (!visit || visit.startsAt.getTime() !== new Date(payload.startsAt).getTime()) return false;
  const isCancelled = visit.state === "cancelled";
  return row.template === "booking-cancelled"
    ? isCancelled
    : !isCancelled && visit.startsAt > ctx.clock.now();
}

export const renderAppointmentMessage: Renderer = async (ctx, row) => {
  const payload = appointmentMessagePayload.parse(row.payload);
  if (!(await isStillTrue(ctx, row, payload))) return null;
  const message = messageOf(payload);
  if (row.template === "booking-cancelled") return bookingCancelled(message);
  if (row.template === "booking-moved" && payload.previousStartsAt !== null) {
    return bookingMoved(message, new Date(payload.previousStartsAt));
  }
  return bookingConfirmed(message);
};
