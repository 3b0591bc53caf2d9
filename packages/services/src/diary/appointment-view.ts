import type { AppointmentView } from "@withy/contracts/diary";
import { can } from "@withy/core/access/can";
import { dayOf, timeOf } from "@withy/core/zoned-time";
import { type AppointmentState, nextStates, stateFacts } from "@withy/diary/appointment-states";
import { canBeMoved, checkMark, isLateCancellation } from "@withy/diary/check-mark";
import type { Context } from "../context";
import { requireReach } from "../reach";
import { isoOf, utc } from "./raw-rows";
import { readVisitRow, type VisitRow } from "./visit-row";
import { readSurroundings, type Surroundings } from "./visit-surroundings";

const isoOrNull = (text: string | null): string | null => (text === null ? null : isoOf(text));

function possible(ctx: Context, row: VisitRow): AppointmentState[] {
  const facts = {
    startsAt: new Date(utc(row.starts_at)),
    now: ctx.clock.now(),
    zone: row.zone,
    from: row.state,
  };
  return nextStates(row.state).filter((to) => {
    const permission = to === "cancelled" ? "diary.cancel" : "diary.mark";
    return can(ctx.roles, permission, row.site_id) && checkMark({ ...facts, to }) === null;
  });
}

function cancellationOf(row: VisitRow): AppointmentView["cancellation"] {
  if (row.state !== "cancelled" || row.cancelled_at === null || row.cancelled_by === null) return null;
  return {
    at: isoOf(row.cancelled_at),
    by: row.cancelled_by,
    reason: row.cancel_reason ?? "",
    isLate: row.is_late_cancellation === 1,
  };
}

function patientOf(row: VisitRow, alerts: readonly string[]): AppointmentView["patient"] {
  return {
    id: row.patient_id,
    name: row.patient_name,
    preferredName: row.preferred_name,
    bornOn: row.born_on.slice(0, 10),
    phone: row.phone,
    email: row.email,
    communicationNeeds: row.communication_needs,
    alerts,
  };
}

export function appointmentView(ctx: Context, row: VisitRow, around: Surroundings): AppointmentView {
  const [startsAt, endsAt] = [new Date(utc(row.starts_at)), new Date(utc(row.ends_at))];
  const now = ctx.clock.now();
  const facts = { by: "patient", startsAt, now, noticeHours: row.notice_hours } as const;
  return {
    id: row.id,
    version: row.version,
    state: row.state,
    site: { id: row.site_id, name: row.site_name, zone: row.zone },
    therapist: { id: row.therapist_id, name: row.therapist_name },
    room: { id: row.room_id, name: row.room_name },
    service: { id: row.service_id, name: row.service_name, kind: row.service_kind },
    patient: patientOf(row, around.alerts),
    episodeId: row.episode_id,
    courseId: row.course_id,
    startsAt: startsAt.toISOString(),
    endsAt: endsAt.toISOString(),
    durationMinutes: (endsAt.getTime() - startsAt.getTime()) / 60_000,
    cleanDownMinutes: row.clean_down_minutes,
    day: dayOf(startsAt, row.zone),
    startTime: timeOf(startsAt, row.zone),
    endTime: timeOf(endsAt, row.zone),
    deskNote: row.desk_note,
    overrideReason: row.override_reason,
    arrivedAt: isoOrNull(row.arrived_at),
    sessionStartedAt: isoOrNull(row.session_started_at),
    sessionEndedAt: isoOrNull(row.session_ended_at),
    cancellation: cancellationOf(row),
    isLateToCancel: stateFacts[row.state].isOpen && isLateCancellation(facts),
    next: possible(ctx, row),
    undoTo: around.undo && around.undo.dependsOn === null ? around.undo.to : null,
    canMove: canBeMoved(row.state) && can(ctx.roles, "diary.book", row.site_id),
    owesPence: can(ctx.roles, "billing.read", row.site_id) ? around.owesPence : null,
    previousVisit: around.previousVisit,
    nextVisit: around.nextVisit,
  };
}

/** The visit as this person may see it, or not-found. */
export async function readAppointment(ctx: Context, appointmentId: string): Promise<AppointmentView> {
  return viewVisit(ctx, await readVisitRow(ctx, appointmentId));
}

/** A visit just read, as this person may see it. */
export async function viewVisit(ctx: Context, row: VisitRow): Promise<AppointmentView> {
  requireReach(ctx, "diary.read", row.site_id, "appointment");
  return appointmentView(ctx, row, await readSurroundings(ctx, row));
}
