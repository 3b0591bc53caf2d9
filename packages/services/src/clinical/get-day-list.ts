import { type DayList, type DayVisit, dayListInput } from "@withy/contracts/clinical";
import { dayBounds, dayOf } from "@withy/core/zoned-time";
import { appointments, notes, patients, services, sites } from "@withy/db/schema";
import { and, asc, eq, gt, gte, lt, ne } from "drizzle-orm";
import { recordAudit } from "../audit";
import type { Context } from "../context";
import { verb } from "../verb";

const dayMs = 86_400_000;

/** The therapist's own day, with how far each visit's note has come. */
export const getDayList = verb("clinical.read", dayListInput, async (ctx, input): Promise<DayList> => {
  const day = input.day ?? dayOf(ctx.clock.now(), ctx.zone);
  const visits = await listVisits(ctx, day);
  await recordAudit(ctx, {
    action: "day-list.read",
    subjectKind: "staff-member",
    subjectId: ctx.staffMemberId,
    detail: { day, visits: visits.length },
  });
  return { day, zone: ctx.zone, visits };
});

async function listVisits(ctx: Context, day: string): Promise<DayVisit[]> {
  const { from, to } = dayBounds(day, ctx.zone);
  const rows = await ctx.db
    .select({
      appointment: appointments,
      givenName: patients.givenName,
      familyName: patients.familyName,
      siteName: sites.name,
      serviceName: services.name,
      serviceKind: services.kind,
      noteId: notes.id,
      noteState: notes.state,
    })
    .from(appointments)
    .innerJoin(
      patients,
      and(eq(patients.practiceId, appointments.practiceId), eq(patients.id, appointments.patientId)),
    )
    .innerJoin(sites, and(eq(sites.practiceId, appointments.practiceId), eq(sites.id, appointments.siteId)))
    .innerJoin(
      services,
      and(eq(services.practiceId, appointments.practiceId), eq(services.id, appointments.serviceId)),
    )
    .leftJoin(
      notes,
      and(eq(notes.practiceId, appointments.practiceId), eq(notes.appointmentId, appointments.id)),
    )
    .where(
      and(
        eq(appointments.practiceId, ctx.practiceId),
        eq(appointments.therapistId, ctx.staffMemberId),
        lt(appointments.startsAt, to),
        // A bound on both sides of the start keeps the read on one short stretch of the index.
        gte(appointments.startsAt, new Date(from.getTime() - dayMs)),
        gt(appointments.endsAt, from),
        ne(appointments.state, "cancelled"),
      ),
    )
    .orderBy(asc(appointments.startsAt));
  return rows.map(({ appointment, ...row }) => ({
    appointmentId: appointment.id,
    startsAt: appointment.startsAt.toISOString(),
    endsAt: appointment.endsAt.toISOString(),
    state: appointment.state,
    patientId: appointment.patientId,
    patientName: `${row.givenName} ${row.familyName}`,
    siteName: row.siteName,
    serviceName: row.serviceName,
    isFirstVisit: row.serviceKind === "initial",
    episodeId: appointment.episodeId,
    note: row.noteId === null || row.noteState === null ? null : { id: row.noteId, state: row.noteState },
  }));
}
