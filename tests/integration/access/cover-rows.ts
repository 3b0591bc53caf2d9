import { newId } from "@withy/core/ids";
import { coverMoves, coverPlans } from "@withy/db/schema";
import type { addAppointment } from "../../support/diary-rows";
import type { TestPractice } from "../../support/practice";

/** A plan of one visit that found no place. */
export async function writeCover(
  { practiceId, db, clock, staff }: TestPractice,
  visit: Awaited<ReturnType<typeof addAppointment>>,
) {
  const plan = {
    ...{
      practiceId,
      id: newId(),
      therapistId: staff.therapist.id,
      reason: "Unwell",
      state: "ready" as const,
    },
    startsAt: visit.startsAt,
    endsAt: visit.endsAt,
    createdAt: clock.now(),
    createdBy: staff.owner.id,
  };
  await db.insert(coverPlans).values(plan);
  const { siteId, therapistId, roomId } = visit;
  const move = {
    ...{ practiceId, id: newId(), planId: plan.id, appointmentId: visit.id, appointmentVersion: 1 },
    before: {
      ...{ siteId, therapistId, roomId, cost: 0, reasons: [], state: "booked" as const },
      startsAt: visit.startsAt.toISOString(),
    },
    problem: "Nobody is free.",
  };
  await db.insert(coverMoves).values(move);
  return { coverPlanId: plan.id, coverMoveId: move.id };
}
