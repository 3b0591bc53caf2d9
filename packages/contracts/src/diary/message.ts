import { z } from "zod";
import { idField } from "../fields";

/** What an outbox row about a visit carries: everything its e-mail says. Never what the visit is for. */
export const appointmentMessagePayload = z.strictObject({
  appointmentId: idField,
  /** Rises with each change, so that a calendar knows the later file. */
  version: z.int().positive(),
  startsAt: z.iso.datetime(),
  endsAt: z.iso.datetime(),
  /** Where it was before; only with "booking-moved". */
  previousStartsAt: z.iso.datetime().nullable(),
  zone: z.string(),
  practice: z.string(),
  practiceEmail: z.string(),
  contactLines: z.array(z.string()),
  phone: z.string(),
  /** Site and address in one line. */
  place: z.string(),
  /** "with Nia Prosser, physiotherapist". */
  withWhom: z.string(),
  attendee: z.strictObject({ name: z.string(), email: z.string() }),
  greetingName: z.string(),
  noticeHours: z.int(),
  /** When the message was caused. */
  at: z.iso.datetime(),
});
export type AppointmentMessagePayload = z.infer<typeof appointmentMessagePayload>;

/** What an outbox row about a course carries: the visits that one act booked, moved or cancelled. */
export const courseMessagePayload = z.strictObject({
  courseId: idField,
  zone: z.string(),
  practice: z.string(),
  practiceEmail: z.string(),
  contactLines: z.array(z.string()),
  phone: z.string(),
  attendee: z.strictObject({ name: z.string(), email: z.string() }),
  greetingName: z.string(),
  noticeHours: z.int(),
  at: z.iso.datetime(),
  visits: z
    .array(
      z.strictObject({
        appointmentId: idField,
        version: z.int().positive(),
        startsAt: z.iso.datetime(),
        endsAt: z.iso.datetime(),
        place: z.string(),
        withWhom: z.string(),
      }),
    )
    .min(1),
});
export type CourseMessagePayload = z.infer<typeof courseMessagePayload>;
