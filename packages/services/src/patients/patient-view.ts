import type { PatientPayerView, PatientView } from "@withy/contracts/patients";
import { can } from "@withy/core/access/can";
import { notFound } from "@withy/core/errors";
import { formatPhone } from "@withy/core/identifiers/phone";
import { ageOn, dayOf } from "@withy/core/zoned-time";
import { gpPractices, patientPayers, patients, payers, sites, staffMembers } from "@withy/db/schema";
import { and, eq } from "drizzle-orm";
import type { Context } from "../context";
import { careView } from "./care-view";
import { clinicalView } from "./clinical-view";
import { lookedAtBy, rowCounts } from "./patient-counts";

/** One patient's record for the person who asks: what their roles do not show is not in it. */
export async function buildPatientView(ctx: Context, patientId: string): Promise<PatientView> {
  const found = await findPatient(ctx, patientId);
  if (!found) throw notFound("patient");
  const { patient, site, gpPractice, therapist, payer } = found;
  const [care, clinical, counts, looks] = await Promise.all([
    can(ctx.roles, "diary.read") ? careView(ctx, patient, gpPractice, therapist) : null,
    can(ctx.roles, "clinical.read") ? clinicalView(ctx, patientId) : null,
    rowCounts(ctx, patientId),
    can(ctx.roles, "audit.read") ? lookedAtBy(ctx, patientId) : null,
  ]);
  const today = dayOf(ctx.clock.now(), ctx.zone);
  return {
    id: patient.id,
    version: patient.version,
    name: `${patient.givenName} ${patient.familyName}`,
    givenName: patient.givenName,
    familyName: patient.familyName,
    preferredName: patient.preferredName,
    bornOn: patient.bornOn,
    ageYears: ageOn(patient.bornOn, today),
    phone: patient.phone === null ? null : formatPhone(patient.phone),
    email: patient.email,
    addressLines: patient.addressLines,
    postcode: patient.postcode,
    preferredChannel: patient.preferredChannel,
    homeSite: site,
    payer,
    care,
    clinical,
    counts,
    lookedAtBy: looks,
    registeredOn: dayOf(patient.createdAt, ctx.zone),
  };
}

async function findPatient(ctx: Context, patientId: string) {
  const [row] = await ctx.db
    .select({
      patient: patients,
      site: { id: sites.id, name: sites.name },
      gpPractice: { id: gpPractices.id, name: gpPractices.name },
      therapist: {
        id: staffMembers.id,
        givenName: staffMembers.givenName,
        familyName: staffMembers.familyName,
      },
      held: patientPayers,
      payer: { name: payers.name, kind: payers.kind },
    })
    .from(patients)
    .innerJoin(sites, and(eq(sites.practiceId, patients.practiceId), eq(sites.id, patients.homeSiteId)))
    .leftJoin(
      gpPractices,
      and(eq(gpPractices.practiceId, patients.practiceId), eq(gpPractices.id, patients.gpPracticeId)),
    )
    .leftJoin(
      staffMembers,
      and(eq(staffMembers.practiceId, patients.practiceId), eq(staffMembers.id, patients.usualTherapistId)),
    )
    .leftJoin(
      patientPayers,
      and(
        eq(patientPayers.practiceId, patients.practiceId),
        eq(patientPayers.patientId, patients.id),
        eq(patientPayers.isCurrent, true),
      ),
    )
    .leftJoin(payers, and(eq(payers.practiceId, patients.practiceId), eq(payers.id, patientPayers.payerId)))
    .where(and(eq(patients.practiceId, ctx.practiceId), eq(patients.id, patientId)))
    .limit(1);
  if (!row) return null;
  const { therapist } = row;
  return {
    ...row,
    therapist: therapist && { id: therapist.id, name: `${therapist.givenName} ${therapist.familyName}` },
    payer: row.held && row.payer ? payerView(row.held, row.payer) : null,
  };
}

function payerView(
  held: typeof patientPayers.$inferSelect,
  payer: Pick<typeof payers.$inferSelect, "name" | "kind">,
): PatientPayerView {
  return {
    payerId: held.payerId,
    payerName: payer.name,
    kind: payer.kind,
    policyNumber: held.policyNumber,
    authorisationCode: held.authorisationCode,
    sessionsAuthorised: held.sessionsAuthorised,
    excessPence: held.excessPence,
  };
}
