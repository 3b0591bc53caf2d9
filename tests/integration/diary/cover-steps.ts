import type { CoverPlanView } from "@withy/contracts/diary";
import { serviceTherapists } from "@withy/db/schema";
import type { Context } from "@withy/services/context";
import { getCoverPlan, planCover } from "@withy/services/diary";
import { jobHandlers } from "@withy/services/job-handlers";
import { runNextJob } from "@withy/services/messaging";
import { and, eq, notInArray } from "drizzle-orm";
import { contextFor, systemContextFor } from "../../support/contexts";
import { addAppointment, type VisitValues } from "../../support/diary-rows";
import { addPatient } from "../../support/people";
import type { TestPractice } from "../../support/practice";

export const desk = (practice: TestPractice): Context => contextFor(practice, "owner");

/** A visit of the therapist on the day of the absence, with a patient of its own. */
export async function visitAt(
  practice: TestPractice,
  time: string,
  values: VisitValues = {},
  patient: Parameters<typeof addPatient>[1] = {},
) {
  const { id } = await addPatient(practice, patient);
  return addAppointment(practice, { patientId: id, day: "2026-12-02", time, values });
}

export const absence = (practice: TestPractice, more: object = {}) => ({
  therapistId: practice.staff.therapist.id,
  startsAt: "2026-12-02T08:00",
  endsAt: "2026-12-02T18:00",
  reason: "Unwell",
  ...more,
});

/** Runs the worker until the plan is there: other suites' jobs may stand in the same table. */
export async function worked(practice: TestPractice, started: CoverPlanView, ctx = desk(practice)) {
  for (let rounds = 0; rounds < 20; rounds += 1) {
    const view = await getCoverPlan(ctx, { coverPlanId: started.id });
    if (view.state !== "solving" || view.job?.state === "failed") return view;
    await runNextJob(systemContextFor(practice), { workerId: "w1", handlers: jobHandlers });
  }
  throw new Error("The plan did not come.");
}

export async function planned(practice: TestPractice, more: object = {}, ctx = desk(practice)) {
  return worked(practice, await planCover(ctx, absence(practice, more)), ctx);
}

/** Nobody but those told gives the follow-up. */
export async function onlyGivenBy(practice: TestPractice, staffIds: readonly string[]): Promise<void> {
  const { db, practiceId, services } = practice;
  await db
    .delete(serviceTherapists)
    .where(
      and(
        eq(serviceTherapists.practiceId, practiceId),
        eq(serviceTherapists.serviceId, services.followUp.id),
        ...(staffIds.length === 0 ? [] : [notInArray(serviceTherapists.staffMemberId, [...staffIds])]),
      ),
    );
}
