import { newId } from "@withy/core/ids";
import {
  addWaitingEntry,
  bookAppointment,
  cancelAppointment,
  getOfferRound,
  listFreedTimes,
  listOfferMatches,
  listOfferRounds,
  moveAppointment,
  offerTime,
  stopOfferRound,
} from "@withy/services/diary";
import { drainOutbox } from "@withy/services/messaging";
import { beforeEach, describe, expect, it } from "vitest";
import { auditOf } from "../../support/audit-rows";
import { contextFor, systemContextFor } from "../../support/contexts";
import { addAppointment } from "../../support/diary-rows";
import { addPatient } from "../../support/people";
import { buildPractice, type TestPractice } from "../../support/practice";
import { officeWith, recordingMail } from "../messaging/outbox-support";
import { addWaiting, everything, messagesOf, openRound, startOn } from "./offer-steps";

let practice: TestPractice;
beforeEach(async () => {
  practice = await buildPractice();
});
const desk = () => contextFor(practice, "receptionist");
const time = (clock: string, day = "2026-12-08") => ({
  ...{ siteId: practice.sites.saltgate.id, therapistId: practice.staff.therapist.id },
  startsAt: startOn(practice, day, clock),
});

/** Messages of other suites may wait too. */
async function drainAll(mail: ReturnType<typeof recordingMail>): Promise<void> {
  while ((await drainOutbox(systemContextFor(practice), officeWith(mail))) > 0);
}

describe("whom a time suits", () => {
  it("ranks with reasons, says why not the others, and measures the time that is free", async () => {
    await addAppointment(practice, {
      patientId: (await addPatient(practice)).id,
      day: "2026-12-08",
      time: "11:00",
    });
    const urgent = await addWaiting(practice, { urgency: "urgent" });
    const text = await addWaiting(practice, {});
    const mailless = await addWaiting(practice, {}, null);
    const long = await addWaiting(practice, { serviceId: practice.services.initial.id });
    const friday = await addWaiting(practice, { wishes: { weekdays: [5] } });
    const view = await listOfferMatches(desk(), time("10:15"));
    expect(view).toMatchObject({
      day: "2026-12-08",
      startTime: "10:15",
      freeUntilTime: "11:00",
      freeMinutes: 45,
      offerCount: 3,
      offerMinutes: 120,
      openRoundId: null,
    });
    expect(view.matches.map((m) => m.entryId)).toEqual([urgent.entry.id, text.entry.id, mailless.entry.id]);
    expect(view.matches[0]?.reasons).toEqual(["Urgent", "Waits since today", "Leaves 15 minutes over"]);
    expect(view.matches[2]).toMatchObject({
      canReceive: false,
      caveat: expect.stringContaining("ring them"),
    });
    expect(view.others).toEqual([
      {
        entryId: long.entry.id,
        patientName: expect.any(String),
        whyNot: expect.stringContaining("45 minutes are free"),
      },
      { entryId: friday.entry.id, patientName: expect.any(String), whyNot: "Cannot come on a Tuesday" },
    ]);
  });

  it.each([
    ["08:00", "2026-12-12", "outside-hours"],
    ["12:15", "2026-12-08", "outside-hours"],
    ["10:12", "2026-12-08", "off-grid"],
    ["08:00", "2026-12-01", "too-soon"],
    ["09:10", "2026-12-01", "too-soon"],
  ])("refuses %s on %s: %s", async (clock, day, kind) => {
    await expect(listOfferMatches(desk(), time(clock, day))).rejects.toMatchObject({ kind });
  });

  it("refuses a taken time and other desks' sites", async () => {
    await addAppointment(practice, {
      patientId: (await addPatient(practice)).id,
      day: "2026-12-08",
      time: "10:00",
    });
    await expect(listOfferMatches(desk(), time("10:15"))).rejects.toMatchObject({ kind: "slot-taken" });
    await expect(
      listOfferMatches(contextFor(practice, "tollhouseReceptionist"), time("11:00")),
    ).rejects.toMatchObject({ code: "not-found" });
  });
});

describe("offering it", () => {
  it("writes a round, a link for each, and no token anywhere but in the message", async () => {
    const { roundId, tokens, offers, startsAt } = await openRound(practice, {
      day: "2026-12-08",
      time: "10:15",
      people: 3,
    });
    expect(new Set(tokens).size).toBe(3);
    for (const token of tokens) expect(JSON.stringify(offers)).not.toContain(token);
    const view = await getOfferRound(desk(), { roundId });
    expect(view).toMatchObject({
      state: "open",
      day: "2026-12-08",
      startTime: "10:15",
      endTime: "12:00",
      expiresTime: "11:00",
      startsAt: startsAt.toISOString(),
    });
    expect(view.offers.map((o) => [o.rank, o.state, o.message])).toEqual(
      [1, 2, 3].map((n) => [n, "open", "waiting"]),
    );
    expect(await listOfferRounds(desk(), {})).toEqual([view]);
    expect(await listOfferRounds(contextFor(practice, "tollhouseReceptionist"), {})).toEqual([]);
    expect((await auditOf(practice, roundId)).map((a) => a.action)).toEqual(["offer-round.made"]);
  });

  it("sends the link by e-mail with when, where and with whom, nothing clinical, and forgets it then", async () => {
    const { offers, tokens, waiting } = await openRound(practice, {
      day: "2026-12-08",
      time: "10:15",
      people: 1,
    });
    const mail = recordingMail();
    await drainAll(mail);
    const [sent] = mail.to(waiting[0]?.patient.email ?? "");
    expect(sent?.text).toContain(`/link/${tokens[0]}/offer`);
    for (const said of ["Tuesday 8 December 2026 at 10:15am", "10:45am", "Saltgate", "Ana"])
      expect(sent?.text).toContain(said);
    expect(sent?.text).not.toMatch(/follow-up|hip|assessment/i);
    const [row] = await messagesOf(practice, offers[0]?.id ?? "", "offer-made");
    expect(row).toMatchObject({ state: "sent", payload: {} });
  });

  it("refuses what no longer fits, who cannot be written to, and a second round for the same time", async () => {
    const fits = await addWaiting(practice);
    const mailless = await addWaiting(practice, {}, null);
    const friday = await addWaiting(practice, { wishes: { weekdays: [5] } });
    const offer = (ids: string[], clock = "10:15") =>
      offerTime(desk(), { ...time(clock), entryIds: ids, minutes: 60 });
    const before = await everything(practice);
    await expect(offer([fits.entry.id, mailless.entry.id])).rejects.toMatchObject({ kind: "no-address" });
    await expect(offer([fits.entry.id, friday.entry.id])).rejects.toMatchObject({ kind: "no-match" });
    await expect(offer([fits.entry.id, newId()])).rejects.toMatchObject({ code: "not-found" });
    expect(await everything(practice)).toEqual(before);
    const { roundId } = await offer([fits.entry.id]);
    const other = await addWaiting(practice);
    await expect(offer([other.entry.id])).rejects.toMatchObject({ kind: "on-offer", detail: { roundId } });
    await expect(offer([fits.entry.id], "14:00"), "one open offer each").rejects.toMatchObject({
      kind: "no-match",
    });
    const races = await Promise.allSettled(
      [1, 2, 3, 4].map(async () => offer([(await addWaiting(practice)).entry.id], "15:00")),
    );
    expect(races.filter((one) => one.status === "fulfilled")).toHaveLength(1);
  });
});

describe("stopping it", () => {
  it("tells everyone once and takes no answer any more; a second stop is refused", async () => {
    const { roundId, offers, waiting } = await openRound(practice, {
      day: "2026-12-08",
      time: "10:15",
      people: 2,
    });
    const stop = () => stopOfferRound(desk(), { roundId, version: 1 });
    await expect(
      stopOfferRound(contextFor(practice, "tollhouseReceptionist"), { roundId, version: 1 }),
    ).rejects.toMatchObject({ code: "not-found" });
    expect(await stop()).toMatchObject({
      state: "stopped",
      offers: [{ state: "stopped" }, { state: "stopped" }],
    });
    await expect(stop()).rejects.toMatchObject({ kind: "wrong-state" });
    for (const { id } of offers) expect(await messagesOf(practice, id, "offer-gone")).toHaveLength(1);
    const mail = recordingMail();
    await drainAll(mail);
    const subjects = waiting.flatMap(({ patient }) => mail.to(patient.email ?? "")).map((one) => one.subject);
    expect(
      subjects.filter((one) => one.startsWith("A time has come free")),
      "a link that accepts nothing is not sent",
    ).toEqual([]);
    expect(subjects.filter((one) => one.endsWith("has gone"))).toHaveLength(2);
  });
});

describe("freed times", () => {
  it("are those that a cancelled or moved visit gave back, until someone has them or they are on offer", async () => {
    const book = async (clock: string) =>
      bookAppointment(desk(), {
        ...time(clock),
        patientId: (await addPatient(practice)).id,
        serviceId: practice.services.followUp.id,
      });
    const [first, second] = [await book("09:00"), await book("10:00")];
    await cancelAppointment(desk(), {
      appointmentId: first.id,
      version: first.version,
      by: "patient",
      reason: "Away",
    });
    await moveAppointment(desk(), {
      appointmentId: second.id,
      version: second.version,
      startsAt: startOn(practice, "2026-12-08", "14:00"),
    });
    const seen = async () =>
      (await listFreedTimes(desk(), {})).map((row) => [row.startTime, row.how, row.minutes]);
    expect(await seen()).toEqual([
      ["09:00", "cancelled", 30],
      ["10:00", "moved", 30],
    ]);
    await book("09:00");
    expect(await seen()).toEqual([["10:00", "moved", 30]]);
    const { entryId } = await addWaitingEntry(desk(), {
      patientId: (await addPatient(practice)).id,
      serviceId: practice.services.followUp.id,
      urgency: "routine",
      wishes: {},
    });
    await offerTime(desk(), { ...time("10:00"), entryIds: [entryId], minutes: 60, freedById: second.id });
    expect(await seen()).toEqual([]);
  });
});
