import { waitingEntries } from "@withy/db/schema";
import {
  answerOffer,
  bookAppointment,
  getOfferLink,
  settleOffers,
  stopOfferRound,
} from "@withy/services/diary";
import { eq } from "drizzle-orm";
import { beforeEach, describe, expect, it } from "vitest";
import { contextFor, systemContextFor } from "../../support/contexts";
import { addAppointment } from "../../support/diary-rows";
import { addPatient } from "../../support/people";
import { buildPractice, type TestPractice } from "../../support/practice";
import { entryOf, everything, openRound, roundOf, startOn } from "./offer-steps";

let practice: TestPractice;
beforeEach(async () => {
  practice = await buildPractice();
});
const round = (people = 2) => openRound(practice, { day: "2026-12-08", time: "10:15", people });
const accept = (token = "") => answerOffer(systemContextFor(practice), token, "accept");
const decline = (token = "") => answerOffer(systemContextFor(practice), token, "decline");
const page = (token = "") => getOfferLink(systemContextFor(practice), token);

/** The answer is refused in that way, its page says so, and nothing at all is written but the counted try. */
async function refusedWith(token: string, kind: string, standing: string | null): Promise<void> {
  const before = await everything(practice);
  for (const answer of [accept, decline]) await expect(answer(token)).rejects.toMatchObject({ kind });
  if (standing === null) await expect(page(token)).rejects.toMatchObject({ code: "not-found" });
  else expect((await page(token)).standing).toBe(standing);
  expect(await everything(practice)).toEqual(before);
}

describe("saying no", () => {
  it("keeps them on the list, and ends the round with the last answer", async () => {
    const { tokens, roundId, waiting } = await round(2);
    await decline(tokens[0]);
    expect((await roundOf(practice, roundId)).state).toBe("open");
    await decline(tokens[1]);
    expect((await roundOf(practice, roundId)).state).toBe("expired");
    for (const { entry } of waiting) expect((await entryOf(practice, entry.id)).state).toBe("waiting");
    await refusedWith(tokens[0] ?? "", "offer-declined", "declined");
  });
});

describe("an answer that is refused changes nothing", () => {
  it("for a token that was tampered with, cut off, made up, or of nobody", async () => {
    const [token = ""] = (await round()).tokens;
    const other = token.startsWith("A") ? "B" : "A";
    const bad = [`${other}${token.slice(1)}`, token.slice(0, -1), `${token}A`, "", "../../x", "A".repeat(43)];
    for (const one of bad) await refusedWith(one, "not-found", null);
  });

  it("replayed after it was accepted", async () => {
    const { tokens } = await round();
    await accept(tokens[0]);
    await refusedWith(tokens[0] ?? "", "offer-yours", "yours");
    await refusedWith(tokens[1] ?? "", "offer-gone", "gone");
  });

  it("after its time, whether or not the worker has been there", async () => {
    const { tokens } = await round();
    practice.clock.advance(120);
    await refusedWith(tokens[0] ?? "", "offer-expired", "expired");
    await settleOffers(systemContextFor(practice));
    await refusedWith(tokens[1] ?? "", "offer-expired", "expired");
  });

  it("after the desk stopped it", async () => {
    const { tokens, roundId } = await round();
    await stopOfferRound(contextFor(practice, "receptionist"), { roundId, version: 1 });
    await refusedWith(tokens[0] ?? "", "offer-stopped", "stopped");
  });

  it("once the desk has booked the time for someone else", async () => {
    const { tokens } = await round();
    const patientId = (await addPatient(practice)).id;
    await bookAppointment(contextFor(practice, "receptionist"), {
      ...{ patientId, serviceId: practice.services.followUp.id, siteId: practice.sites.saltgate.id },
      ...{ therapistId: practice.staff.therapist.id, startsAt: startOn(practice, "2026-12-08", "10:30") },
    });
    await refusedWith(tokens[0] ?? "", "offer-gone", "gone");
  });

  it("once no room is left", async () => {
    const { tokens } = await round();
    const { rooms, staff } = practice;
    const taken = [
      { roomId: rooms.saltgateRoom1.id, therapistId: staff.owningTherapist.id },
      { roomId: rooms.saltgateRoom2.id, therapistId: staff.otherTherapist.id },
    ];
    for (const values of taken) {
      const patientId = (await addPatient(practice)).id;
      await addAppointment(practice, { patientId, day: "2026-12-08", time: "10:30", values });
    }
    const before = await everything(practice);
    await expect(accept(tokens[0])).rejects.toMatchObject({ kind: "offer-gone" });
    expect(await everything(practice)).toEqual(before);
  });

  it("for a patient with another visit then, off the list, or booked otherwise", async () => {
    const { tokens, waiting } = await round(3);
    const values = {
      therapistId: practice.staff.owningTherapist.id,
      roomId: practice.rooms.saltgateRoom2.id,
    };
    const patientId = waiting[0]?.patient.id ?? "";
    await addAppointment(practice, { patientId, day: "2026-12-08", time: "10:30", values });
    await refusedWith(tokens[0] ?? "", "offer-busy", "busy");
    for (const [n, state] of [
      [1, "withdrawn"],
      [2, "booked"],
    ] as const) {
      const isEntry = eq(waitingEntries.id, waiting[n]?.entry.id ?? "");
      await practice.db.update(waitingEntries).set({ state }).where(isEntry);
      await refusedWith(tokens[n] ?? "", "offer-settled", "settled");
    }
  });

  it("after twenty tries in a quarter of an hour on one link", async () => {
    const { tokens } = await round();
    await accept(tokens[0]);
    for (let n = 0; n < 19; n += 1)
      await expect(accept(tokens[0])).rejects.toMatchObject({ kind: "offer-yours" });
    await refusedWith(tokens[0] ?? "", "too-many-tries", "yours");
  });
});
