import { newId } from "@withy/core/ids";
import type { Context } from "../context";
import type { AppointmentRow } from "./change-appointment";
import type { VisitPlan } from "./plan-visit";

export interface NewVisit {
  readonly siteId: string;
  readonly therapistId: string;
  readonly patientId: string;
  readonly serviceId: string;
  readonly episodeId: string | null;
  readonly deskNote: string | null;
  readonly overrideReason: string | null;
  readonly courseId?: string | null;
}

/** The row of a visit that was planned and not written yet. */
export function newVisit(ctx: Context, visit: NewVisit, plan: VisitPlan): AppointmentRow {
  const { siteId, therapistId, patientId, serviceId, episodeId, deskNote, overrideReason } = visit;
  const { startsAt, endsAt, cleanDownMinutes } = plan;
  const now = ctx.clock.now();
  return {
    ...{ practiceId: ctx.practiceId, id: newId(), siteId, therapistId, roomId: plan.room.id, patientId },
    ...{ serviceId, episodeId, courseId: visit.courseId ?? null, startsAt, endsAt, cleanDownMinutes },
    ...{ state: "booked", deskNote, overrideReason },
    ...{ arrivedAt: null, sessionStartedAt: null, sessionEndedAt: null },
    ...{ cancelledAt: null, cancelledBy: null, cancelReason: null, isLateCancellation: false },
    ...{ version: 1, createdAt: now, createdBy: ctx.staffMemberId, updatedAt: now },
  };
}
