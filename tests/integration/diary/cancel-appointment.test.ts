import {
  bookAppointment,
  cancelAppointment,
  listRecentChanges,
  markAppointment,
  undoCancel,
} from "@withy/services/diary";
import { beforeAll, describe, expect, it } from "vitest";
import { auditOf, messagesAbout } from "../../support/audit-rows";
import { contextFor } from "../../support/contexts";
import { addPatient } from "../../support/people";
import { buildPractice, type TestPractice } from "../../support/practice";
import type { TestPerson } from "../../support/practice-staff";
import { bookedVisit, claimsFor, failureOf, followUp } from "./booking-steps";

let practice: TestPractice;
let other: TestPractice;

beforeAll(async () => {
  practice = await buildPractice();
  other = await buildPractice({ name: "Cairn & Firth Clinics" });
});

const cancel = (person: TestPerson, appointmentId: string, more: object = {}) =>
  cancelAppointment(contextFor(practice, person), {
    appointmentId,
    version: 1,
    by: "patient",
    reason: "Has a cold",
    ...more,
  });

describe("cancelling a visit", () => {
  it("gives the time back, is audited and told to the patient", async () => {
    const { visit } = await bookedVisit(practice, "2026-12-03T09:00");
    const cancelled = await cancel("receptionist", visit.id);
    expect(cancelled).toMatchObject({
      state: "cancelled",
      version: 2,
      cancellation: { by: "patient", reason: "Has a cold", isLate: false },
      undoTo: "booked",
      next: [],
      canMove: false,
    });
    expect(await claimsFor(practice, visit.id)).toEqual([]);
    expect((await auditOf(practice, visit.id)).at(-1)).toMatchObject({
      action: "appointment.cancelled",
      detail: { state: "cancelled", stateBefore: "booked" },
    });
    expect((await messagesAbout(practice, visit.id)).map((m) => m.template)).toEqual([
      "booking-confirmed",
      "booking-cancelled",
    ]);
  });

  it.each([
    ["patient", "2026-12-02T09:00", false],
    ["patient", "2026-12-01T15:00", true],
    ["clinic", "2026-12-01T14:00", false],
  ])("by the %s of %s: late %s", async (by, startsAt, isLate) => {
    const { visit } = await bookedVisit(practice, startsAt);
    expect((await cancel("receptionist", visit.id, { by })).cancellation).toMatchObject({ by, isLate });
  });

  it("is refused without a reason, for a visit that is over, and to those without the right", async () => {
    const { visit } = await bookedVisit(practice, "2026-12-04T09:00");
    const blank = await failureOf(cancel("receptionist", visit.id, { reason: " " }));
    expect(blank.fields).toEqual([{ field: "reason", message: "Say why, in a few words." }]);
    expect((await failureOf(cancel("accounts", visit.id))).code).toBe("forbidden");
    expect((await failureOf(cancel("tollhouseReceptionist", visit.id))).code).toBe("not-found");
    const foreign = { appointmentId: visit.id, version: 1, by: "clinic" as const, reason: "Test" };
    expect((await failureOf(cancelAppointment(contextFor(other, "owner"), foreign))).code).toBe("not-found");
    expect((await failureOf(cancel("receptionist", visit.id, { version: 7 }))).code).toBe("stale");
    await cancel("receptionist", visit.id);
    expect((await failureOf(cancel("receptionist", visit.id, { version: 2 }))).kind).toBe("wrong-state");
  });
});

describe("undoing a cancellation", () => {
  it("brings back the visit, its state, its time and its place in the calendar", async () => {
    const { visit } = await bookedVisit(practice, "2026-12-07T09:00");
    const desk = contextFor(practice, "receptionist");
    await markAppointment(desk, { appointmentId: visit.id, version: 1, to: "confirmed" });
    await cancel("receptionist", visit.id, { version: 2 });
    const back = await undoCancel(desk, { appointmentId: visit.id, version: 3 });
    expect(back).toMatchObject({ state: "confirmed", version: 4, cancellation: null, undoTo: "booked" });
    expect(await claimsFor(practice, visit.id)).toHaveLength(14);
    expect((await auditOf(practice, visit.id)).at(-1)?.action).toBe("appointment.undone");
    expect((await messagesAbout(practice, visit.id)).at(-1)?.template).toBe("booking-confirmed");
    const again = await failureOf(undoCancel(desk, { appointmentId: visit.id, version: 4 }));
    expect(again.kind).toBe("wrong-state");
  });

  it("is refused once the time has gone to someone else", async () => {
    const { visit } = await bookedVisit(practice, "2026-12-08T09:00");
    const cancelled = await cancel("receptionist", visit.id);
    const { patient } = await bookedVisit(practice, "2026-12-08T09:20");
    const desk = contextFor(practice, "receptionist");
    const failure = await failureOf(
      undoCancel(desk, { appointmentId: visit.id, version: cancelled.version }),
    );
    expect(failure.kind).toBe("slot-taken");
    expect(failure.detail).toMatchObject({
      takenBy: { patientName: `${patient.givenName} ${patient.familyName}` },
    });
    expect(await claimsFor(practice, visit.id)).toEqual([]);
  });

  it("is for those who may cancel, at the visit's own site", async () => {
    const { visit } = await bookedVisit(practice, "2026-12-09T09:00");
    const { version } = await cancel("receptionist", visit.id);
    const undo = (person: TestPerson) =>
      undoCancel(contextFor(practice, person), { appointmentId: visit.id, version });
    expect((await failureOf(undo("accounts"))).code).toBe("forbidden");
    expect((await failureOf(undo("tollhouseReceptionist"))).code).toBe("not-found");
    expect(
      (await failureOf(undoCancel(contextFor(other, "owner"), { appointmentId: visit.id, version }))).code,
    ).toBe("not-found");
    expect((await undo("therapist")).state).toBe("booked");
  });
});

describe("the time of a cancelled visit", () => {
  it("goes to one of: the next caller, or whoever undoes the cancellation", async () => {
    const { visit } = await bookedVisit(practice, "2026-12-10T09:00");
    const { version } = await cancel("receptionist", visit.id);
    const patient = await addPatient(practice);
    const desk = contextFor(practice, "receptionist");
    const tries = await Promise.allSettled([
      undoCancel(desk, { appointmentId: visit.id, version }),
      bookAppointment(desk, followUp(practice, patient.id, "2026-12-10T09:00")),
    ]);
    expect(tries.filter((t) => t.status === "fulfilled")).toHaveLength(1);
  });

  it("stands in the recent changes, newest first, with what can be taken back", async () => {
    const { patient, visit } = await bookedVisit(practice, "2026-12-11T09:00");
    practice.clock.advance(1);
    await cancel("receptionist", visit.id);
    const [latest, earlier] = await listRecentChanges(contextFor(practice, "therapist"), {});
    const name = `${patient.givenName} ${patient.familyName}`;
    expect(latest).toMatchObject({
      kind: "cancelled",
      what: `cancelled ${name}, Fri 11 Dec 09:00`,
      byName: "Bea Lockyer",
      canUndo: true,
      version: 2,
    });
    expect(earlier).toMatchObject({
      kind: "booked",
      what: `booked ${name} for Fri 11 Dec 09:00`,
      canUndo: false,
    });
    expect((await failureOf(listRecentChanges(contextFor(practice, "accounts"), {}))).code).toBe("forbidden");
    expect(await listRecentChanges(contextFor(other, "owner"), {})).toEqual([]);
  });
});
