import { newId } from "@withy/core/ids";
import { absences, siteClosures } from "@withy/db/schema";
import { bookAppointment } from "@withy/services/diary";
import { beforeAll, describe, expect, it } from "vitest";
import { auditOf } from "../../support/audit-rows";
import { contextFor } from "../../support/contexts";
import { addPatient } from "../../support/people";
import { buildPractice, type TestPractice } from "../../support/practice";
import { failureOf, followUp } from "./booking-steps";

let practice: TestPractice;
let patientId: string;

beforeAll(async () => {
  practice = await buildPractice();
  patientId = (await addPatient(practice)).id;
});

describe("what is refused", () => {
  it.each<[string, string, object, string]>([
    ["off the grid", "2026-12-08T10:02", {}, "off-grid"],
    ["an odd length", "2026-12-08T10:00", { durationMinutes: 33 }, "odd-length"],
    ["the past", "2026-12-01T07:55", {}, "in-the-past"],
    ["a time that does not happen", "2027-03-28T01:30", {}, "clock-gap"],
    ["lunch", "2026-12-08T12:10", {}, "outside-hours"],
    ["a bank holiday", "2026-12-28T10:00", {}, "outside-hours"],
  ])("%s", async (_name, startsAt, more, kind) => {
    const failure = await failureOf(
      bookAppointment(contextFor(practice, "receptionist"), followUp(practice, patientId, startsAt, more)),
    );
    expect(failure).toMatchObject({ code: "refused", kind });
  });

  it("a room at another site, and one of another kind", async () => {
    const desk = contextFor(practice, "owner");
    const wrong = (roomId: string) =>
      failureOf(bookAppointment(desk, followUp(practice, patientId, "2026-12-08T10:00", { roomId })));
    expect((await wrong(practice.rooms.tollhouseRoom1.id)).kind).toBe("room-elsewhere");
    expect((await wrong(practice.rooms.saltgateGym.id)).kind).toBe("wrong-room");
  });

  it("someone who does not give the service", async () => {
    const failure = await failureOf(
      bookAppointment(
        contextFor(practice, "owner"),
        followUp(practice, patientId, "2026-12-08T10:00", { therapistId: practice.staff.owner.id }),
      ),
    );
    expect(failure.kind).toBe("wrong-therapist");
  });

  it("a closed day and leave, until a reason is given", async () => {
    const { practiceId, db } = practice;
    await db
      .insert(siteClosures)
      .values({ practiceId, siteId: practice.sites.saltgate.id, closedOn: "2026-12-09", reason: "Boiler" });
    const leave = {
      practiceId,
      id: newId(),
      staffMemberId: practice.staff.therapist.id,
      kind: "leave" as const,
      reason: "Annual leave",
    };
    await db.insert(absences).values({
      ...leave,
      startsAt: new Date("2026-12-10T00:00Z"),
      endsAt: new Date("2026-12-11T00:00Z"),
      createdBy: practice.staff.owner.id,
    });
    const desk = contextFor(practice, "receptionist");
    const at = (startsAt: string, more: object = {}) =>
      bookAppointment(desk, followUp(practice, patientId, startsAt, more));
    expect((await failureOf(at("2026-12-09T10:00"))).kind).toBe("outside-hours");
    expect(await failureOf(at("2026-12-10T10:00"))).toMatchObject({
      kind: "blocked",
      message: expect.stringContaining("Annual leave"),
    });
    const view = await at("2026-12-10T10:00", { overrideReason: "Ana comes in for this one" });
    expect(view.overrideReason).toBe("Ana comes in for this one");
    const [event] = await auditOf(practice, view.id);
    expect(event?.detail).toMatchObject({ outsideHours: true });
  });

  it("what is not filled in, field by field", async () => {
    const failure = await failureOf(
      bookAppointment(contextFor(practice, "receptionist"), {
        ...followUp(practice, "", "soon"),
        durationMinutes: 0,
      }),
    );
    expect(failure.code).toBe("invalid");
    expect(failure.fields.map((f) => f.field).sort()).toEqual(["durationMinutes", "patientId", "startsAt"]);
  });
});
