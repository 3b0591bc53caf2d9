import { type CourseMessagePayload, courseMessagePayload } from "@withy/contracts/diary";
import { appointments } from "@withy/db/schema";
import {
  type CourseMessage,
  courseBooked,
  courseCancelled,
  courseMoved,
} from "@withy/documents/message/course-emails";
import { and, eq, inArray } from "drizzle-orm";
import type { SystemContext } from "../context";
import type { OutboxRow } from "./claim-messages";
import type { Renderer } from "./message-renderer";

type Visits = CourseMessagePayload["visits"];

/** The visits that still stand as the message says: people act on what they read last. */
async function stillTrue(ctx: SystemContext, row: OutboxRow, visits: Visits): Promise<Visits> {
  if (row.practiceId === null) return [];
  const ids = visits.map((v) => v.appointmentId);
  const rows = await ctx.db
    .select()
    .from(appointments)
    .where(and(eq(appointments.practiceId, row.practiceId), inArray(appointments.id, ids)));
  return visits.filter((v) => {
    const now = rows.find((r) => r.id === v.appointmentId);
    if (!now || now.startsAt.getTime() !== new Date(v.startsAt).getTime()) return false;
    const isCancelled = now.state === "cancelled";
    return row.template === "course-cancelled" ? isCancelled : !isCancelled && now.startsAt > ctx.clock.now();
  });
}

function messageOf(payload: CourseMessagePayload, visits: Visits): CourseMessage {
  const { attendee, practiceEmail, phone, zone, greetingName, noticeHours } = payload;
  return {
    ...{ phone, zone, greetingName, noticeHours },
    sender: { practice: payload.practice, contactLines: payload.contactLines },
    appointments: visits.map((v) => ({
      ...{ id: v.appointmentId, version: v.version, place: v.place, withWhom: v.withWhom },
      ...{ startsAt: new Date(v.startsAt), endsAt: new Date(v.endsAt) },
      ...{ practiceEmail, attendee, at: new Date(payload.at) },
    })),
  };
}

export const renderCourseMessage: Renderer = async (ctx, row) => {
  const payload = courseMessagePayload.parse(row.payload);
  const visits = await stillTrue(ctx, row, payload.visits);
  if (visits.length === 0) return null;
  const message = messageOf(payload, visits);
  if (row.template === "course-cancelled") return courseCancelled(message);
  return row.template === "course-moved" ? courseMoved(message) : courseBooked(message);
};
