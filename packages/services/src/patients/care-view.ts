import type {
  NamedView,
  NextVisitView,
  PatientAlertView,
  PatientCareView,
  PatientConsentView,
} from "@withy/contracts/patients";
import { can, sitesWith } from "@withy/core/access/can";
import { dayOf, timeOf } from "@withy/core/zoned-time";
import { appointments, consents, patientAlerts, type patients, sites, staffMembers } from "@withy/db/schema";
import { holdingStates } from "@withy/diary/appointment-states";
import { and, asc, eq, gte, inArray, isNull } from "drizzle-orm";
import type { Context } from "../context";

/** What whoever books or treats must know; no clinical alert for whoever may not read notes. */
export async function careView(
  ctx: Context,
  patient: typeof patients.$inferSelect,
  gpPractice: NamedView | null,
  usualTherapist: NamedView | null,
): Promise<PatientCareView> {
  const [alerts, given, nextVisit] = await Promise.all([
    listAlerts(ctx, patient.id),
    listConsents(ctx, patient.id),
    findNextVisit(ctx, patient.id),
  ]);
  return {
    sex: patient.sex,
    nhsNumber: patient.nhsNumber,
    gpPractice,
    gpName: patient.gpName,
    communicationNeeds: patient.communicationNeeds,
    nextOfKin: patient.nextOfKin,
    usualTherapist,
    alerts,
    consents: given,
    nextVisit,
  };
}

function listAlerts(ctx: Context, patientId: string): Promise<PatientAlertView[]> {
  return ctx.db
    .select({ id: patientAlerts.id, text: patientAlerts.text, isClinical: patientAlerts.isClinical })
    .from(patientAlerts)
    .where(
      and(
        eq(patientAlerts.practiceId, ctx.practiceId),
        eq(patientAlerts.patientId, patientId),
        isNull(patientAlerts.resolvedAt),
        can(ctx.roles, "clinical.read") ? undefined : eq(patientAlerts.isClinical, false),
      ),
    )
    .orderBy(asc(patientAlerts.createdAt));
}

async function listConsents(ctx: Context, patientId: string): Promise<PatientConsentView[]> {
  const rows = await ctx.db
    .select()
    .from(consents)
    .where(
      and(
        eq(consents.practiceId, ctx.practiceId),
        eq(consents.patientId, patientId),
        isNull(consents.withdrawnAt),
      ),
    )
    .orderBy(asc(consents.givenAt));
  return rows.map((row) => ({
    kind: row.kind,
    wordingVersion: row.wordingVersion,
    givenOn: dayOf(row.givenAt, ctx.zone),
  }));
}

async function findNextVisit(ctx: Context, patientId: string): Promise<NextVisitView | null> {
  const allowed = sitesWith(ctx.roles, "diary.read");
  const [row] = await ctx.db
    .select({
      id: appointments.id,
      startsAt: appointments.startsAt,
      state: appointments.state,
      zone: sites.zone,
      siteName: sites.name,
      givenName: staffMembers.givenName,
      familyName: staffMembers.familyName,
    })
    .from(appointments)
    .innerJoin(sites, and(eq(sites.practiceId, appointments.practiceId), eq(sites.id, appointments.siteId)))
    .innerJoin(
      staffMembers,
      and(
        eq(staffMembers.practiceId, appointments.practiceId),
        eq(staffMembers.id, appointments.therapistId),
      ),
    )
    .where(
      and(
        eq(appointments.practiceId, ctx.practiceId),
        eq(appointments.patientId, patientId),
        gte(appointments.startsAt, ctx.clock.now()),
        inArray(appointments.state, [...holdingStates]),
        allowed === "all" ? undefined : inArray(appointments.siteId, allowed),
      ),
    )
    .orderBy(asc(appointments.startsAt))
    .limit(1);
  if (!row) return null;
  return {
    appointmentId: row.id,
    startsAt: row.startsAt.toISOString(),
    day: dayOf(row.startsAt, row.zone),
    time: timeOf(row.startsAt, row.zone),
    therapistName: `${row.givenName} ${row.familyName}`,
    siteName: row.siteName,
    state: row.state,
  };
}
