import { createHash } from "node:crypto";
import { newId } from "@withy/core/ids";
import { offerRounds, waitingEntries, waitingOffers } from "@withy/db/schema";
import type { TestPractice } from "../../support/practice";

/** Someone on the waiting list, and a time on offer to someone else. */
export async function writeWaiting(
  { practiceId, db, clock, staff, sites, services }: TestPractice,
  patientId: string,
) {
  const now = clock.now();
  const [entryId, askedId, roundId] = [newId(), newId(), newId()];
  const entry = {
    practiceId,
    patientId,
    serviceId: services.initial.id,
    wishes: {},
    urgency: "routine" as const,
  };
  const since = { waitingSince: now, createdBy: staff.receptionist.id, updatedAt: now };
  await db.insert(waitingEntries).values([
    { ...entry, ...since, id: entryId },
    { ...entry, ...since, id: askedId },
  ]);
  await db.insert(offerRounds).values({
    ...{ practiceId, id: roundId, siteId: sites.saltgate.id, therapistId: staff.therapist.id },
    ...{ startsAt: new Date("2026-12-09T14:00:00Z"), endsAt: new Date("2026-12-09T15:00:00Z") },
    ...{ expiresAt: new Date("2026-12-08T14:00:00Z"), createdAt: now, createdBy: staff.receptionist.id },
  });
  await db.insert(waitingOffers).values({
    ...{ practiceId, id: newId(), roundId, entryId: askedId, rank: 1, createdAt: now },
    tokenHash: createHash("sha256").update(roundId).digest(),
  });
  return { entryId, entryIds: entryId, roundId };
}
