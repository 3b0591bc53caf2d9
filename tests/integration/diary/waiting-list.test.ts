import { newId } from "@withy/core/ids";
import {
  addWaitingEntry,
  editWaitingEntry,
  listPatientVisitsAhead,
  listWaiting,
  withdrawWaitingEntry,
} from "@withy/services/diary";
import { beforeEach, describe, expect, it } from "vitest";
import { auditOf } from "../../support/audit-rows";
import { contextFor } from "../../support/contexts";
import { addAppointment } from "../../support/diary-rows";
import { addPatient } from "../../support/people";
import { buildPractice, type TestPractice } from "../../support/practice";
import { addWaiting, entryOf, openRound, roundOf } from "./offer-steps";

let practice: TestPractice;
beforeEach(async () => {
  practice = await buildPractice();
});

const wishes = {
  weekdays: [2, 1, 2],
  partsOfDay: ["morning" as const],
  latestOn: "2026-12-18",
  noticeHours: 24,
};

describe("putting someone on the list", () => {
  it("keeps what they would take, once however often it is sent, and writes it down", async () => {
    const patient = await addPatient(practice);
    const later = await addAppointment(practice, { patientId: patient.id, day: "2026-12-22", time: "10:00" });
    const ctx = contextFor(practice, "receptionist", { idempotencyKey: newId() });
    const input = {
      ...{ patientId: patient.id, serviceId: practice.services.followUp.id, insteadOfId: later.id },
      ...{ urgency: "soon" as const, deskNote: " Works nights ", wishes },
    };
    const { entryId } = await addWaitingEntry(ctx, input);
    expect(await addWaitingEntry(ctx, input)).toEqual({ entryId });
    expect(await entryOf(practice, entryId)).toMatchObject({
      wishes: { weekdays: [1, 2], partsOfDay: ["morning"], latestOn: "2026-12-18", noticeHours: 24 },
      ...{ state: "waiting", deskNote: "Works nights", insteadOfId: later.id, version: 1 },
    });
    expect((await auditOf(practice, entryId)).map((a) => [a.action, a.patientId])).toEqual([
      ["waiting-entry.added", patient.id],
    ]);
    const { rows } = await listWaiting(ctx, {});
    expect(rows[0]).toMatchObject({
      wishWords: "Mon or Tue, mornings, by Fri 18 Dec, with 24 h notice",
      insteadOf: { id: later.id, day: "2026-12-22", startTime: "10:00" },
      openRoundId: null,
    });
  });

  it("refuses a second line for the same, another's visit, a visit that is over, ids of elsewhere", async () => {
    const { patient } = await addWaiting(practice);
    const other = await addPatient(practice);
    const theirs = await addAppointment(practice, { patientId: other.id, day: "2026-12-22", time: "10:00" });
    const past = await addAppointment(practice, {
      patientId: patient.id,
      day: "2026-11-30",
      time: "10:00",
      values: { state: "fulfilled" },
    });
    const foreign = await buildPractice();
    const base = {
      patientId: patient.id,
      serviceId: practice.services.initial.id,
      urgency: "routine" as const,
      wishes: {},
    };
    const add = (change: object) =>
      addWaitingEntry(contextFor(practice, "receptionist"), { ...base, ...change });
    const second = { serviceId: practice.services.followUp.id };
    await expect(add(second)).rejects.toMatchObject({ kind: "waits-already" });
    await expect(add({ insteadOfId: theirs.id })).rejects.toMatchObject({ code: "not-found" });
    await expect(add({ insteadOfId: past.id })).rejects.toMatchObject({ kind: "wrong-state" });
    await expect(add({ wishes: { siteIds: [foreign.sites.saltgate.id] } })).rejects.toMatchObject({
      code: "not-found",
    });
    await expect(add({ wishes: { therapistIds: [foreign.staff.therapist.id] } })).rejects.toMatchObject({
      code: "not-found",
    });
    await expect(add({ wishes: { noticeHours: 400 } })).rejects.toMatchObject({ code: "invalid" });
    await expect(
      add({ wishes: { siteIds: [practice.sites.tollhouse.id] } }),
      "no desk of theirs",
    ).rejects.toMatchObject({ code: "not-found" });
    const both = await Promise.allSettled([add({}), add({})]);
    expect(both.map((one) => one.status).sort()).toEqual(["fulfilled", "rejected"]);
  });
});

describe("the list", () => {
  it("stands by urgency and then by the wait, is paged, and filtered by site, urgency and patient", async () => {
    const since = (day: string) => ({ waitingSince: new Date(`${day}T10:00:00Z`) });
    const routine = await addWaiting(practice, since("2026-10-01"));
    const soon = await addWaiting(practice, { urgency: "soon", ...since("2026-11-20") });
    const sooner = await addWaiting(practice, { urgency: "soon", ...since("2026-11-10") });
    const urgent = await addWaiting(practice, {
      urgency: "urgent",
      wishes: { siteIds: [practice.sites.tollhouse.id] },
    });
    const ids = (people: { entry: { id: string } }[]) => people.map(({ entry }) => entry.id);
    const read = async (
      input: Parameters<typeof listWaiting>[1],
      person: "owner" | "receptionist" = "owner",
    ) => listWaiting(contextFor(practice, person), input);
    const listed = async (...args: Parameters<typeof read>) =>
      (await read(...args)).rows.map((row) => row.id);
    expect(await listed({})).toEqual(ids([urgent, sooner, soon, routine]));
    expect(await listed({}, "receptionist"), "a desk sees whom it can serve").toEqual(
      ids([sooner, soon, routine]),
    );
    expect(await listed({ siteId: practice.sites.tollhouse.id })).toHaveLength(4);
    expect(await listed({ siteId: practice.sites.saltgate.id })).toEqual(ids([sooner, soon, routine]));
    expect(await listed({ urgency: "soon" })).toEqual(ids([sooner, soon]));
    expect(await listed({ patientId: routine.patient.id })).toEqual(ids([routine]));
    const second = await read({ page: 2, pageSize: 3 });
    expect([second.total, second.rows.map((row) => row.id)]).toEqual([4, ids([routine])]);
    expect((await read({ page: 9, pageSize: 3 })).rows).toEqual([]);
    expect((await read({ patientId: routine.patient.id })).rows[0]?.waitsDays).toBe(60);
  });

  it("offers the visits ahead to choose the one that is given up", async () => {
    const patient = await addPatient(practice);
    await addAppointment(practice, { patientId: patient.id, day: "2026-11-30", time: "10:00" });
    await addAppointment(practice, {
      patientId: patient.id,
      day: "2026-12-21",
      time: "10:00",
      values: { state: "cancelled" },
    });
    const ahead = await addAppointment(practice, { patientId: patient.id, day: "2026-12-22", time: "10:00" });
    const found = await listPatientVisitsAhead(contextFor(practice, "receptionist"), {
      patientId: patient.id,
    });
    expect(found).toMatchObject([{ id: ahead.id, day: "2026-12-22", startTime: "10:00" }]);
  });
});

describe("changing and leaving the list", () => {
  it("edits as the screen saw it, and refuses an older view", async () => {
    const { entry } = await addWaiting(practice);
    const ctx = contextFor(practice, "receptionist");
    const input = {
      entryId: entry.id,
      version: 1,
      serviceId: entry.serviceId,
      urgency: "urgent" as const,
      wishes: { weekdays: [5] },
    };
    await editWaitingEntry(ctx, input);
    expect(await entryOf(practice, entry.id)).toMatchObject({
      urgency: "urgent",
      wishes: { weekdays: [5] },
      version: 2,
      waitingSince: entry.waitingSince,
    });
    await expect(editWaitingEntry(ctx, input)).rejects.toMatchObject({ code: "stale" });
    await expect(editWaitingEntry(contextFor(practice, "accounts"), input)).rejects.toMatchObject({
      code: "forbidden",
    });
  });

  it("takes them off with what was on offer to them, once", async () => {
    const { waiting, roundId } = await openRound(practice, { day: "2026-12-08", time: "10:15", people: 1 });
    const entryId = waiting[0]?.entry.id ?? "";
    const ctx = contextFor(practice, "receptionist");
    await withdrawWaitingEntry(ctx, { entryId, version: 1 });
    expect(await entryOf(practice, entryId)).toMatchObject({ state: "withdrawn", version: 2 });
    expect((await roundOf(practice, roundId)).state).toBe("expired");
    await expect(withdrawWaitingEntry(ctx, { entryId, version: 2 })).rejects.toMatchObject({
      kind: "wrong-state",
    });
    expect((await listWaiting(ctx, {})).rows.map((row) => row.id)).not.toContain(entryId);
  });
});
