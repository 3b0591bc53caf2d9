import { appointments, waitingEntries, waitingOffers } from "@withy/db/schema";
import { and, eq } from "drizzle-orm";
import { recordAudit } from "../audit";
import type { Context } from "../context";
import { loadRecord } from "../load-record";
import { saveAppointment } from "./change-appointment";
import { releaseSlots } from "./claim-slots";
import { newVisit } from "./new-visit";
import { givenUpBy, type LinkedOffer } from "./offer-facts";
import { closeIfAnswered, endRound, type RoundActor, type RoundRow } from "./offer-round";
import { claimPlan, planVisit } from "./plan-visit";
import { recordChange } from "./record-change";
import { sendVisitMessage } from "./send-visit-message";
import { auditEntry, saveEntry } from "./waiting-entry";

/** The context in which a visit is booked for a patient behind a link: rights of nobody, in the name of who offered. */
function deskOf(tx: RoundActor, round: RoundRow, offer: LinkedOffer): Context {
  return {
    ...tx,
    ...{ staffMemberId: round.createdBy, staffName: "", sessionId: offer.id, roles: [] },
    ...{ deskSiteId: round.siteId, zone: offer.zone, idempotencyKey: null },
  };
}

async function settleOffer(
  tx: RoundActor,
  offer: LinkedOffer,
  state: "accepted" | "declined",
): Promise<void> {
  await tx.db
    .update(waitingOffers)
    .set({ state, decidedAt: tx.clock.now() })
    .where(and(eq(waitingOffers.practiceId, tx.practiceId), eq(waitingOffers.id, offer.id)));
  await recordAudit(
    { ...tx, staffMemberId: null },
    {
      action: `offer.${state}`,
      subjectKind: "offer-round",
      subjectId: offer.round_id,
      patientId: offer.patient_id,
      siteId: offer.site_id,
      detail: { offerId: offer.id },
    },
  );
}

/** The later visit is cancelled at the patient's own wish, never as a late cancellation: they come sooner. */
async function giveUp(ctx: Context, appointmentId: string, offerId: string): Promise<void> {
  const before = await loadRecord(ctx, appointments, appointmentId, "appointment", { lock: true });
  await releaseSlots(ctx, before.id);
  const after = await saveAppointment(ctx, before, {
    ...{
      state: "cancelled",
      cancelledAt: ctx.clock.now(),
      cancelledBy: "patient",
      isLateCancellation: false,
    },
    cancelReason: "Took another time from the waiting list",
  });
  await recordChange(ctx, "cancelled", before, after, { offerId });
  await sendVisitMessage(ctx, "booking-cancelled", before.id);
}

async function bookOffered(ctx: Context, round: RoundRow, offer: LinkedOffer): Promise<string> {
  const { site_id: siteId, therapist_id: therapistId, patient_id: patientId, service_id: serviceId } = offer;
  const ids = { siteId, therapistId, patientId, serviceId, roomId: null, episodeId: null };
  const plan = await planVisit(ctx, ids, {
    ...{ startsAt: round.startsAt.toISOString(), durationMinutes: null, cleanDownMinutes: null },
    ...{ overrideReason: null, movingId: null },
  });
  const row = newVisit(ctx, { ...ids, deskNote: null, overrideReason: null }, plan);
  await ctx.db.insert(appointments).values(row);
  await claimPlan(ctx, row.id, plan);
  await recordChange(ctx, "booked", null, row, { offerId: offer.id });
  return row.id;
}

/** Books the time for the first who accepts, gives up the later visit, and tells the others; all or nothing. */
export async function acceptOffer(tx: RoundActor, round: RoundRow, offer: LinkedOffer): Promise<void> {
  const ctx = deskOf(tx, round, offer);
  const entry = await loadRecord(tx, waitingEntries, offer.entry_id, "waiting entry", { lock: true });
  const givenUp = givenUpBy(offer, tx.clock.now());
  if (givenUp !== null) await giveUp(ctx, givenUp, offer.id);
  const appointmentId = await bookOffered(ctx, round, offer);
  await settleOffer(tx, offer, "accepted");
  const isFirst = await endRound(tx, round, { state: "taken", appointmentId }, { offerId: offer.id });
  if (!isFirst) throw new Error("A round that was held open has ended meanwhile.");
  await saveEntry(tx, entry, { state: "booked" });
  await auditEntry({ ...tx, staffMemberId: null }, entry, "booked", { appointmentId });
  await sendVisitMessage(ctx, "booking-confirmed", appointmentId);
}

/** A no is written down; where it was the last answer that was missing, the round is over. */
export async function declineOffer(tx: RoundActor, round: RoundRow, offer: LinkedOffer): Promise<void> {
  await settleOffer(tx, offer, "declined");
  await closeIfAnswered(tx, round.id);
}
