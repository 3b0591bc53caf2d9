import { newId } from "@withy/core/ids";
import { invoices, patientAlerts } from "@withy/db/schema";
import { cancelAppointment, listToday, markAppointment } from "@withy/services/diary";
import { beforeAll, describe, expect, it } from "vitest";
import { contextFor } from "../../support/contexts";
import { buildPractice, type TestPractice } from "../../support/practice";
import { bookedVisit, failureOf } from "./booking-steps";

let practice: TestPractice;
let other: TestPractice;

async function owe(patientId: string, reference: string, pence: number, paid = 0): Promise<void> {
  const now = practice.clock.now();
  const number = Number(reference.slice(3));
  await practice.db.insert(invoices).values({
    ...{
      practiceId: practice.practiceId,
      id: newId(),
      number,
      reference,
      state: paid > 0 ? "part-paid" : "issued",
    },
    ...{
      patientId,
      siteId: practice.sites.saltgate.id,
      vatRounding: "line-nearest",
      createdBy: practice.staff.owner.id,
    },
    ...{
      billTo: { name: "x", addressLines: [], postcode: null, email: null },
      issuedOn: "2026-11-24",
      dueOn: "2026-12-08",
    },
    ...{ netPence: pence, totalPence: pence, paidPence: paid, createdAt: now, updatedAt: now, issuedAt: now },
  });
}

beforeAll(async () => {
  practice = await buildPractice();
  other = await buildPractice({ name: "Cairn & Firth Clinics" });
});

describe("the desk's day", () => {
  it("tells arrivals, waiting times, money, gaps and what is done", async () => {
    const desk = contextFor(practice, "receptionist");
    const { patient, visit } = await bookedVisit(practice, "2026-12-01T10:00");
    const { visit: gone } = await bookedVisit(practice, "2026-12-01T11:00");
    const { visit: coming } = await bookedVisit(practice, "2026-12-01T15:00");
    await bookedVisit(practice, "2026-12-02T09:00");
    await owe(patient.id, "MP-00001", 5200, 1000);
    await owe(patient.id, "MP-00002", 2400);
    const alert = {
      practiceId: practice.practiceId,
      patientId: patient.id,
      createdAt: practice.clock.now(),
      createdBy: practice.staff.owner.id,
    };
    await practice.db.insert(patientAlerts).values([
      { ...alert, id: newId(), text: "Hard of hearing" },
      {
        ...alert,
        id: newId(),
        text: "Never shown here",
        isClinical: true,
        createdAt: new Date("2026-12-01T09:30Z"),
      },
    ]);
    await cancelAppointment(desk, {
      appointmentId: gone.id,
      version: 1,
      by: "patient",
      reason: "Has a cold",
    });
    practice.clock.set("2026-12-01T09:48:00Z");
    await markAppointment(desk, { appointmentId: visit.id, version: 1, to: "arrived" });
    practice.clock.set("2026-12-01T10:03:00Z");
    const today = await listToday(desk, {});
    expect(today.arrivals.map((a) => a.appointmentId)).toEqual([visit.id, coming.id]);
    expect(today.arrivals[0]).toMatchObject({
      ...{
        state: "arrived",
        startTime: "10:00",
        bornOn: "1971-05-14",
        nextMark: "in-session",
        waitingMinutes: 15,
      },
      ...{ remark: "Hard of hearing", owesPence: 6600, siteName: "Saltgate" },
    });
    expect(today.done.map((a) => [a.appointmentId, a.state])).toEqual([[gone.id, "cancelled"]]);
    expect(today.counts).toEqual({
      ...{
        toCome: 1,
        seen: 0,
        didNotAttend: 0,
        cancelled: 1,
        waiting: 1,
        longestWaitMinutes: 15,
        lastTime: "15:00",
      },
    });
    expect(today.toCollect).toMatchObject([
      { patientId: patient.id, owesPence: 6600, reference: "MP-00001", startTime: "10:00" },
    ]);
    expect(today.gaps.map((g) => [g.therapistName, g.startTime, g.minutes])).toEqual([
      ["Idris Vane", "10:05", 115],
      ["Ana Ferreby", "10:35", 85],
      ["Idris Vane", "13:00", 180],
      ["Ana Ferreby", "13:00", 120],
    ]);
  });

  it("shows no money to those who may not see it, and nothing of another desk or practice", async () => {
    const therapist = await listToday(contextFor(practice, "therapist"), {});
    expect(therapist.toCollect).toBeNull();
    expect(therapist.arrivals.every((a) => a.owesPence === null)).toBe(true);
    const { arrivals, done } = await listToday(contextFor(practice, "tollhouseReceptionist"), {});
    expect([...arrivals, ...done]).toEqual([]);
    const siteIds = practice.sites.saltgate.id;
    expect(
      (await failureOf(listToday(contextFor(practice, "tollhouseReceptionist"), { siteIds }))).code,
    ).toBe("not-found");
    expect((await failureOf(listToday(contextFor(other, "owner"), { siteIds }))).code).toBe("not-found");
    expect((await failureOf(listToday(contextFor(practice, "accounts"), {}))).code).toBe("forbidden");
  });
});
