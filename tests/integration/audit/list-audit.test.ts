import { newId } from "@withy/core/ids";
import { listAudit } from "@withy/services/audit";
import { recordAudit } from "@withy/services/audit/record-audit";
import { beforeAll, expect, test } from "vitest";
import { contextFor } from "../../support/contexts";
import { addPatient } from "../../support/people";
import { buildPractice, type TestPractice } from "../../support/practice";
import type { TestPerson } from "../../support/practice-staff";

let practice: TestPractice;
let patient: { id: string; familyName: string };

async function happen(at: string, person: TestPerson, action: string, patientId: string | null = null) {
  practice.clock.set(at);
  await recordAudit(contextFor(practice, person), {
    action,
    subjectKind: action.split(".")[0] ?? "",
    subjectId: newId(),
    patientId,
    siteId: practice.sites.saltgate.id,
    detail: { count: 1 },
  });
}

beforeAll(async () => {
  practice = await buildPractice();
  patient = await addPatient(practice);
  await happen("2026-11-29T23:59:00Z", "receptionist", "appointment.booked", patient.id);
  await happen("2026-11-30T00:00:00Z", "therapist", "note.signed", patient.id);
  await happen("2026-11-30T23:59:00Z", "therapist", "note.read", patient.id);
  await happen("2026-12-01T09:00:00Z", "owner", "session.opened");
});

const actions = async (filter: Parameters<typeof listAudit>[1]) =>
  (await listAudit(contextFor(practice, "owner"), filter)).rows.map((row) => row.action);

test("newest first, with names, place and detail", async () => {
  const page = await listAudit(contextFor(practice, "owner"), {});
  expect(page.total).toBe(4);
  expect(page.rows.map((row) => row.action)).toEqual([
    ...["session.opened", "note.read", "note.signed", "appointment.booked"],
  ]);
  expect(page.rows[1]).toMatchObject({
    day: "2026-11-30",
    time: "23:59",
    actorName: "Ana Ferreby",
    patientName: `Perran ${patient.familyName}`,
    siteName: "Saltgate",
    detail: { count: 1 },
  });
});

test("by person, patient, subject and whole days of the practice", async () => {
  expect(await actions({ actorId: practice.staff.therapist.id })).toEqual(["note.read", "note.signed"]);
  expect(await actions({ patientId: patient.id })).toHaveLength(3);
  expect(await actions({ subjectKind: "session" })).toEqual(["session.opened"]);
  expect(await actions({ from: "2026-11-30", until: "2026-11-30" })).toEqual(["note.read", "note.signed"]);
  expect(await actions({ actorId: "", from: "", subjectKind: "" })).toHaveLength(4);
  expect(await actions({ page: 2, pageSize: 3 })).toEqual(["appointment.booked"]);
});

test("only an owner asks, and only within the own practice", async () => {
  for (const person of ["therapist", "receptionist", "accounts"] as const)
    await expect(listAudit(contextFor(practice, person), {})).rejects.toMatchObject({ code: "forbidden" });
  const other = await buildPractice();
  const page = await listAudit(contextFor(other, "owner"), { patientId: patient.id });
  expect(page.rows).toEqual([]);
});
