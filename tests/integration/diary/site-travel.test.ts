import { rooms, services, siteTravel } from "@withy/db/schema";
import { bookAppointment, findTimes } from "@withy/services/diary";
import { and, eq } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import { contextFor } from "../../support/contexts";
import { addAppointment } from "../../support/diary-rows";
import { addPatient } from "../../support/people";
import { buildPractice, type TestPractice } from "../../support/practice";
import { failureOf, followUp } from "./booking-steps";

let practice: TestPractice;
let patientId: string;

/** The therapist gives a visit at Tollhouse Lane from 10:00 to 10:35; 20 minutes there, 30 back. */
beforeAll(async () => {
  practice = await buildPractice();
  patientId = (await addPatient(practice)).id;
  const { practiceId, sites } = practice;
  await practice.db.insert(siteTravel).values([
    { practiceId, fromSiteId: sites.saltgate.id, toSiteId: sites.tollhouse.id, minutes: 20 },
    { practiceId, fromSiteId: sites.tollhouse.id, toSiteId: sites.saltgate.id, minutes: 30 },
  ]);
  await addAppointment(practice, {
    ...{ patientId, day: "2026-12-02", time: "10:00", minutes: 30 },
    values: { siteId: sites.tollhouse.id, roomId: practice.rooms.tollhouseRoom1.id, cleanDownMinutes: 5 },
  });
});

const book = (time: string, more: object = {}) =>
  bookAppointment(
    contextFor(practice, "receptionist"),
    followUp(practice, patientId, `2026-12-02T${time}`, more),
  );

describe("two sites on one day", () => {
  it("refuses in words a booking that leaves too little way, before and after", async () => {
    expect(await failureOf(book("11:00"))).toMatchObject({
      kind: "too-far-apart",
      message: expect.stringContaining(
        "is at Tollhouse Lane until 10:35, and the way to Saltgate takes 30 minutes. Choose 11:05 or later",
      ),
    });
    expect((await failureOf(book("09:10"))).kind).toBe("too-far-apart");
  });

  it("books what leaves just enough, and anything with a reason", async () => {
    expect((await book("09:05")).startTime).toBe("09:05");
    expect((await book("10:55", { overrideReason: "Has the car today" })).startTime).toBe("10:55");
  });

  it("is kept to when finding a time", async () => {
    const own = await buildPractice();
    const patient = await addPatient(own);
    const { practiceId, sites } = own;
    await own.db.insert(siteTravel).values([
      { practiceId, fromSiteId: sites.saltgate.id, toSiteId: sites.tollhouse.id, minutes: 20 },
      { practiceId, fromSiteId: sites.tollhouse.id, toSiteId: sites.saltgate.id, minutes: 30 },
    ]);
    await addAppointment(own, {
      ...{ patientId: patient.id, day: "2026-12-02", time: "10:00", minutes: 30 },
      values: { siteId: sites.tollhouse.id, roomId: own.rooms.tollhouseRoom1.id },
    });
    // The desk at Saltgate does not see Tollhouse Lane, and still is not offered what cannot be reached.
    for (const person of ["owner", "receptionist"] as const) {
      const { times } = await findTimes(contextFor(own, person), {
        ...{ serviceId: own.services.followUp.id, therapistIds: own.staff.therapist.id },
        ...{ earliestOn: "2026-12-02", latestOn: "2026-12-02", limit: 30 },
      });
      const starts = times.filter((t) => t.therapist.id === own.staff.therapist.id && t.day === "2026-12-02");
      expect(starts.length).toBeGreaterThan(0);
      expect(starts.every((t) => t.endTime <= "09:35" || t.startTime >= "11:00")).toBe(true);
    }
  });
});

describe("what a room must be", () => {
  it("keeps to equipment and to rooms without a step, in finding and in booking", async () => {
    const own = await buildPractice();
    const patient = await addPatient(own);
    const owner = contextFor(own, "owner");
    const ask = (more: object = {}) =>
      findTimes(owner, { serviceId: own.services.followUp.id, patientId: patient.id, ...more });
    const none = (await ask({ needsStepFree: "true" })).none;
    expect(none).toMatchObject({ kind: "wishes", relax: { wish: "needs" } });
    const only = own.rooms.saltgateRoom2.id;
    const isOnly = and(eq(rooms.practiceId, own.practiceId), eq(rooms.id, only));
    await own.db
      .update(rooms)
      .set({ isStepFree: true, equipment: ["parallel-bars"] })
      .where(isOnly);
    const found = await ask({ needsStepFree: "true", equipment: ["parallel-bars"] });
    expect(found.times.length).toBeGreaterThan(0);
    expect(found.times.every((t) => t.room.id === only)).toBe(true);
    const input = followUp(own, patient.id, "2026-12-03T09:00", { needsStepFree: true });
    expect((await bookAppointment(owner, input)).room.id).toBe(only);
    const wrong = followUp(own, patient.id, "2026-12-03T10:00", {
      ...{ needsStepFree: true, roomId: own.rooms.saltgateRoom1.id },
    });
    expect(await failureOf(bookAppointment(owner, wrong))).toMatchObject({
      kind: "wrong-room",
      message: "Room 1 is not reached without a step. Choose another room.",
    });
    const isFollowUp = and(
      eq(services.practiceId, own.practiceId),
      eq(services.id, own.services.followUp.id),
    );
    await own.db
      .update(services)
      .set({ needsEquipment: ["traction"] })
      .where(isFollowUp);
    expect((await ask()).none?.kind).toBe("no-room");
    expect(
      (await failureOf(bookAppointment(owner, followUp(own, patient.id, "2026-12-03T11:00")))).message,
    ).toBe(
      "Saltgate has no room of the kind that this service needs with a traction table. Choose another site.",
    );
  });

  it("takes exact windows, and says what giving them up would bring", async () => {
    const own = await buildPractice();
    const ask = (windows: string[]) =>
      findTimes(contextFor(own, "owner"), { serviceId: own.services.followUp.id, windows });
    const found = await ask(["2026-12-03T10:00/11:00", "2026-12-04T14:00/15:00"]);
    const fitting = found.times.filter((t) => t.meetsEveryWish);
    expect(new Set(fitting.map((t) => t.day))).toEqual(new Set(["2026-12-03", "2026-12-04"]));
    expect(
      fitting.every((t) =>
        t.day === "2026-12-03"
          ? t.startTime >= "10:00" && t.endTime <= "11:00"
          : t.startTime >= "14:00" && t.endTime <= "15:00",
      ),
    ).toBe(true);
    expect((await ask(["2026-12-06T10:00/11:00"])).none?.relax?.wish).toBe("windows");
    expect((await failureOf(ask(["2026-12-03T11:00/10:00"]))).code).toBe("invalid");
    expect((await failureOf(ask(["tomorrow"]))).code).toBe("invalid");
  });
});
