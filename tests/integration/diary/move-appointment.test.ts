import { appointmentMessagePayload, type StaleAppointmentDetail } from "@withy/contracts/diary";
import { getDiaryPulse, markAppointment, moveAppointment } from "@withy/services/diary";
import { beforeAll, describe, expect, it } from "vitest";
import { auditOf, messagesAbout } from "../../support/audit-rows";
import { contextFor } from "../../support/contexts";
import { buildPractice, type TestPractice } from "../../support/practice";
import type { TestPerson } from "../../support/practice-staff";
import { bookedVisit, claimsFor, failureOf } from "./booking-steps";

let practice: TestPractice;
let other: TestPractice;

beforeAll(async () => {
  practice = await buildPractice();
  other = await buildPractice({ name: "Cairn & Firth Clinics" });
});

const move = (
  person: TestPerson,
  appointmentId: string,
  version: number,
  startsAt: string,
  more: object = {},
) => moveAppointment(contextFor(practice, person), { appointmentId, version, startsAt, ...more });

describe("moving a visit", () => {
  it("takes the new time, gives the old one back, and tells the patient both", async () => {
    const { visit } = await bookedVisit(practice, "2026-12-02T09:00");
    const moved = await move("receptionist", visit.id, 1, "2026-12-02T09:15");
    expect(moved).toMatchObject({ version: 2, startTime: "09:15", endTime: "09:45", state: "booked" });
    const slots = (await claimsFor(practice, visit.id)).map((c) => c.slotAt.toISOString()).sort();
    expect(slots[0]).toBe("2026-12-02T09:15:00.000Z");
    expect(slots).toHaveLength(14);
    expect((await auditOf(practice, visit.id)).at(-1)).toMatchObject({
      action: "appointment.moved",
      detail: { startsAtBefore: "2026-12-02T09:00:00.000Z", startsAt: "2026-12-02T09:15:00.000Z" },
    });
    const message = (await messagesAbout(practice, visit.id)).at(-1);
    expect(message?.template).toBe("booking-moved");
    expect(appointmentMessagePayload.parse(message?.payload)).toMatchObject({
      version: 2,
      previousStartsAt: "2026-12-02T09:00:00.000Z",
    });
    const { visit: second } = await bookedVisit(practice, "2026-12-02T08:25");
    expect(second.startTime).toBe("08:25");
  });

  it("goes to another site with a room there, and both desks see a change", async () => {
    const owner = contextFor(practice, "owner");
    const sites = practice.sites;
    const { visit } = await bookedVisit(practice, "2026-12-02T13:00");
    const before = await Promise.all(
      [sites.saltgate.id, sites.tollhouse.id].map((id) => getDiaryPulse(owner, { siteIds: id })),
    );
    const moved = await move("owner", visit.id, 1, "2026-12-03T10:00", {
      siteId: sites.tollhouse.id,
      therapistId: practice.staff.otherTherapist.id,
    });
    expect(moved).toMatchObject({
      site: { name: "Tollhouse Lane" },
      room: { id: practice.rooms.tollhouseRoom1.id },
    });
    const after = await Promise.all(
      [sites.saltgate.id, sites.tollhouse.id].map((id) => getDiaryPulse(owner, { siteIds: id })),
    );
    expect(after[0]?.pulse).not.toBe(before[0]?.pulse);
    expect(after[1]?.pulse).not.toBe(before[1]?.pulse);
  });

  it("asks for a new confirmation of a new time", async () => {
    const { visit } = await bookedVisit(practice, "2026-12-04T09:00");
    const desk = contextFor(practice, "receptionist");
    const confirmed = await markAppointment(desk, { appointmentId: visit.id, version: 1, to: "confirmed" });
    const longer = await move("receptionist", visit.id, confirmed.version, visit.startsAt, {
      durationMinutes: 45,
    });
    expect(longer).toMatchObject({ state: "confirmed", endTime: "09:45" });
    const later = await move("receptionist", visit.id, longer.version, "2026-12-04T10:00");
    expect(later).toMatchObject({ state: "booked", durationMinutes: 45 });
  });
});

describe("what is refused", () => {
  it("a time that someone else has; the visit stays where it was", async () => {
    const { visit: first } = await bookedVisit(practice, "2026-12-07T09:00");
    const { visit: second } = await bookedVisit(practice, "2026-12-07T10:00");
    const failure = await failureOf(move("receptionist", second.id, 1, "2026-12-07T09:20"));
    expect(failure).toMatchObject({ kind: "slot-taken", detail: { takenBy: { appointmentId: first.id } } });
    const slots = (await claimsFor(practice, second.id)).map((c) => c.slotAt.toISOString()).sort();
    expect(slots[0]).toBe("2026-12-07T10:00:00.000Z");
    expect(slots).toHaveLength(14);
  });

  it("what someone else changed meanwhile, with how it stands now", async () => {
    const { visit } = await bookedVisit(practice, "2026-12-08T09:00");
    await move("receptionist", visit.id, 1, "2026-12-08T10:00");
    const failure = await failureOf(move("therapist", visit.id, 1, "2026-12-08T11:00"));
    expect(failure.code).toBe("stale");
    const { current } = failure.detail as unknown as StaleAppointmentDetail;
    expect(current).toMatchObject({ id: visit.id, version: 2, startTime: "10:00" });
  });

  it("a visit that has arrived", async () => {
    const { visit } = await bookedVisit(practice, "2026-12-01T10:00");
    await markAppointment(contextFor(practice, "receptionist"), {
      appointmentId: visit.id,
      version: 1,
      to: "arrived",
    });
    const failure = await failureOf(move("receptionist", visit.id, 2, "2026-12-09T11:00"));
    expect(failure).toMatchObject({ kind: "wrong-state", message: expect.stringContaining("arrived") });
  });

  it("another practice, another desk's site and a role without the right", async () => {
    const { visit } = await bookedVisit(practice, "2026-12-09T09:00");
    const input = { appointmentId: visit.id, version: 1, startsAt: "2026-12-09T10:00" };
    expect((await failureOf(moveAppointment(contextFor(other, "owner"), input))).code).toBe("not-found");
    expect((await failureOf(move("tollhouseReceptionist", visit.id, 1, "2026-12-09T10:00"))).code).toBe(
      "not-found",
    );
    expect((await failureOf(move("accounts", visit.id, 1, "2026-12-09T10:00"))).code).toBe("forbidden");
    const away = { siteId: practice.sites.tollhouse.id };
    expect((await failureOf(move("receptionist", visit.id, 1, "2026-12-09T10:00", away))).code).toBe(
      "not-found",
    );
  });
});

describe("two at once", () => {
  it("move the same visit: one moves it, the other is told that it changed", async () => {
    const { visit } = await bookedVisit(practice, "2026-12-10T09:00");
    const tries = await Promise.allSettled([
      move("receptionist", visit.id, 1, "2026-12-10T10:00"),
      move("therapist", visit.id, 1, "2026-12-10T11:00"),
    ]);
    expect(tries.filter((t) => t.status === "fulfilled")).toHaveLength(1);
    const lost = tries.find((t) => t.status === "rejected");
    expect(lost?.status === "rejected" && lost.reason).toMatchObject({ code: "stale" });
    expect(await claimsFor(practice, visit.id)).toHaveLength(14);
  });
});
