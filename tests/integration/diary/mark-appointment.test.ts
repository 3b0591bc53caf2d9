import { newId } from "@withy/core/ids";
import { invoiceLines, invoices, notes } from "@withy/db/schema";
import { getAppointment, markAppointment, undoMark } from "@withy/services/diary";
import { beforeEach, describe, expect, it } from "vitest";
import { auditOf } from "../../support/audit-rows";
import { contextFor } from "../../support/contexts";
import { addEpisode } from "../../support/people";
import { buildPractice, type TestPractice, testNow } from "../../support/practice";
import type { TestPerson } from "../../support/practice-staff";
import { bookedVisit, claimsFor, failureOf } from "./booking-steps";

let practice: TestPractice;

beforeEach(async () => {
  practice = await buildPractice();
  practice.clock.set(testNow);
});

type Mark = "confirmed" | "arrived" | "in-session" | "fulfilled" | "noshow";
const mark = (appointmentId: string, version: number, to: Mark, person: TestPerson = "receptionist") =>
  markAppointment(contextFor(practice, person), { appointmentId, version, to });
const undo = (appointmentId: string, version: number, person: TestPerson = "receptionist") =>
  undoMark(contextFor(practice, person), { appointmentId, version });

describe("marking a visit through its day", () => {
  it("notes when each state began, and goes back one step at a time", async () => {
    const { visit } = await bookedVisit(practice, "2026-12-01T10:00");
    await mark(visit.id, 1, "confirmed");
    practice.clock.set("2026-12-01T09:56:00Z");
    expect(await mark(visit.id, 2, "arrived")).toMatchObject({
      state: "arrived",
      arrivedAt: "2026-12-01T09:56:00.000Z",
      undoTo: "confirmed",
      canMove: false,
    });
    practice.clock.set("2026-12-01T10:02:00Z");
    await mark(visit.id, 3, "in-session", "therapist");
    practice.clock.set("2026-12-01T10:31:00Z");
    const seen = await mark(visit.id, 4, "fulfilled", "therapist");
    expect(seen).toMatchObject({
      sessionStartedAt: "2026-12-01T10:02:00.000Z",
      sessionEndedAt: "2026-12-01T10:31:00.000Z",
      next: [],
    });
    expect(await undo(visit.id, 5)).toMatchObject({
      state: "in-session",
      sessionEndedAt: null,
      undoTo: "arrived",
    });
    expect(await undo(visit.id, 6)).toMatchObject({
      state: "arrived",
      sessionStartedAt: null,
      undoTo: "confirmed",
    });
    expect(await undo(visit.id, 7)).toMatchObject({ state: "confirmed", arrivedAt: null, undoTo: "booked" });
    expect(await undo(visit.id, 8)).toMatchObject({ state: "booked", undoTo: null });
    expect((await failureOf(undo(visit.id, 9))).kind).toBe("wrong-state");
    const actions = (await auditOf(practice, visit.id)).map((e) => e.action.replace("appointment.", ""));
    expect(actions).toEqual([
      "booked",
      "marked",
      "marked",
      "marked",
      "marked",
      "undone",
      "undone",
      "undone",
      "undone",
    ]);
    expect(await claimsFor(practice, visit.id)).toHaveLength(14);
  });

  it("waits for the day, and for a missed visit for its start", async () => {
    const { visit } = await bookedVisit(practice, "2026-12-01T10:00");
    expect((await failureOf(mark(visit.id, 1, "noshow"))).kind).toBe("too-early");
    practice.clock.set("2026-12-01T10:20:00Z");
    expect(await mark(visit.id, 1, "noshow")).toMatchObject({
      state: "noshow",
      next: ["arrived"],
      undoTo: "booked",
    });
    const { visit: later } = await bookedVisit(practice, "2026-12-02T10:00");
    expect((await failureOf(mark(later.id, 1, "arrived"))).kind).toBe("too-early");
  });

  it("offers only what is possible, to those who may", async () => {
    const { visit } = await bookedVisit(practice, "2026-12-01T10:00");
    const see = (person: TestPerson) =>
      getAppointment(contextFor(practice, person), { appointmentId: visit.id });
    expect((await see("therapist")).next).toEqual(["confirmed", "arrived", "cancelled"]);
    expect((await see("therapist")).owesPence).toBeNull();
    expect((await see("owner")).owesPence).toBe(0);
    expect((await failureOf(see("accounts"))).code).toBe("forbidden");
    expect((await failureOf(see("tollhouseReceptionist"))).code).toBe("not-found");
    expect((await failureOf(mark(visit.id, 1, "arrived", "accounts"))).code).toBe("forbidden");
    expect((await failureOf(mark(visit.id, 1, "arrived", "tollhouseReceptionist"))).code).toBe("not-found");
    expect((await failureOf(undo(visit.id, 1, "accounts"))).code).toBe("forbidden");
    const other = await buildPractice({ name: "Cairn & Firth Clinics" });
    const foreign = { appointmentId: visit.id, version: 1 };
    expect(
      (await failureOf(getAppointment(contextFor(other, "owner"), { appointmentId: visit.id }))).code,
    ).toBe("not-found");
    expect(
      (await failureOf(markAppointment(contextFor(other, "owner"), { ...foreign, to: "arrived" }))).code,
    ).toBe("not-found");
    expect((await failureOf(undoMark(contextFor(other, "owner"), foreign))).code).toBe("not-found");
  });

  it("counts once when two mark it at the same moment", async () => {
    const { visit } = await bookedVisit(practice, "2026-12-01T10:00");
    const tries = await Promise.allSettled([
      mark(visit.id, 1, "arrived"),
      mark(visit.id, 1, "arrived", "therapist"),
    ]);
    expect(tries.filter((t) => t.status === "fulfilled")).toHaveLength(1);
    expect((await auditOf(practice, visit.id)).filter((e) => e.action === "appointment.marked")).toHaveLength(
      1,
    );
  });
});

describe("what depends on a mark keeps it", () => {
  async function attended() {
    const { patient, visit } = await bookedVisit(practice, "2026-12-01T10:00");
    await mark(visit.id, 1, "arrived");
    await mark(visit.id, 2, "fulfilled", "therapist");
    return { patient, visit };
  }

  it("a signed note", async () => {
    const { patient, visit } = await attended();
    const episode = await addEpisode(practice, patient.id);
    const now = practice.clock.now();
    const authorId = practice.staff.therapist.id;
    await practice.db.insert(notes).values({
      ...{ practiceId: practice.practiceId, id: newId(), episodeId: episode.id, patientId: patient.id },
      ...{ appointmentId: visit.id, authorId, kind: "session", state: "signed", body: {}, visitAt: now },
      ...{ createdAt: now, updatedAt: now, signedAt: now, signedBy: authorId },
    });
    expect(await failureOf(undo(visit.id, 3))).toMatchObject({
      kind: "depends",
      message: "This cannot be undone, because its note is signed. Put that right first.",
    });
    const view = await getAppointment(contextFor(practice, "therapist"), { appointmentId: visit.id });
    expect(view.undoTo).toBeNull();
  });

  it("a line on an invoice, and what is owed is shown to those who take it", async () => {
    const { patient, visit } = await attended();
    const now = practice.clock.now();
    const common = { practiceId: practice.practiceId, createdAt: now, updatedAt: now };
    const invoiceId = newId();
    await practice.db.insert(invoices).values({
      ...{ ...common, id: invoiceId, patientId: patient.id, siteId: practice.sites.saltgate.id },
      ...{
        billTo: { name: "x", addressLines: [], postcode: null, email: null },
        vatRounding: "line-nearest",
      },
      ...{ netPence: 5200, totalPence: 5200, createdBy: practice.staff.owner.id },
    });
    await practice.db.insert(invoiceLines).values({
      ...{
        practiceId: practice.practiceId,
        id: newId(),
        invoiceId,
        position: 1,
        kind: "visit",
        appointmentId: visit.id,
      },
      ...{ description: "Follow-up", unitPence: 5200, vatTreatment: "exempt", vatBasisPoints: 0 },
      ...{ netPence: 5200, vatPence: 0, totalPence: 5200 },
    });
    expect((await failureOf(undo(visit.id, 3))).kind).toBe("depends");
  });
});
