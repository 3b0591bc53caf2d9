import { can } from "@withy/core/access/can";
import { appointments, diaryClaims } from "@withy/db/schema";
import { and, eq } from "drizzle-orm";
import { beforeAll, expect, test } from "vitest";
import { contextFor } from "../../support/contexts";
import { addAppointment } from "../../support/diary-rows";
import { addEpisode, addInsurance, addPatient } from "../../support/people";
import { buildPractice, type TestPractice } from "../../support/practice";

let practice: TestPractice;
beforeAll(async () => {
  practice = await buildPractice();
});

test("each person holds what their role allows, where they hold it", () => {
  const desk = contextFor(practice, "receptionist");
  expect(can(desk.roles, "diary.book", practice.sites.saltgate.id)).toBe(true);
  expect(can(desk.roles, "diary.book", practice.sites.tollhouse.id)).toBe(false);
  expect(can(contextFor(practice, "therapist").roles, "clinical.sign")).toBe(true);
  expect(can(contextFor(practice, "owner").roles, "clinical.read")).toBe(false);
});

test("a visit claims its therapist and its room for its length and the clean-down", async () => {
  const patient = await addPatient(practice);
  const visit = await addAppointment(practice, { patientId: patient.id, day: "2026-12-01", time: "10:00" });
  const claims = await practice.db
    .select()
    .from(diaryClaims)
    .where(and(eq(diaryClaims.practiceId, practice.practiceId), eq(diaryClaims.appointmentId, visit.id)));
  expect(claims).toHaveLength(14);
  const [row] = await practice.db.select().from(appointments).where(eq(appointments.id, visit.id));
  expect(row?.startsAt.toISOString()).toBe("2026-12-01T10:00:00.000Z");
});

test("the same time again is refused by the database", async () => {
  const patient = await addPatient(practice);
  const again = addAppointment(practice, { patientId: patient.id, day: "2026-12-01", time: "10:15" });
  await expect(again).rejects.toMatchObject({ errno: 1062 });
});

test("two practices stand side by side", async () => {
  const other = await buildPractice({ name: "Cairn & Firth Clinics" });
  const patient = await addPatient(other);
  await addInsurance(other, patient.id);
  await addEpisode(other, patient.id);
  const foreign = addEpisode(practice, patient.id);
  await expect(foreign).rejects.toMatchObject({ errno: 1452 });
});
