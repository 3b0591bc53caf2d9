import { newId } from "@withy/core/ids";
import { instantAt } from "@withy/core/zoned-time";
import {
  appointments,
  auditEvents,
  diaryClaims,
  offerRounds,
  outboxMessages,
  waitingEntries,
  waitingOffers,
} from "@withy/db/schema";
import { offerTime } from "@withy/services/diary";
import { and, asc, eq } from "drizzle-orm";
import { contextFor } from "../../support/contexts";
import { addPatient } from "../../support/people";
import type { TestPractice } from "../../support/practice";

export type NewEntry = Partial<typeof waitingEntries.$inferInsert>;

/** A patient who waits for a follow-up and would take any time. */
export async function addWaiting(practice: TestPractice, values: NewEntry = {}, email?: string | null) {
  const patient = await addPatient(practice, email === undefined ? {} : { email });
  const now = practice.clock.now();
  const entry = {
    practiceId: practice.practiceId,
    id: newId(),
    patientId: patient.id,
    serviceId: practice.services.followUp.id,
    wishes: {},
    urgency: "routine" as const,
    waitingSince: now,
    createdBy: practice.staff.receptionist.id,
    updatedAt: now,
    ...values,
  };
  await practice.db.insert(waitingEntries).values(entry);
  return { patient, entry };
}

export const startOn = (practice: TestPractice, day: string, time: string): string => {
  const at = instantAt(day, time, practice.zone);
  if (!at) throw new Error("That time does not exist.");
  return at.toISOString();
};

const pathIn = (payload: Record<string, unknown>): string => String(payload["path"] ?? "");

/** Offers Ana's time at Saltgate to so many people, and reads each one's token out of their message. */
export async function openRound(
  practice: TestPractice,
  { day, time, people = 2, minutes = 120 }: { day: string; time: string; people?: number; minutes?: number },
) {
  const waiting = [];
  for (let n = 0; n < people; n += 1) waiting.push(await addWaiting(practice));
  const ctx = contextFor(practice, "receptionist");
  const startsAt = startOn(practice, day, time);
  const { roundId } = await offerTime(ctx, {
    ...{ siteId: practice.sites.saltgate.id, therapistId: practice.staff.therapist.id, startsAt, minutes },
    entryIds: waiting.map(({ entry }) => entry.id),
  });
  const offers = await offersOf(practice, roundId);
  const tokens: string[] = [];
  for (const offer of offers) tokens.push(await tokenOf(practice, offer.id));
  return { roundId, offers, tokens, waiting, startsAt: new Date(startsAt) };
}

export async function tokenOf(practice: TestPractice, offerId: string): Promise<string> {
  const [message] = await messagesOf(practice, offerId, "offer-made");
  const token = /^\/link\/([A-Za-z0-9_-]{43})\/offer$/.exec(pathIn(message?.payload ?? {}))?.[1];
  if (!token) throw new Error("The offer's message carries no link.");
  return token;
}

export const messagesOf = (practice: TestPractice, aboutId: string, template: string) =>
  practice.db
    .select()
    .from(outboxMessages)
    .where(
      and(
        eq(outboxMessages.practiceId, practice.practiceId),
        eq(outboxMessages.aboutId, aboutId),
        eq(outboxMessages.template, template),
      ),
    );

export const offersOf = (practice: TestPractice, roundId: string) =>
  practice.db
    .select()
    .from(waitingOffers)
    .where(and(eq(waitingOffers.practiceId, practice.practiceId), eq(waitingOffers.roundId, roundId)))
    .orderBy(asc(waitingOffers.rank));

export async function roundOf(practice: TestPractice, roundId: string) {
  const [row] = await practice.db
    .select()
    .from(offerRounds)
    .where(and(eq(offerRounds.practiceId, practice.practiceId), eq(offerRounds.id, roundId)));
  if (!row) throw new Error("There is no such round.");
  return row;
}

export async function entryOf(practice: TestPractice, entryId: string) {
  const [row] = await practice.db
    .select()
    .from(waitingEntries)
    .where(and(eq(waitingEntries.practiceId, practice.practiceId), eq(waitingEntries.id, entryId)));
  if (!row) throw new Error("There is no such entry.");
  return row;
}

/** Everything that an answer could change, for holding "before" against "after". */
export async function everything({ db, practiceId }: TestPractice) {
  const [rounds, offers, entries, visits, claims, messages, audits] = await Promise.all([
    db.select().from(offerRounds).where(eq(offerRounds.practiceId, practiceId)).orderBy(asc(offerRounds.id)),
    db
      .select()
      .from(waitingOffers)
      .where(eq(waitingOffers.practiceId, practiceId))
      .orderBy(asc(waitingOffers.id)),
    db
      .select()
      .from(waitingEntries)
      .where(eq(waitingEntries.practiceId, practiceId))
      .orderBy(asc(waitingEntries.id)),
    db
      .select()
      .from(appointments)
      .where(eq(appointments.practiceId, practiceId))
      .orderBy(asc(appointments.id)),
    db
      .select()
      .from(diaryClaims)
      .where(eq(diaryClaims.practiceId, practiceId))
      .orderBy(asc(diaryClaims.resourceId), asc(diaryClaims.slotAt)),
    db
      .select()
      .from(outboxMessages)
      .where(eq(outboxMessages.practiceId, practiceId))
      .orderBy(asc(outboxMessages.id)),
    db.select().from(auditEvents).where(eq(auditEvents.practiceId, practiceId)).orderBy(asc(auditEvents.id)),
  ]);
  return { rounds, offers, entries, visits, claims, messages, audits };
}
