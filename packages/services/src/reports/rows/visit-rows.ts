import type { FigureRow } from "@withy/contracts/reports";
import { dayOf, minutesBetween, timeOf } from "@withy/core/zoned-time";
import { appointments, patients, services, sites, staffMembers } from "@withy/db/schema";
import { stateFacts } from "@withy/diary/appointment-states";
import { and, asc, count, eq, gte, inArray, lt, type SQL, sql } from "drizzle-orm";
import type { Context } from "../../context";
import { firstVisitWhere } from "../new-patients";
import { type VisitFigure, visitStates } from "../visit-figures";
import type { Asked, RowsAnswer } from "./asked";

/** The visits behind a figure, in time order. */
export function visitRows(ctx: Context, asked: Asked, figure: VisitFigure): Promise<RowsAnswer> {
  return readVisits(
    ctx,
    asked,
    and(
      eq(appointments.practiceId, ctx.practiceId),
      inArray(appointments.siteId, asked.siteIds),
      inArray(appointments.state, [...visitStates[figure]]),
      gte(appointments.startsAt, asked.span.from),
      lt(appointments.startsAt, asked.span.to),
      asked.therapistId === undefined ? undefined : eq(appointments.therapistId, asked.therapistId),
    ),
  );
}

/** The first attended visit of each new patient. */
export function newPatientRows(ctx: Context, asked: Asked): Promise<RowsAnswer> {
  return readVisits(ctx, asked, firstVisitWhere(ctx, asked.span, [...asked.siteIds]));
}

async function readVisits(ctx: Context, asked: Asked, where: SQL | undefined): Promise<RowsAnswer> {
  const [rows, [sums]] = await Promise.all([
    ctx.db
      .select({
        visit: appointments,
        zone: sites.zone,
        siteName: sites.name,
        serviceName: services.name,
        therapistGiven: staffMembers.givenName,
        therapistFamily: staffMembers.familyName,
        givenName: patients.givenName,
        familyName: patients.familyName,
      })
      .from(appointments)
      .innerJoin(sites, and(eq(sites.practiceId, appointments.practiceId), eq(sites.id, appointments.siteId)))
      .innerJoin(
        services,
        and(eq(services.practiceId, appointments.practiceId), eq(services.id, appointments.serviceId)),
      )
      .innerJoin(
        staffMembers,
        and(
          eq(staffMembers.practiceId, appointments.practiceId),
          eq(staffMembers.id, appointments.therapistId),
        ),
      )
      .innerJoin(
        patients,
        and(eq(patients.practiceId, appointments.practiceId), eq(patients.id, appointments.patientId)),
      )
      .where(where)
      .orderBy(asc(appointments.startsAt), asc(appointments.id))
      .limit(asked.limit)
      .offset(asked.offset),
    ctx.db
      .select({
        n: count(),
        minutes: sql<string>`coalesce(sum(timestampdiff(minute, ${appointments.startsAt}, ${appointments.endsAt})), 0)`,
      })
      .from(appointments)
      .where(where),
  ]);
  return {
    rows: rows.map(
      ({ visit, zone, ...row }): FigureRow => ({
        id: visit.id,
        day: dayOf(visit.startsAt, zone),
        time: timeOf(visit.startsAt, zone),
        title: `${row.givenName} ${row.familyName}`,
        detail: `${row.serviceName}, ${row.therapistGiven} ${row.therapistFamily}, ${row.siteName}. ${stateFacts[visit.state].word}`,
        minutes: minutesBetween(visit.startsAt, visit.endsAt),
        pence: null,
        opens: { kind: "patient", id: visit.patientId },
      }),
    ),
    total: sums?.n ?? 0,
    sumMinutes: Number(sums?.minutes ?? 0),
    sumPence: null,
  };
}
