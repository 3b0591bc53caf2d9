import type { EditPatientInput, PatientView } from "@withy/contracts/patients";
import { newId } from "@withy/core/ids";
import { patientPayers } from "@withy/db/schema";
import { editPatient, getPatient, listPatients } from "@withy/services/patients";
import { and, eq } from "drizzle-orm";
import { beforeAll, expect, test } from "vitest";
import { auditOf } from "../../support/audit-rows";
import { contextFor } from "../../support/contexts";
import { addInsurance, addPatient } from "../../support/people";
import { buildPractice, type TestPractice } from "../../support/practice";

let practice: TestPractice;
beforeAll(async () => {
  practice = await buildPractice();
});

const desk = () => contextFor(practice, "receptionist");

/** The form as it is filled when the record is opened. */
function formOf(view: PatientView, values: Partial<EditPatientInput> = {}): EditPatientInput {
  return {
    patientId: view.id,
    version: view.version,
    givenName: view.givenName,
    familyName: view.familyName,
    preferredName: view.preferredName,
    bornOn: view.bornOn,
    sex: view.care?.sex ?? null,
    phone: view.phone,
    email: view.email,
    addressLines: [...view.addressLines],
    postcode: view.postcode,
    nhsNumber: view.care?.nhsNumber ?? null,
    gpPracticeId: view.care?.gpPractice?.id ?? null,
    gpName: view.care?.gpName ?? null,
    communicationNeeds: view.care?.communicationNeeds ?? null,
    preferredChannel: view.preferredChannel,
    nextOfKin: view.care?.nextOfKin ?? null,
    homeSiteId: view.homeSite.id,
    usualTherapistId: view.care?.usualTherapist?.id ?? null,
    payer: view.payer && {
      payerId: view.payer.payerId,
      policyNumber: view.payer.policyNumber,
      authorisationCode: view.payer.authorisationCode,
      sessionsAuthorised: view.payer.sessionsAuthorised,
      excessPence: view.payer.excessPence,
    },
    ...values,
  };
}

async function someone() {
  const row = await addPatient(practice);
  return getPatient(desk(), { patientId: row.id });
}

test("saves what changed, finds it by the new name, and says which fields", async () => {
  const view = await someone();
  const saved = await editPatient(desk(), formOf(view, { familyName: "Zennor-Kite", postcode: "zz41aa" }));
  expect(saved).toMatchObject({ name: "Perran Zennor-Kite", postcode: "ZZ4 1AA", version: 2 });
  const audit = (await auditOf(practice, view.id)).filter((a) => a.action === "patient.edited");
  expect(audit).toHaveLength(1);
  expect(audit[0]?.detail).toEqual({ changed: ["familyName", "postcode"] });
  const found = await listPatients(desk(), { search: "kite" });
  expect(found.rows).toEqual([]);
  const byStart = await listPatients(desk(), { search: "zennor ki" });
  expect(byStart.rows.map((row) => row.id)).toEqual([view.id]);
});

test("saving without a change writes nothing", async () => {
  const view = await someone();
  const saved = await editPatient(desk(), formOf(view));
  expect(saved.version).toBe(1);
  expect((await auditOf(practice, view.id)).map((a) => a.action)).toEqual(["patient.read"]);
});

test("the second of two who edit sees the first one's version and loses nothing", async () => {
  const view = await someone();
  await editPatient(desk(), formOf(view, { gpName: "Dr Hanne Pryor" }));
  const second = editPatient(contextFor(practice, "therapist"), formOf(view, { nextOfKin: "Huw" }));
  await expect(second).rejects.toMatchObject({
    code: "stale",
    detail: { theirs: { version: 2, care: { gpName: "Dr Hanne Pryor", nextOfKin: null } } },
  });
});

test("a new payer stands beside the old one, which stays", async () => {
  const row = await addPatient(practice);
  await addInsurance(practice, row.id);
  const view = await getPatient(desk(), { patientId: row.id });
  const saved = await editPatient(desk(), formOf(view, { payer: null }));
  expect(saved.payer).toBeNull();
  const rows = await practice.db
    .select()
    .from(patientPayers)
    .where(and(eq(patientPayers.practiceId, practice.practiceId), eq(patientPayers.patientId, row.id)));
  expect(rows.map((r) => r.isCurrent)).toEqual([false]);
});

test("a phone that someone else has is asked about, unless it was there before", async () => {
  const [one, two] = [await someone(), await someone()];
  const form = formOf(two, { phone: one.phone });
  await expect(editPatient(desk(), form)).rejects.toMatchObject({ kind: "possible-duplicate" });
  const saved = await editPatient(desk(), { ...form, isSomeoneElse: true });
  const again = await editPatient(desk(), formOf(saved, { gpName: "Dr Hanne Pryor" }));
  expect(again.version).toBe(3);
});

test("refuses whoever may not, and rows from elsewhere", async () => {
  const view = await someone();
  const stranger = await buildPractice();
  await expect(editPatient(contextFor(practice, "accounts"), formOf(view))).rejects.toMatchObject({
    code: "forbidden",
  });
  const foreign = contextFor(stranger, "receptionist");
  await expect(editPatient(foreign, formOf(view))).rejects.toMatchObject({ code: "not-found" });
  await expect(editPatient(desk(), formOf(view, { patientId: newId() }))).rejects.toMatchObject({
    code: "not-found",
  });
});
