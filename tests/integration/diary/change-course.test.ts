import type { CourseView } from "@withy/contracts/diary";
import {
  bookAppointment,
  bookCourse,
  cancelAppointment,
  cancelCourse,
  extendCourse,
  getCourse,
  moveAppointment,
  previewExtension,
  shiftCourse,
  undoCancelCourse,
} from "@withy/services/diary";
import { beforeAll, describe, expect, it } from "vitest";
import { auditOf, messagesAbout } from "../../support/audit-rows";
import { contextFor } from "../../support/contexts";
import { addInsurance, addPatient } from "../../support/people";
import { buildPractice, type TestPractice } from "../../support/practice";
import { claimsFor, failureOf, followUp } from "./booking-steps";

let practice: TestPractice;

beforeAll(async () => {
  practice = await buildPractice();
});

const desk = () => contextFor(practice, "receptionist");

/** A course at a time of its own, so that no test meets another's visits. */
async function newCourse(firstDay: string, startTime: string, more: object = {}) {
  const patient = await addPatient(practice);
  const course = await bookCourse(desk(), {
    patientId: patient.id,
    serviceId: practice.services.followUp.id,
    therapistId: practice.staff.therapist.id,
    siteId: practice.sites.saltgate.id,
    ...{ firstDay, startTime, visits: 3, ...more },
  });
  return { patient, course };
}

const stands = (course: CourseView) => course.visits.map((v) => `${v.day} ${v.startTime} ${v.state}`);
const templates = async (id: string) => (await messagesAbout(practice, id)).map((m) => m.template);
const acts = async (id: string) => (await auditOf(practice, id)).map((e) => e.action);

describe("extending a course", () => {
  it("goes on after the last visit, and tells the patient of the new ones alone", async () => {
    const { course } = await newCourse("2027-01-05", "08:00");
    const proposal = await previewExtension(desk(), { courseId: course.id, visits: 2 });
    expect(proposal.visits.map((v) => `${v.day} ${v.state}`)).toEqual(["2027-01-26 free", "2027-02-02 free"]);
    const longer = await extendCourse(desk(), { courseId: course.id, version: 1, visits: 2 });
    expect(longer).toMatchObject({ version: 2, plannedVisits: 5 });
    expect(longer.visits.map((v) => v.day).slice(3)).toEqual(["2027-01-26", "2027-02-02"]);
    const messages = await messagesAbout(practice, course.id);
    expect(messages.at(-1)?.payload).toMatchObject({ visits: [{}, {}] });
    expect(await acts(course.id)).toEqual(["course.booked", "course.extended"]);
  });

  it("adds nothing where one of the new visits clashes or the payer's limit is reached", async () => {
    const { course, patient } = await newCourse("2027-01-05", "09:00");
    await bookAppointment(desk(), followUp(practice, patient.id, "2027-02-02T09:00"));
    const input = { courseId: course.id, version: 1, visits: 2 };
    expect(await failureOf(extendCourse(desk(), input))).toMatchObject({
      kind: "slot-taken",
      detail: { position: 2 },
    });
    expect(await getCourse(desk(), { courseId: course.id })).toEqual(course);
    await addInsurance(practice, patient.id, { sessionsAuthorised: 5 });
    expect(await failureOf(extendCourse(desk(), input))).toMatchObject({ kind: "not-authorised" });
  });
});

describe("shifting the rest", () => {
  it("moves every visit to come by a week, one into the place of the next, with one message", async () => {
    const { course } = await newCourse("2027-01-06", "08:00");
    const [first] = course.visits;
    const shifted = await shiftCourse(desk(), { courseId: course.id, version: 1, days: 7 });
    expect(stands(shifted)).toEqual([
      "2027-01-13 08:00 booked",
      "2027-01-20 08:00 booked",
      "2027-01-27 08:00 booked",
    ]);
    expect(shifted.visits[0]?.id).toBe(first?.id);
    for (const visit of shifted.visits) expect(await claimsFor(practice, visit.id)).toHaveLength(14);
    expect(await templates(course.id)).toEqual(["course-booked", "course-moved"]);
    const told = (await auditOf(practice, first?.id ?? "")).map((e) => e.action);
    expect(told).toEqual(["appointment.booked", "appointment.moved"]);
  });

  it("keeps the clock time over the change of the clocks", async () => {
    const { course } = await newCourse("2027-03-10", "09:00");
    const shifted = await shiftCourse(desk(), { courseId: course.id, version: 1, days: 14 });
    expect(shifted.visits.map((v) => v.startTime)).toEqual(["09:00", "09:00", "09:00"]);
    const slots = await claimsFor(practice, shifted.visits[1]?.id ?? "");
    expect(slots.map((c) => c.slotAt.toISOString()).sort()[0]).toBe("2027-03-31T08:00:00.000Z");
  });

  it("moves nothing where one of the new times is taken", async () => {
    const { course, patient } = await newCourse("2027-01-07", "10:00");
    await bookAppointment(desk(), followUp(practice, patient.id, "2027-01-22T10:00"));
    const failure = await failureOf(shiftCourse(desk(), { courseId: course.id, version: 1, days: 1 }));
    expect(failure).toMatchObject({ kind: "slot-taken", detail: { position: 3 } });
    expect(await getCourse(desk(), { courseId: course.id })).toEqual(course);
    for (const visit of course.visits) expect(await claimsFor(practice, visit.id)).toHaveLength(14);
    expect(await acts(course.id)).toEqual(["course.booked"]);
    expect(await templates(course.id)).toEqual(["course-booked"]);
  });

  it("leaves what is over where it was", async () => {
    const own = await buildPractice();
    const patient = await addPatient(own);
    const ctx = contextFor(own, "receptionist");
    const course = await bookCourse(ctx, {
      patientId: patient.id,
      serviceId: own.services.followUp.id,
      therapistId: own.staff.therapist.id,
      siteId: own.sites.saltgate.id,
      ...{ firstDay: "2026-12-02", startTime: "10:00", visits: 2 },
    });
    own.clock.set("2026-12-03T09:00:00Z");
    const shifted = await shiftCourse(ctx, { courseId: course.id, version: 1, days: 1 });
    expect(shifted.visits.map((v) => v.day)).toEqual(["2026-12-02", "2026-12-10"]);
  });
});

describe("cancelling the rest", () => {
  it("gives every time back for one reason with one message, and is undone as a whole", async () => {
    const { course, patient } = await newCourse("2027-02-09", "08:00");
    const input = { courseId: course.id, version: 1, by: "patient" as const, reason: "Moving away" };
    const cancelled = await cancelCourse(desk(), input);
    expect(cancelled.visits.map((v) => v.state)).toEqual(Array(3).fill("cancelled"));
    expect(cancelled.undoableVisits).toBe(3);
    for (const visit of course.visits) expect(await claimsFor(practice, visit.id)).toEqual([]);
    const back = await undoCancelCourse(desk(), { courseId: course.id, version: 2 });
    expect(back.lost).toEqual([]);
    expect(stands(back.course)).toEqual(stands(course));
    for (const visit of course.visits) expect(await claimsFor(practice, visit.id)).toHaveLength(14);
    expect(await acts(course.id)).toEqual(["course.booked", "course.cancelled", "course.restored"]);
    expect(await templates(course.id)).toEqual(["course-booked", "course-cancelled", "course-booked"]);
    expect(patient.id).toBe(back.course.patient.id);
  });

  it("brings back what is still free and names what is not", async () => {
    const { course, patient } = await newCourse("2027-02-09", "09:00");
    const input = { courseId: course.id, version: 1, by: "clinic" as const, reason: "Therapist moves" };
    await cancelCourse(desk(), input);
    await bookAppointment(desk(), followUp(practice, patient.id, "2027-02-16T09:10"));
    const back = await undoCancelCourse(desk(), { courseId: course.id, version: 2 });
    expect(back.course.visits.map((v) => v.state)).toEqual(["booked", "cancelled", "booked"]);
    expect(back.lost).toEqual([
      { day: "2027-02-16", startTime: "09:00", why: "someone else has its time now" },
    ]);
  });

  it("leaves a visit alone that was cancelled before by itself", async () => {
    const { course } = await newCourse("2027-02-09", "10:00");
    const [first] = course.visits;
    const one = { appointmentId: first?.id ?? "", version: 1, by: "patient" as const, reason: "Ill" };
    await cancelAppointment(desk(), one);
    practice.clock.advance(1);
    const input = { courseId: course.id, version: 1, by: "patient" as const, reason: "Better" };
    await cancelCourse(desk(), input);
    const back = await undoCancelCourse(desk(), { courseId: course.id, version: 2 });
    expect(back.course.visits.map((v) => v.state)).toEqual(["cancelled", "booked", "booked"]);
  });
});

describe("two desks and other people", () => {
  it("shows the second desk what the first one did", async () => {
    const { course } = await newCourse("2027-02-10", "08:00");
    await shiftCourse(desk(), { courseId: course.id, version: 1, days: 1 });
    const failure = await failureOf(shiftCourse(desk(), { courseId: course.id, version: 1, days: 1 }));
    expect(failure).toMatchObject({ code: "stale", detail: { current: { version: 2 } } });
  });

  it("lets one of two acts at once through", async () => {
    const { course } = await newCourse("2027-02-10", "09:00");
    const input = { courseId: course.id, version: 1 };
    const outcomes = await Promise.allSettled([
      shiftCourse(desk(), { ...input, days: 1 }),
      cancelCourse(desk(), { ...input, by: "clinic", reason: "Closed" }),
      extendCourse(desk(), { ...input, visits: 1 }),
    ]);
    expect(outcomes.filter((o) => o.status === "fulfilled")).toHaveLength(1);
    expect((await getCourse(desk(), { courseId: course.id })).version).toBe(2);
  });

  it("has nothing to do where no visit is still to come", async () => {
    const { course } = await newCourse("2027-02-10", "10:00");
    await cancelCourse(desk(), { courseId: course.id, version: 1, by: "clinic", reason: "Closed" });
    expect(await failureOf(shiftCourse(desk(), { courseId: course.id, version: 2, days: 1 }))).toMatchObject({
      kind: "no-rest",
    });
  });

  it("refuses a desk that does not reach the site of one of the visits", async () => {
    const { course } = await newCourse("2027-02-10", "11:00");
    const [, second] = course.visits;
    await moveAppointment(contextFor(practice, "owner"), {
      appointmentId: second?.id ?? "",
      version: 1,
      startsAt: "2027-02-17T11:00",
      siteId: practice.sites.tollhouse.id,
      therapistId: practice.staff.otherTherapist.id,
    });
    expect(await failureOf(shiftCourse(desk(), { courseId: course.id, version: 1, days: 1 }))).toMatchObject({
      code: "not-found",
    });
  });
});
