import { appointmentMessagePayload } from "@withy/contracts/diary";
import { newId } from "@withy/core/ids";
import { appointments } from "@withy/db/schema";
import { bookAppointment } from "@withy/services/diary";
import { and, eq } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import { auditOf, messagesAbout } from "../../support/audit-rows";
import { contextFor } from "../../support/contexts";
import { addPatient } from "../../support/people";
import { buildPractice, type TestPractice } from "../../support/practice";
import type { TestPerson } from "../../support/practice-staff";
import { bookedVisit, claimsFor, failureOf, followUp, withKey } from "./booking-steps";

let practice: TestPractice;
let other: TestPractice;
let patientId: string;

beforeAll(async () => {
  practice = await buildPractice();
  other = await buildPractice({ name: "Cairn & Firth Clinics" });
  patientId = (await addPatient(practice)).id;
});

describe("booking a visit", () => {
  it("takes therapist and room, is audited and confirmed by e-mail", async () => {
    const desk = contextFor(practice, "receptionist");
    const view = await bookAppointment(
      desk,
      followUp(practice, patientId, "2026-12-02T10:15", { deskNote: " rings back " }),
    );
    expect(view).toMatchObject({
      state: "booked",
      version: 1,
      day: "2026-12-02",
      startTime: "10:15",
      endTime: "10:45",
      startsAt: "2026-12-02T10:15:00.000Z",
      room: { name: "Room 1" },
      deskNote: "rings back",
      next: ["confirmed", "cancelled"],
      undoTo: null,
      canMove: true,
      owesPence: 0,
    });
    expect(await claimsFor(practice, view.id)).toHaveLength(14);
    const [event, ...more] = await auditOf(practice, view.id);
    expect(more).toEqual([]);
    expect(event).toMatchObject({
      action: "appointment.booked",
      actorId: practice.staff.receptionist.id,
      patientId,
      siteId: practice.sites.saltgate.id,
    });
    const [message] = await messagesAbout(practice, view.id);
    expect(message).toMatchObject({ template: "booking-confirmed", state: "waiting", patientId });
    const payload = appointmentMessagePayload.parse(message?.payload);
    expect(payload).toMatchObject({
      version: 1,
      withWhom: "with Ana Ferreby, physiotherapist",
      phone: "+441632960101",
    });
    expect(payload.place).toBe("Saltgate, 2 Saltgate, Easterhaven, ZZ1 2AB");
  });

  it("sends nothing to a patient without an address", async () => {
    const quiet = await addPatient(practice, { email: null });
    const view = await bookAppointment(
      contextFor(practice, "receptionist"),
      followUp(practice, quiet.id, "2026-12-02T08:00"),
    );
    expect(await messagesAbout(practice, view.id)).toEqual([]);
  });

  it("writes down whoever has just walked in, and sends no invitation to what has begun", async () => {
    const desk = contextFor(practice, "receptionist");
    const view = await bookAppointment(desk, followUp(practice, patientId, "2026-12-01T08:45"));
    expect(view).toMatchObject({ startTime: "08:45", next: ["confirmed", "arrived", "cancelled", "noshow"] });
    expect(await messagesAbout(practice, view.id)).toEqual([]);
  });

  it("books once for one idempotency key", async () => {
    const desk = withKey(contextFor(practice, "receptionist"), newId());
    const input = followUp(practice, patientId, "2026-12-02T14:00");
    const [first, second] = [await bookAppointment(desk, input), await bookAppointment(desk, input)];
    expect(second.id).toBe(first.id);
    const rows = await practice.db
      .select()
      .from(appointments)
      .where(
        and(
          eq(appointments.practiceId, practice.practiceId),
          eq(appointments.startsAt, new Date("2026-12-02T14:00Z")),
        ),
      );
    expect(rows).toHaveLength(1);
  });

  it("takes the other room when the first is taken", async () => {
    await bookedVisit(practice, "2026-12-03T09:00");
    const { visit } = await bookedVisit(practice, "2026-12-03T09:10", {
      therapistId: practice.staff.owningTherapist.id,
    });
    expect(visit.room.name).toBe("Room 2");
  });
});

describe("a time that is taken", () => {
  it("says who has it and what is free next", async () => {
    const { visit } = await bookedVisit(practice, "2026-12-04T10:00");
    const failure = await failureOf(
      bookAppointment(
        contextFor(practice, "receptionist"),
        followUp(practice, patientId, "2026-12-04T10:30"),
      ),
    );
    expect(failure).toMatchObject({ code: "refused", kind: "slot-taken", fields: [{ field: "startsAt" }] });
    expect(failure.message).toBe(
      "The therapist is already booked for that time until 10:30am. Choose another time.",
    );
    expect(failure.detail).toMatchObject({
      takenBy: {
        appointmentId: visit.id,
        patientName: visit.patient.name,
        startTime: "10:00",
        endTime: "10:30",
      },
      nextFree: [{ startTime: "10:35" }, { startTime: "11:10" }, { startTime: "13:00" }],
    });
  });

  it("leaves nothing behind", async () => {
    const before = await practice.db
      .select()
      .from(appointments)
      .where(eq(appointments.practiceId, practice.practiceId));
    await failureOf(
      bookAppointment(
        contextFor(practice, "receptionist"),
        followUp(practice, patientId, "2026-12-04T10:30"),
      ),
    );
    const after = await practice.db
      .select()
      .from(appointments)
      .where(eq(appointments.practiceId, practice.practiceId));
    expect(after).toHaveLength(before.length);
  });

  it("goes to one of two who ask at once", async () => {
    const tries = await Promise.allSettled(
      [1, 2].map(() =>
        bookAppointment(
          contextFor(practice, "receptionist"),
          followUp(practice, patientId, "2026-12-07T10:00"),
        ),
      ),
    );
    expect(tries.filter((t) => t.status === "fulfilled")).toHaveLength(1);
    const lost = tries.find((t) => t.status === "rejected");
    expect(lost?.status === "rejected" && lost.reason).toMatchObject({ code: "refused", kind: "slot-taken" });
  });
});

describe("who may book", () => {
  it.each<[TestPerson, string]>([
    ["owner", "booked"],
    ["therapist", "booked"],
    ["receptionist", "booked"],
    ["tollhouseReceptionist", "not-found"],
    ["accounts", "forbidden"],
  ])("%s at Saltgate: %s", async (person, expected) => {
    const hour = { owner: "08:00", therapist: "08:40", receptionist: "09:20" }[person as string] ?? "10:00";
    const work = bookAppointment(
      contextFor(practice, person),
      followUp(practice, patientId, `2026-12-11T${hour}`),
    );
    if (expected === "booked") expect((await work).state).toBe("booked");
    else expect((await failureOf(work)).code).toBe(expected);
  });

  it("finds nothing of another practice", async () => {
    const theirs = await addPatient(other);
    const desk = contextFor(practice, "owner");
    const foreign: object[] = [
      { patientId: theirs.id },
      { siteId: other.sites.saltgate.id },
      { therapistId: other.staff.therapist.id },
      { serviceId: other.services.followUp.id },
      { roomId: other.rooms.saltgateRoom1.id },
      { episodeId: newId() },
    ];
    for (const change of foreign) {
      const failure = await failureOf(
        bookAppointment(desk, followUp(practice, patientId, "2026-12-14T10:00", change)),
      );
      expect(failure.code).toBe("not-found");
    }
  });
});
