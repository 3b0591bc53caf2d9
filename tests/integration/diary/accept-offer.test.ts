import { addMinutes } from "@withy/core/zoned-time";
import { appointments, staffMembers, waitingEntries } from "@withy/db/schema";
import { answerOffer, getOfferLink, settleOffers } from "@withy/services/diary";
import { eq } from "drizzle-orm";
import { beforeEach, describe, expect, it } from "vitest";
import { auditOf } from "../../support/audit-rows";
import { systemContextFor } from "../../support/contexts";
import { addAppointment, claimsOf } from "../../support/diary-rows";
import { addPatient } from "../../support/people";
import { buildPractice, type TestPractice } from "../../support/practice";
import { entryOf, everything, messagesOf, offersOf, openRound, roundOf } from "./offer-steps";

let practice: TestPractice;
beforeEach(async () => {
  practice = await buildPractice();
});
const round = (people = 2) => openRound(practice, { day: "2026-12-08", time: "10:15", people });
const accept = (token = "") => answerOffer(systemContextFor(practice), token, "accept");
const page = (token = "") => getOfferLink(systemContextFor(practice), token);

/** Someone with an offer who has a later visit to give up for it. */
async function roundInsteadOf(day: string) {
  const { waiting, tokens } = await round(1);
  const [person] = waiting;
  const patientId = person?.patient.id ?? "";
  const later = await addAppointment(practice, { patientId, day, time: "10:30" });
  await practice.db
    .update(waitingEntries)
    .set({ insteadOfId: later.id })
    .where(eq(waitingEntries.id, person?.entry.id ?? ""));
  return { later, token: tokens[0] ?? "" };
}

describe("the private page", () => {
  it("says time, place and therapist, nothing of why, and writes nothing", async () => {
    const { tokens, waiting } = await round();
    const before = await everything(practice);
    const view = await page(tokens[0]);
    expect(view).toMatchObject({
      ...{
        standing: "open",
        dayWords: "Tuesday 8 December 2026",
        startWords: "10:15am",
        endWords: "10:45am",
      },
      ...{ greetingName: "Perran", expiresWords: "Tuesday 1 December 2026 at 11am", insteadOfWords: null },
    });
    expect(view.place).toContain("Saltgate");
    const said = JSON.stringify(view);
    for (const secret of [waiting[0]?.patient.familyName ?? "?", "Follow-up", "1971"])
      expect(said).not.toContain(secret);
    expect(await everything(practice)).toEqual(before);
  });
});

describe("the first acceptance", () => {
  it("books the visit with its claims, ends the round, tells the others, and is the patient's own deed", async () => {
    const { tokens, offers, roundId, waiting, startsAt } = await round(3);
    await accept(tokens[1]);
    const ended = await roundOf(practice, roundId);
    expect(ended).toMatchObject({ state: "taken", version: 2 });
    const [visit] = await practice.db
      .select()
      .from(appointments)
      .where(eq(appointments.id, ended.appointmentId ?? ""));
    if (!visit) throw new Error("Nothing was booked.");
    expect(visit).toMatchObject({
      ...{ patientId: waiting[1]?.patient.id, startsAt, endsAt: addMinutes(startsAt, 30), state: "booked" },
      therapistId: practice.staff.therapist.id,
    });
    const { claims } = await everything(practice);
    const words = (c: { resourceId: string; slotAt: Date }) => `${c.resourceId} ${c.slotAt.toISOString()}`;
    expect(claims.map(words).sort()).toEqual(claimsOf(visit).map(words).sort());
    expect((await offersOf(practice, roundId)).map((o) => o.state)).toEqual(["lost", "accepted", "lost"]);
    const states = await Promise.all(
      waiting.map(async ({ entry }) => (await entryOf(practice, entry.id)).state),
    );
    expect(states).toEqual(["waiting", "booked", "waiting"]);
    const told = await Promise.all(
      offers.map(async ({ id }) => (await messagesOf(practice, id, "offer-gone")).length),
    );
    expect(told).toEqual([1, 0, 1]);
    expect(await messagesOf(practice, visit.id, "booking-confirmed")).toHaveLength(1);
    const booked = (await auditOf(practice, visit.id)).map((a) => [a.action, a.actorId, a.detail["offerId"]]);
    expect(booked).toEqual([["appointment.booked", null, offers[1]?.id]]);
    expect((await auditOf(practice, roundId)).map((a) => [a.action, a.actorId]).slice(1)).toEqual([
      ["offer.accepted", null],
      ["offer-round.taken", null],
    ]);
    expect((await page(tokens[1])).standing).toBe("yours");
    expect((await page(tokens[0])).standing).toBe("gone");
  });

  it("gives up the later visit in the same breath, even one that stands in the way, and not as late", async () => {
    const { later, token } = await roundInsteadOf("2026-12-08");
    expect((await page(token)).insteadOfWords).toBe("Tuesday 8 December 2026 at 10:30am");
    await accept(token);
    const [given] = await practice.db.select().from(appointments).where(eq(appointments.id, later.id));
    expect(given).toMatchObject({ state: "cancelled", cancelledBy: "patient", isLateCancellation: false });
    expect(await messagesOf(practice, later.id, "booking-cancelled")).toHaveLength(1);
    const { claims } = await everything(practice);
    expect(claims.filter((c) => c.appointmentId === later.id)).toEqual([]);
  });

  it("keeps the later visit where the booking fails, and everything else too", async () => {
    const { token } = await roundInsteadOf("2026-12-20");
    await practice.db
      .update(staffMembers)
      .set({ isActive: false })
      .where(eq(staffMembers.id, practice.staff.therapist.id));
    const before = await everything(practice);
    await expect(accept(token)).rejects.toMatchObject({ kind: "offer-gone" });
    expect(await everything(practice)).toEqual(before);
  });
});

describe("the worker", () => {
  it("ends what is overdue, once, whichever of three workers comes first, and leaves the rest", async () => {
    const soon = await round(2);
    const later = await openRound(practice, { day: "2026-12-08", time: "14:00", minutes: 600 });
    practice.clock.advance(121);
    await Promise.all([1, 2, 3].map(() => settleOffers(systemContextFor(practice))));
    expect((await roundOf(practice, soon.roundId)).state).toBe("expired");
    expect((await offersOf(practice, soon.roundId)).map((o) => o.state)).toEqual(["expired", "expired"]);
    const ends = (await auditOf(practice, soon.roundId)).filter((a) => a.action === "offer-round.expired");
    expect(ends).toHaveLength(1);
    expect((await roundOf(practice, later.roundId)).state).toBe("open");
    expect(await settleOffers(systemContextFor(practice))).toBe(0);
  });

  it("takes a time off offer that the desk has booked, and tells those who were asked, once", async () => {
    const { roundId, offers } = await round(2);
    const patientId = (await addPatient(practice)).id;
    await addAppointment(practice, { patientId, day: "2026-12-08", time: "10:15" });
    await settleOffers(systemContextFor(practice));
    await settleOffers(systemContextFor(practice));
    expect((await roundOf(practice, roundId)).state).toBe("stopped");
    for (const { id } of offers) expect(await messagesOf(practice, id, "offer-gone")).toHaveLength(1);
  });

  it("leaves a round whole where it dies in the middle, and ends it the next time", async () => {
    const { roundId } = await round(2);
    practice.clock.advance(121);
    const before = await everything(practice);
    const broken = { ...systemContextFor(practice), requestId: "x".repeat(200) };
    await expect(settleOffers(broken), "the audit row cannot be written").rejects.toThrow();
    expect(await everything(practice)).toEqual(before);
    await settleOffers(systemContextFor(practice));
    expect((await roundOf(practice, roundId)).state).toBe("expired");
  });
});
