import { courseMessagePayload } from "@withy/contracts/diary";
import { appointments, courses } from "@withy/db/schema";
import { bookAppointment, bookCourse, getCourse, listCourses, previewCourse } from "@withy/services/diary";
import { and, eq } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import { auditOf, messagesAbout } from "../../support/audit-rows";
import { contextFor } from "../../support/contexts";
import { addInsurance, addPatient } from "../../support/people";
import { buildPractice, type TestPractice } from "../../support/practice";
import { claimsFor, failureOf, followUp, withKey } from "./booking-steps";

let practice: TestPractice;
let other: TestPractice;

beforeAll(async () => {
  practice = await buildPractice();
  other = await buildPractice({ name: "Cairn & Firth Clinics" });
});

const desk = () => contextFor(practice, "receptionist");

function course(patientId: string, firstDay: string, startTime: string, more: object = {}) {
  return {
    patientId,
    serviceId: practice.services.followUp.id,
    therapistId: practice.staff.therapist.id,
    siteId: practice.sites.saltgate.id,
    ...{ firstDay, startTime, visits: 4, ...more },
  };
}

const visitsOf = (patientId: string) =>
  practice.db
    .select()
    .from(appointments)
    .where(and(eq(appointments.practiceId, practice.practiceId), eq(appointments.patientId, patientId)));

const coursesOf = (patientId: string) =>
  practice.db
    .select()
    .from(courses)
    .where(and(eq(courses.practiceId, practice.practiceId), eq(courses.patientId, patientId)));

describe("booking a course", () => {
  it("books every visit, holds its time, and tells the patient once", async () => {
    const patient = await addPatient(practice);
    const booked = await bookCourse(desk(), course(patient.id, "2026-12-02", "08:00"));
    expect(booked.visits.map((v) => `${v.day} ${v.startTime} ${v.state} ${v.isRest}`)).toEqual([
      "2026-12-02 08:00 booked true",
      "2026-12-09 08:00 booked true",
      "2026-12-16 08:00 booked true",
      "2026-12-23 08:00 booked true",
    ]);
    for (const visit of booked.visits) {
      expect(await claimsFor(practice, visit.id)).toHaveLength(14);
      expect((await auditOf(practice, visit.id)).map((e) => e.action)).toEqual(["appointment.booked"]);
      expect(await messagesAbout(practice, visit.id)).toEqual([]);
    }
    expect(await auditOf(practice, booked.id)).toMatchObject([
      { action: "course.booked", detail: { visits: 4 } },
    ]);
    const messages = await messagesAbout(practice, booked.id);
    expect(messages.map((m) => m.template)).toEqual(["course-booked"]);
    const told = courseMessagePayload.parse(messages[0]?.payload);
    expect(told.visits.map((v) => v.startsAt.slice(0, 16))).toEqual([
      "2026-12-02T08:00",
      "2026-12-09T08:00",
      "2026-12-16T08:00",
      "2026-12-23T08:00",
    ]);
    expect(await listCourses(desk(), { patientId: patient.id })).toMatchObject([
      { id: booked.id, plannedVisits: 4, restVisits: 4, firstDay: "2026-12-02", lastDay: "2026-12-23" },
    ]);
  });

  it("keeps the clock time over both changes of the clocks", async () => {
    const patient = await addPatient(practice);
    const spring = await bookCourse(desk(), course(patient.id, "2027-03-23", "09:00", { visits: 2 }));
    const autumn = await bookCourse(desk(), course(patient.id, "2027-10-26", "09:00", { visits: 2 }));
    expect([...spring.visits, ...autumn.visits].map((v) => v.startTime)).toEqual(Array(4).fill("09:00"));
    const starts = (await visitsOf(patient.id)).map((v) => v.startsAt.toISOString()).sort();
    expect(starts).toEqual([
      "2027-03-23T09:00:00.000Z",
      "2027-03-30T08:00:00.000Z",
      "2027-10-26T08:00:00.000Z",
      "2027-11-02T09:00:00.000Z",
    ]);
  });

  it("goes by weekdays from the first of them on", async () => {
    const patient = await addPatient(practice);
    const booked = await bookCourse(desk(), course(patient.id, "2026-12-02", "14:00", { weekdays: [2, 4] }));
    expect(booked.rhythm).toEqual({ kind: "weekdays", weekdays: [2, 4] });
    expect(booked.visits.map((v) => v.day)).toEqual(["2026-12-03", "2026-12-08", "2026-12-10", "2026-12-15"]);
  });

  it("books nothing where one visit is taken, and says which and what is free next", async () => {
    const patient = await addPatient(practice);
    await bookAppointment(desk(), followUp(practice, patient.id, "2026-12-18T09:10"));
    const late = await addPatient(practice);
    const failure = await failureOf(bookCourse(desk(), course(late.id, "2026-12-04", "09:00")));
    expect(failure).toMatchObject({ code: "refused", kind: "slot-taken", detail: { position: 3 } });
    expect(failure.message).toMatch(/^Visit 3, Fri 18 Dec 09:00: .* Nothing was changed\.$/);
    expect(failure.detail.nextFree).toMatchObject([{ day: "2026-12-18", startTime: "09:45" }, {}, {}]);
    expect(await visitsOf(late.id)).toEqual([]);
    expect(await coursesOf(late.id)).toEqual([]);
  });

  it("takes another time for one visit where the desk chose it", async () => {
    const patient = await addPatient(practice);
    const change = { position: 3, startsAt: "2026-12-18T10:00" };
    const booked = await bookCourse(
      desk(),
      course(patient.id, "2026-12-04", "09:00", { visits: 3, changes: [change] }),
    );
    expect(booked.visits.map((v) => `${v.day} ${v.startTime}`)).toEqual([
      "2026-12-04 09:00",
      "2026-12-11 09:00",
      "2026-12-18 10:00",
    ]);
  });

  it("books once when the desk presses twice", async () => {
    const patient = await addPatient(practice);
    const ctx = withKey(desk(), "course-pressed-twice");
    const input = course(patient.id, "2026-12-07", "08:00", { visits: 3 });
    const [a, b] = [await bookCourse(ctx, input), await bookCourse(ctx, input)];
    expect(b.id).toBe(a.id);
    expect(await visitsOf(patient.id)).toHaveLength(3);
  });

  it("lets one desk win a race for one of the times, and the other book nothing at all", async () => {
    const rivals = await Promise.all(Array.from({ length: 8 }, () => addPatient(practice)));
    // Each course meets the others on one day alone.
    const tries = rivals.map((patient, n) =>
      bookCourse(
        desk(),
        course(patient.id, `2027-02-0${(n % 5) + 1}`, "11:00", {
          visits: 2,
          changes: [
            { position: 1, startsAt: `2027-02-0${(n % 5) + 1}T${n < 5 ? "08" : "09"}:00` },
            { position: 2, startsAt: "2027-02-19T11:00" },
          ],
        }),
      ),
    );
    const outcomes = await Promise.allSettled(tries);
    expect(outcomes.filter((o) => o.status === "fulfilled")).toHaveLength(1);
    for (const [n, outcome] of outcomes.entries()) {
      const kept = await visitsOf(rivals[n]?.id ?? "");
      expect(kept).toHaveLength(outcome.status === "fulfilled" ? 2 : 0);
      if (outcome.status === "rejected")
        expect(outcome.reason).toMatchObject({ kind: "slot-taken", detail: { position: 2 } });
    }
  });
});

describe("what the payer has authorised", () => {
  it("is the most that a course may take, with what is booked already counted", async () => {
    const patient = await addPatient(practice);
    await addInsurance(practice, patient.id, { sessionsAuthorised: 5 });
    await bookAppointment(desk(), followUp(practice, patient.id, "2026-12-07T14:00"));
    const wish = course(patient.id, "2026-12-08", "08:00", { visits: 5 });
    const preview = await previewCourse(desk(), wish);
    expect(preview).toMatchObject({ limit: { authorised: 5, used: 1, left: 4 } });
    const failure = await failureOf(bookCourse(desk(), wish));
    expect(failure).toMatchObject({ kind: "not-authorised", message: preview.refusal });
    expect(failure.message).toContain("Book 4 visits or fewer");
    expect(await visitsOf(patient.id)).toHaveLength(1);
    await bookCourse(desk(), { ...wish, visits: 4 });
    expect(await visitsOf(patient.id)).toHaveLength(5);
  });

  it("cannot be used twice by two desks at once", async () => {
    const patient = await addPatient(practice);
    await addInsurance(practice, patient.id, { sessionsAuthorised: 4 });
    const outcomes = await Promise.allSettled(
      ["12:55", "15:00"].map((time) =>
        bookCourse(desk(), course(patient.id, "2027-01-11", time, { visits: 3 })),
      ),
    );
    expect(outcomes.filter((o) => o.status === "fulfilled").length).toBeLessThanOrEqual(1);
    expect((await visitsOf(patient.id)).length).toBeLessThanOrEqual(4);
  });
});

describe("the look beforehand", () => {
  it("says of each visit whether it is free, and gives three others where it is not", async () => {
    const patient = await addPatient(practice);
    await bookAppointment(desk(), followUp(practice, patient.id, "2027-03-09T10:00"));
    const { visits } = await previewCourse(
      desk(),
      course(patient.id, "2027-03-02", "10:00", { visits: 5, everyDays: 7 }),
    );
    expect(visits.map((v) => `${v.day} ${v.state} ${v.alternatives.length}`)).toEqual([
      "2027-03-02 free 0",
      "2027-03-09 taken 3",
      "2027-03-16 free 0",
      "2027-03-23 free 0",
      "2027-03-30 free 0",
    ]);
    expect(visits[1]?.alternatives[0]).toMatchObject({ day: "2027-03-09", startTime: "10:35" });
    expect(await visitsOf(patient.id)).toHaveLength(1);
  });

  it("says why a closed day and a time that the clocks jump over are out", async () => {
    const patient = await addPatient(practice);
    const owner = contextFor(practice, "owner");
    // Good Friday, and the night of the change.
    const easter = await previewCourse(owner, course(patient.id, "2027-03-26", "10:00", { visits: 1 }));
    expect(easter.visits[0]).toMatchObject({ state: "refused" });
    expect(easter.visits[0]?.alternatives).toHaveLength(3);
    const night = await previewCourse(owner, course(patient.id, "2027-03-28", "01:30", { visits: 1 }));
    expect(night.visits[0]?.why).toContain("does not happen");
  });

  it("never proposes a time that another visit of the course needs", async () => {
    const patient = await addPatient(practice);
    await bookAppointment(desk(), followUp(practice, patient.id, "2027-04-06T15:25"));
    const { visits } = await previewCourse(
      desk(),
      course(patient.id, "2027-04-06", "15:25", { visits: 3, everyDays: 1 }),
    );
    expect(visits[0]?.state).toBe("taken");
    const others = visits.slice(1).map((v) => `${v.day} ${v.startTime}`);
    for (const free of visits[0]?.alternatives ?? [])
      expect(others).not.toContain(`${free.day} ${free.startTime}`);
  });
});

describe("who may", () => {
  it("refuses a desk of another site, and another practice", async () => {
    const patient = await addPatient(practice);
    const wish = course(patient.id, "2027-05-04", "10:00");
    const elsewhere = contextFor(practice, "tollhouseReceptionist");
    expect(await failureOf(bookCourse(elsewhere, wish))).toMatchObject({ code: "not-found" });
    const booked = await bookCourse(desk(), wish);
    expect(await failureOf(getCourse(elsewhere, { courseId: booked.id }))).toMatchObject({
      code: "not-found",
    });
    const foreign = contextFor(other, "owner");
    expect(await failureOf(getCourse(foreign, { courseId: booked.id }))).toMatchObject({ code: "not-found" });
    expect(await failureOf(bookCourse(contextFor(practice, "accounts"), wish))).toMatchObject({
      code: "forbidden",
    });
  });
});
