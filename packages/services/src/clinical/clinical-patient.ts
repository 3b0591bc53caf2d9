import type { ClinicalPatient } from "@withy/contracts/clinical";
import { ageOn } from "@withy/core/zoned-time";
import { patientAlerts, patients } from "@withy/db/schema";
import { and, asc, eq, isNull } from "drizzle-orm";
import type { Context } from "../context";
import { loadRecord } from "../load-record";

export interface PatientForCare {
  readonly view: ClinicalPatient;
  /** For norms that are published for men and women only. */
  readonly sex: "male" | "female" | null;
}

/** Who is treated, with open alerts, for the head of a clinical page. */
export async function loadPatientForCare(
  ctx: Context,
  patientId: string,
  day: string,
): Promise<PatientForCare> {
  const patient = await loadRecord(ctx, patients, patientId, "patient");
  const alerts = await ctx.db
    .select({ text: patientAlerts.text })
    .from(patientAlerts)
    .where(
      and(
        eq(patientAlerts.practiceId, ctx.practiceId),
        eq(patientAlerts.patientId, patientId),
        isNull(patientAlerts.resolvedAt),
      ),
    )
    .orderBy(asc(patientAlerts.createdAt));
  return {
    view: {
      id: patient.id,
      name: `${patient.givenName} ${patient.familyName}`,
      bornOn: patient.bornOn,
      age: ageOn(patient.bornOn, day),
      nhsNumber: patient.nhsNumber,
      alerts: alerts.map((alert) => alert.text),
    },
    sex: patient.sex === "male" || patient.sex === "female" ? patient.sex : null,
  };
}
