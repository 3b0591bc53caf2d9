import { newId } from "@withy/core/ids";
import { consents, outboxMessages, type patients } from "@withy/db/schema";
import {
  bookAppointment,
  cancelAppointment,
  changeDiarySettings,
  markAppointment,
  moveAppointment,
  sendDueReminders,
  undoCancel,
} from "@withy/services/diary";
import { drainOutbox } from "@withy/services/messaging";
import { and, eq } from "drizzle-orm";
import { beforeEach, describe, expect, it } from "vitest";
import { contextFor, systemContextFor } from "../../support/contexts";
import { addAppointment } from "../../support/diary-rows";
import { addPatient } from "../../support/people";
import { buildPractice, type TestPractice } from "../../support/practice";
import { officeWith, recordingMail } from "../messaging/outbox-support";

let practice: TestPractice;
beforeEach(async () => {
  practice = await buildPractice();
});

const desk = () => contextFor(practice, "receptionist");
const round = () => sendDueReminders(systemContextFor(practice));

const remindersOf = (visitId: string) =>
  practice.db
    .select()
    .from(outboxMessages)
    .where(
      and(
        eq(outboxMessages.practiceId, practice.practiceId),
        eq(outboxMessages.aboutId, visitId),
        eq(outboxMessages.template, "visit-reminder"),
      ),
    );

/** Tuesday 8 December at ten, booked a week before. */
async function bookedVisit(values: Partial<typeof patients.$inferInsert> = {}) {
  const patient = await addPatient(practice, values);
  return addAppointment(practice, { patientId: patient.id, day: "2026-12-08", time: "10:00" });
}

/** What the patient of a visit was sent as reminders, after all that waits has gone out. */
async function sentTo(visitId: string) {
  const mail = recordingMail();
  while ((await drainOutbox(systemContextFor(practice), { ...officeWith(mail), batch: 100 })) > 0);
  const ids = new Set((await remindersOf(visitId)).map((row) => row.id));
  return mail.sent.filter((one) => ids.has(one.id));
}

describe("a reminder", () => {
  it("goes out two days and one day before, each once, with the calendar file", async () => {
    const visit = await bookedVisit();
    practice.clock.set("2026-12-06T09:59:00Z");
    await round();
    expect(await remindersOf(visit.id)).toEqual([]);
    practice.clock.set("2026-12-06T10:00:00Z");
    await Promise.all([round(), round(), round()]);
    await round();
    const [first] = await sentTo(visit.id);
    expect(first?.subject).toBe("Reminder: your appointment on Tuesday 8 December 2026 at 10am");
    expect(first?.calendar).toMatchObject({ method: "REQUEST" });
    expect(first?.text).not.toContain("Follow-up");
    practice.clock.set("2026-12-07T10:00:00Z");
    await round();
    expect(await sentTo(visit.id)).toHaveLength(1);
    practice.clock.set("2026-12-08T10:00:00Z");
    await round();
    expect(await remindersOf(visit.id)).toHaveLength(2);
  });

  it("is not sent twice because the visit was confirmed between", async () => {
    const visit = await bookedVisit();
    practice.clock.set("2026-12-06T10:00:00Z");
    await round();
    await markAppointment(desk(), { appointmentId: visit.id, version: 1, to: "confirmed" });
    await round();
    expect(await remindersOf(visit.id)).toHaveLength(1);
    expect(await sentTo(visit.id)).toHaveLength(1);
  });

  it("follows the hours that the practice has set", async () => {
    await changeDiarySettings(contextFor(practice, "owner"), {
      reminderHours: [3],
      hasNamesInFeed: false,
      version: 0,
    });
    const visit = await bookedVisit();
    practice.clock.set("2026-12-07T12:00:00Z");
    await round();
    expect(await remindersOf(visit.id)).toEqual([]);
    practice.clock.set("2026-12-08T07:00:00Z");
    await round();
    expect(await remindersOf(visit.id)).toHaveLength(1);
  });

  it.each<[string, Partial<typeof patients.$inferInsert>]>([
    ["prefers the telephone", { preferredChannel: "phone" }],
    ["prefers texts", { preferredChannel: "text" }],
    ["prefers post", { preferredChannel: "post" }],
    ["has no address", { email: null }],
  ])("does not go to a patient who %s", async (_, values) => {
    const visit = await bookedVisit(values);
    practice.clock.set("2026-12-07T12:00:00Z");
    await round();
    expect(await remindersOf(visit.id)).toEqual([]);
  });

  it("does not go where the consent to e-mail is withdrawn, before it is written or after", async () => {
    const [before, after] = [await bookedVisit(), await addLater()];
    await withdraw(before.patientId);
    practice.clock.set("2026-12-07T12:00:00Z");
    await round();
    expect(await remindersOf(before.id)).toEqual([]);
    await withdraw(after.patientId);
    expect(await sentTo(after.id)).toEqual([]);
    expect(await remindersOf(after.id)).toMatchObject([{ state: "dropped" }]);
  });

  const addLater = async () => {
    const patient = await addPatient(practice);
    return addAppointment(practice, { patientId: patient.id, day: "2026-12-08", time: "11:00" });
  };

  const withdraw = (patientId: string) =>
    practice.db.insert(consents).values({
      practiceId: practice.practiceId,
      id: newId(),
      patientId,
      kind: "email",
      wordingVersion: "1",
      givenAt: new Date("2026-11-01T09:00:00Z"),
      recordedBy: practice.staff.receptionist.id,
      withdrawnAt: practice.clock.now(),
    });
});

describe("a visit that changes", () => {
  const due = "2026-12-07T12:00:00Z";

  it("is not reminded of once cancelled, also where the reminder waits already", async () => {
    const visit = await bookedVisit();
    practice.clock.set(due);
    await round();
    await cancelAppointment(desk(), {
      appointmentId: visit.id,
      version: 1,
      by: "patient",
      reason: "Away",
    });
    await round();
    expect(await sentTo(visit.id)).toEqual([]);
    expect(await remindersOf(visit.id)).toMatchObject([{ state: "dropped", lastError: "superseded" }]);
  });

  it("is not reminded of where it was moved inside the window; at its new time it is", async () => {
    const visit = await bookedVisit();
    practice.clock.set("2026-12-07T11:00:00Z");
    const move = (startsAt: string, version: number) =>
      moveAppointment(desk(), { appointmentId: visit.id, version, startsAt, overrideReason: null });
    await move("2026-12-08T14:00", 1);
    practice.clock.set("2026-12-07T15:00:00Z");
    await round();
    // A day before the new time is 14:00, and it was moved at 11:00: that reminder is due, the earlier one is not.
    expect((await remindersOf(visit.id)).map((row) => row.dedupeKey.split("/").at(-1))).toEqual(["24"]);
    await move("2026-12-08T15:30", 2);
    practice.clock.set("2026-12-07T16:00:00Z");
    await move("2026-12-08T09:00", 3);
    await round();
    expect(await sentTo(visit.id)).toEqual([]);
    expect(await remindersOf(visit.id)).toMatchObject([{ state: "dropped" }]);
  });

  it("is not reminded of where it is brought back from a cancellation inside the window", async () => {
    const visit = await bookedVisit();
    practice.clock.set(due);
    const gone = await cancelAppointment(desk(), {
      appointmentId: visit.id,
      version: 1,
      by: "clinic",
      reason: "A mistake",
    });
    await undoCancel(desk(), { appointmentId: visit.id, version: gone.version });
    await round();
    expect(await remindersOf(visit.id)).toEqual([]);
  });

  it("is not reminded of once the patient has come or the visit has begun", async () => {
    const visit = await bookedVisit();
    practice.clock.set(due);
    await round();
    practice.clock.set("2026-12-08T09:50:00Z");
    await markAppointment(desk(), { appointmentId: visit.id, version: 1, to: "arrived" });
    expect(await sentTo(visit.id)).toEqual([]);

    const other = await addAppointment(practice, {
      patientId: (await addPatient(practice)).id,
      day: "2026-12-08",
      time: "13:00",
      values: { createdAt: new Date("2026-12-01T09:00:00Z") },
    });
    await round();
    practice.clock.set("2026-12-08T13:00:00Z");
    expect(await sentTo(other.id)).toEqual([]);
  });

  it("is not reminded of where it was booked inside the window", async () => {
    practice.clock.set(due);
    const patient = await addPatient(practice);
    const visit = await bookAppointment(desk(), {
      patientId: patient.id,
      serviceId: practice.services.followUp.id,
      therapistId: practice.staff.therapist.id,
      siteId: practice.sites.saltgate.id,
      startsAt: "2026-12-08T11:00",
    });
    await round();
    expect(await remindersOf(visit.id)).toEqual([]);
  });
});

it("finds what is due by the index on state and start, so that history costs nothing", async () => {
  const [plan] = (await practice.db.execute(
    `explain select a.id from appointments a where a.practice_id = '${practice.practiceId}'
      and a.state in ('booked', 'confirmed') and a.starts_at > '2026-12-07' and a.starts_at <= '2026-12-09'`,
  )) as unknown as [{ possible_keys: string }[]];
  expect(plan[0]?.possible_keys).toContain("appointments_by_state");
});
