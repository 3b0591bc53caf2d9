import { newId } from "@withy/core/ids";
import { absences, sites } from "@withy/db/schema";
import {
  bookAppointment,
  cancelAppointment,
  getBookingChoices,
  getDiaryDay,
  getTherapistWeek,
} from "@withy/services/diary";
import { and, eq } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import { contextFor } from "../../support/contexts";
import { addPatient } from "../../support/people";
import { buildPractice, type TestPractice } from "../../support/practice";
import { bookedVisit, failureOf, followUp } from "./booking-steps";

let practice: TestPractice;
let other: TestPractice;

beforeAll(async () => {
  practice = await buildPractice();
  other = await buildPractice({ name: "Cairn & Firth Clinics" });
  const block = {
    practiceId: practice.practiceId,
    createdBy: practice.staff.owner.id,
    kind: "blocked" as const,
  };
  await practice.db.insert(absences).values([
    {
      ...{ ...block, id: newId(), staffMemberId: practice.staff.therapist.id, reason: "Supervision" },
      ...{ startsAt: new Date("2026-12-02T15:00Z"), endsAt: new Date("2026-12-02T16:00Z") },
    },
    {
      ...{ ...block, id: newId(), roomId: practice.rooms.saltgateRoom2.id, reason: "Boiler" },
      ...{ startsAt: new Date("2026-12-02T10:00Z"), endsAt: new Date("2026-12-02T11:00Z") },
    },
  ]);
});

describe("the day", () => {
  it("has a column for everyone who works there, with hours, breaks, blocks, visits and what is free", async () => {
    const { visit, patient } = await bookedVisit(practice, "2026-12-02T10:00", {
      deskNote: "Bring the form",
    });
    const { visit: gone } = await bookedVisit(practice, "2026-12-02T09:00");
    await cancelAppointment(contextFor(practice, "receptionist"), {
      appointmentId: gone.id,
      version: 1,
      by: "clinic",
      reason: "Test",
    });
    const day = await getDiaryDay(contextFor(practice, "receptionist"), { day: "2026-12-02" });
    expect(day.columns.map((c) => c.name)).toEqual(["Idris Vane", "Ana Ferreby"]);
    expect(day.sites).toMatchObject([
      { name: "Saltgate", hours: { fromMinute: 480, untilMinute: 1140 }, closedReason: null },
    ]);
    expect(day.bounds).toEqual({ fromMinute: 480, untilMinute: 1140 });
    const ana = day.columns[1];
    expect(ana).toMatchObject({
      hours: [
        { fromMinute: 480, untilMinute: 720 },
        { fromMinute: 780, untilMinute: 960 },
      ],
      blocks: [
        { kind: "break", reason: "Lunch", fromMinute: 720, untilMinute: 780 },
        { kind: "blocked", reason: "Supervision", fromMinute: 900, untilMinute: 960 },
      ],
      free: [
        { fromMinute: 480, untilMinute: 600 },
        { fromMinute: 635, untilMinute: 720 },
        { fromMinute: 780, untilMinute: 900 },
      ],
      freeMinutes: 325,
    });
    expect(ana?.appointments).toMatchObject([
      { id: gone.id, state: "cancelled", fromMinute: 540 },
      {
        id: visit.id,
        state: "booked",
        fromMinute: 600,
        untilMinute: 630,
        patientName: `${patient.givenName} ${patient.familyName}`,
        roomName: "Room 1",
        hasDeskNote: true,
      },
    ]);
    expect(day.counts).toEqual({ booked: 1, waiting: 0, gaps: 5 });
    expect(day.nowMinute).toBeNull();
    expect(day.pulse).not.toBeNull();
  });

  it("has a column for every room, with the rooms' own blocks", async () => {
    const day = await getDiaryDay(contextFor(practice, "receptionist"), { day: "2026-12-02", by: "room" });
    expect(day.columns.map((c) => c.name)).toEqual(["Room 1", "Room 2", "Gym"]);
    expect(day.columns[1]?.blocks).toEqual([
      { kind: "blocked", reason: "Boiler", fromMinute: 600, untilMinute: 660 },
    ]);
    expect(day.columns[1]?.freeMinutes).toBe(600);
  });

  it("counts free time from now on, knows the minute, and says why a site is closed", async () => {
    const desk = contextFor(practice, "receptionist");
    const today = await getDiaryDay(desk, {});
    expect(today).toMatchObject({ day: "2026-12-01", nowMinute: 540 });
    expect(today.columns[0]?.free[0]).toEqual({ fromMinute: 540, untilMinute: 720 });
    const holiday = await getDiaryDay(desk, { day: "2026-12-25" });
    expect(holiday.sites[0]).toMatchObject({ hours: null, closedReason: "Christmas Day" });
    expect(holiday.columns.every((c) => c.freeMinutes === 0)).toBe(true);
    const sunday = await getDiaryDay(desk, { day: "2026-12-06" });
    expect(sunday.sites[0]?.closedReason).toBe("Closed on this weekday");
    const past = await getDiaryDay(desk, { day: "2026-11-30" });
    expect(past.columns.map((c) => c.freeMinutes)).toEqual([0, 0]);
  });

  it("keeps to the sites within reach", async () => {
    const both = [practice.sites.saltgate.id, practice.sites.tollhouse.id];
    const all = await getDiaryDay(contextFor(practice, "owner"), { day: "2026-12-03", siteIds: both });
    expect(all.columns.map((c) => c.name)).toEqual(["Idris Vane", "Ana Ferreby", "Tomasz Hale"]);
    const own = await getDiaryDay(contextFor(practice, "tollhouseReceptionist"), { day: "2026-12-03" });
    expect(own.columns.map((c) => c.name)).toEqual(["Tomasz Hale"]);
    expect((await failureOf(getDiaryDay(contextFor(practice, "receptionist"), { siteIds: both }))).code).toBe(
      "not-found",
    );
    expect((await failureOf(getDiaryDay(contextFor(other, "owner"), { siteIds: both }))).code).toBe(
      "not-found",
    );
    expect((await failureOf(getDiaryDay(contextFor(practice, "accounts"), {}))).code).toBe("forbidden");
  });

  it("is the site's own day where the site lies in another zone", async () => {
    const own = await buildPractice();
    const { tollhouse } = own.sites;
    await own.db
      .update(sites)
      .set({ zone: "Pacific/Auckland" })
      .where(and(eq(sites.practiceId, own.practiceId), eq(sites.id, tollhouse.id)));
    const owner = contextFor(own, "owner");
    const patient = await addPatient(own);
    const place = { siteId: tollhouse.id, therapistId: own.staff.otherTherapist.id };
    const visit = await bookAppointment(owner, followUp(own, patient.id, "2026-12-03T09:00", place));
    expect(visit).toMatchObject({
      startsAt: "2026-12-02T20:00:00.000Z",
      day: "2026-12-03",
      startTime: "09:00",
    });
    const day = await getDiaryDay(owner, { day: "2026-12-03", siteIds: tollhouse.id });
    expect(day.columns.flatMap((c) => c.appointments)).toMatchObject([{ id: visit.id, fromMinute: 540 }]);
  });
});

describe("a therapist's week", () => {
  it("runs from Monday over every site within reach", async () => {
    await bookedVisit(practice, "2026-12-11T09:00");
    const therapistId = practice.staff.therapist.id;
    const week = await getTherapistWeek(contextFor(practice, "owner"), { therapistId, day: "2026-12-09" });
    expect(week.days.map((d) => d.day)).toEqual([
      "2026-12-07",
      "2026-12-08",
      "2026-12-09",
      "2026-12-10",
      "2026-12-11",
      "2026-12-12",
      "2026-12-13",
    ]);
    expect(week.days.map((d) => d.appointments.length)).toEqual([0, 0, 0, 0, 1, 0, 0]);
    expect(week.days.map((d) => d.freeMinutes)).toEqual([420, 420, 420, 420, 385, 0, 0]);
    expect(week.days[4]?.sites).toMatchObject([{ name: "Saltgate" }]);
    expect(week.bounds).toEqual({ fromMinute: 480, untilMinute: 960 });
  });

  it("is not there for another practice, nor for someone who treats nobody", async () => {
    const ask = (who: TestPractice, therapistId: string) =>
      failureOf(getTherapistWeek(contextFor(who, "owner"), { therapistId }));
    expect((await ask(other, practice.staff.therapist.id)).code).toBe("not-found");
    expect((await ask(practice, practice.staff.accounts.id)).code).toBe("not-found");
    const accounts = getTherapistWeek(contextFor(practice, "accounts"), {
      therapistId: practice.staff.therapist.id,
    });
    expect((await failureOf(accounts)).code).toBe("forbidden");
  });
});

describe("what a booking form offers", () => {
  it("is what may be booked where this person may book", async () => {
    const desk = await getBookingChoices(contextFor(practice, "tollhouseReceptionist"), {});
    expect(desk.sites.map((s) => s.name)).toEqual(["Tollhouse Lane"]);
    expect(desk.rooms.map((r) => r.name)).toEqual(["Room 1"]);
    expect(desk.services.map((s) => [s.name, s.durationMinutes, s.therapistIds.length])).toEqual([
      ["Initial assessment", 45, 3],
      ["Follow-up", 30, 3],
    ]);
    const owner = await getBookingChoices(contextFor(practice, "owner"), {});
    expect(owner.sites.map((s) => s.today)).toEqual(["2026-12-01", "2026-12-01"]);
    expect(owner.therapists.find((t) => t.name === "Ana Ferreby")?.siteIds).toEqual([
      practice.sites.saltgate.id,
    ]);
    expect((await failureOf(getBookingChoices(contextFor(practice, "accounts"), {}))).code).toBe("forbidden");
  });
});
