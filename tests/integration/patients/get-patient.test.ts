import { newId } from "@withy/core/ids";
import { consents, patientAlerts } from "@withy/db/schema";
import { getPatient, whoLooked } from "@withy/services/patients";
import { beforeAll, expect, test } from "vitest";
import { auditOf } from "../../support/audit-rows";
import { contextFor } from "../../support/contexts";
import { addAppointment } from "../../support/diary-rows";
import { addEpisode, addInsurance, addPatient } from "../../support/people";
import { buildPractice, type TestPractice } from "../../support/practice";
import type { TestPerson } from "../../support/practice-staff";

let practice: TestPractice;
let patient: { id: string };

beforeAll(async () => {
  practice = await buildPractice();
  patient = await addPatient(practice, {
    givenName: "Eleri",
    familyName: "Tamworth",
    bornOn: "1963-12-02",
    phone: "+447700900731",
    communicationNeeds: "Reads with a magnifier",
  });
  await addInsurance(practice, patient.id);
  await addEpisode(practice, patient.id, { problem: "Left hip osteoarthritis" });
  await addAppointment(practice, { patientId: patient.id, day: "2026-12-08", time: "10:15" });
  await addAppointment(practice, {
    patientId: patient.id,
    day: "2026-12-04",
    time: "10:15",
    values: { state: "cancelled" },
  });
  const alert = (text: string, isClinical: boolean) => ({
    practiceId: practice.practiceId,
    id: newId(),
    patientId: patient.id,
    text,
    isClinical,
    createdAt: practice.clock.now(),
    createdBy: practice.staff.therapist.id,
  });
  await practice.db
    .insert(patientAlerts)
    .values([alert("Anticoagulant", true), alert("Ring, do not text", false)]);
  await practice.db.insert(consents).values({
    practiceId: practice.practiceId,
    id: newId(),
    patientId: patient.id,
    kind: "treatment",
    wordingVersion: "v4",
    givenAt: practice.clock.now(),
    recordedBy: practice.staff.therapist.id,
  });
});

const open = (person: TestPerson) => getPatient(contextFor(practice, person), { patientId: patient.id });

test("a therapist sees the whole record", async () => {
  const view = await open("therapist");
  expect(view).toMatchObject({
    name: "Eleri Tamworth",
    ageYears: 62,
    phone: "07700 900731",
    payer: { payerName: "Kittiwake Health", authorisationCode: "AUTH-88" },
    counts: { episodes: 1, measures: 0, letters: 0, invoices: null },
    lookedAtBy: null,
  });
  expect(view.care?.alerts.map((a) => a.text)).toEqual(["Anticoagulant", "Ring, do not text"]);
  expect(view.care?.consents).toEqual([{ kind: "treatment", wordingVersion: "v4", givenOn: "2026-12-01" }]);
  expect(view.care?.nextVisit).toMatchObject({
    day: "2026-12-08",
    time: "10:15",
    therapistName: "Ana Ferreby",
  });
  expect(view.clinical?.openEpisode?.problem).toBe("Left hip osteoarthritis");
});

test("no clinical word reaches the desk", async () => {
  const view = await open("receptionist");
  expect(view.clinical).toBeNull();
  expect(view.counts).toEqual({ episodes: null, measures: null, letters: null, invoices: 0 });
  expect(JSON.stringify(view)).not.toMatch(/anticoagulant|hip/i);
  expect(view.care?.alerts.map((a) => a.text)).toEqual(["Ring, do not text"]);
  expect(view.care?.communicationNeeds).toBe("Reads with a magnifier");
});

test("accounts see name, address and payer only", async () => {
  const view = await open("accounts");
  expect(view.care).toBeNull();
  expect(view.clinical).toBeNull();
  expect(view.payer?.policyNumber).toBe("KW-204417");
  expect(JSON.stringify(view)).not.toMatch(/magnifier|anticoagulant|hip/i);
});

test("a desk does not see the next visit at a site where it holds no role", async () => {
  expect((await open("tollhouseReceptionist")).care?.nextVisit).toBeNull();
});

test("each opening is written down, and the owner may ask who looked", async () => {
  const someone = await addPatient(practice);
  const patientId = someone.id;
  await getPatient(contextFor(practice, "therapist"), { patientId });
  await getPatient(contextFor(practice, "receptionist"), { patientId });
  expect((await auditOf(practice, patientId)).map((a) => a.actorId)).toEqual([
    practice.staff.therapist.id,
    practice.staff.receptionist.id,
  ]);
  const looks = await whoLooked(contextFor(practice, "owner"), { patientId });
  expect(looks.rows.map((row) => row.staffName)).toEqual(["Bea Lockyer", "Ana Ferreby"]);
  expect(looks.rows[0]).toMatchObject({ day: "2026-12-01", time: "09:00", action: "patient.read" });
  const view = await getPatient(contextFor(practice, "owner"), { patientId });
  expect(view.lookedAtBy).toBe(2);
  await expect(whoLooked(contextFor(practice, "receptionist"), { patientId })).rejects.toMatchObject({
    code: "forbidden",
  });
});

test("another practice's patient and a guessed id answer the same", async () => {
  const stranger = await buildPractice();
  const ctx = contextFor(stranger, "owningTherapist");
  for (const patientId of [patient.id, newId()]) {
    await expect(getPatient(ctx, { patientId })).rejects.toMatchObject({ code: "not-found" });
    await expect(whoLooked(ctx, { patientId })).rejects.toMatchObject({ code: "not-found" });
  }
  expect(await auditOf(stranger, patient.id)).toEqual([]);
});
