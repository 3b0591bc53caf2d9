import { isAppError } from "@withy/core/errors";
import { diaryClaims } from "@withy/db/schema";
import type { Context } from "@withy/services/context";
import { bookAppointment } from "@withy/services/diary";
import { and, eq } from "drizzle-orm";
import { contextFor } from "../../support/contexts";
import { addPatient } from "../../support/people";
import type { TestPractice } from "../../support/practice";

/** What a booking form sends for a follow-up with the therapist at Saltgate. */
export function followUp(practice: TestPractice, patientId: string, startsAt: string, more: object = {}) {
  return {
    patientId,
    serviceId: practice.services.followUp.id,
    therapistId: practice.staff.therapist.id,
    siteId: practice.sites.saltgate.id,
    startsAt,
    ...more,
  };
}

/** A patient with a follow-up booked at the desk. */
export async function bookedVisit(practice: TestPractice, startsAt: string, more: object = {}) {
  const patient = await addPatient(practice);
  const desk = contextFor(practice, "receptionist");
  const visit = await bookAppointment(desk, followUp(practice, patient.id, startsAt, more));
  return { patient, visit };
}

/** The refusal or failure of a verb: its code and kind, its message and what came with it. */
export async function failureOf(work: Promise<unknown>) {
  try {
    await work;
  } catch (error) {
    if (isAppError(error))
      return {
        code: error.code,
        kind: error.kind,
        message: error.message,
        fields: error.fields,
        detail: error.detail,
      };
    throw error;
  }
  throw new Error("It was allowed.");
}

export function claimsFor(practice: TestPractice, appointmentId: string) {
  return practice.db
    .select()
    .from(diaryClaims)
    .where(
      and(eq(diaryClaims.practiceId, practice.practiceId), eq(diaryClaims.appointmentId, appointmentId)),
    );
}

export const withKey = (ctx: Context, idempotencyKey: string): Context => ({ ...ctx, idempotencyKey });
