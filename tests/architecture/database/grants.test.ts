import { newId } from "@withy/core/ids";
import { auditEvents } from "@withy/db/schema";
import { recordAudit } from "@withy/services/audit";
import { eq, sql } from "drizzle-orm";
import { beforeAll, expect, test } from "vitest";
import { testConnection } from "../../support/connection";
import { contextFor } from "../../support/contexts";
import { addAppointment } from "../../support/diary-rows";
import { addPatient } from "../../support/people";
import { buildPractice, type TestPractice } from "../../support/practice";

const denied = { errno: 1142 };
let practice: TestPractice;
beforeAll(async () => {
  practice = await buildPractice();
});

test("the app's user can neither change nor delete what was audited", async () => {
  const subjectId = newId();
  await recordAudit(contextFor(practice, "owner"), {
    action: "patient.read",
    subjectKind: "patient",
    subjectId,
  });
  const { db } = practice;
  await expect(
    db.update(auditEvents).set({ action: "nothing" }).where(eq(auditEvents.subjectId, subjectId)),
  ).rejects.toMatchObject(denied);
  await expect(db.delete(auditEvents).where(eq(auditEvents.subjectId, subjectId))).rejects.toMatchObject(
    denied,
  );
  await expect(
    db.execute(sql`replace into audit_events select * from audit_events limit 1`),
  ).rejects.toMatchObject(denied);
});

test("the app's user owns no table and cannot switch a check off", async () => {
  const { db } = testConnection();
  for (const statement of [
    "create table intruder (id int)",
    "alter table audit_events add column extra int",
    "drop table audit_events",
    "truncate table audit_events",
    "drop trigger notes_signed_stay",
  ]) {
    const wrong = db.execute(sql.raw(statement));
    await expect(wrong, statement).rejects.toMatchObject({
      errno: expect.toSatisfy((n: number) => [1142, 1044, 1227].includes(n)),
    });
  }
});

test("a visit is cancelled, never deleted", async () => {
  const patient = await addPatient(practice);
  const visit = await addAppointment(practice, { patientId: patient.id, day: "2026-12-02", time: "09:00" });
  const deletion = practice.db.execute(sql`delete from appointments where id = ${visit.id}`);
  await expect(deletion).rejects.toMatchObject(denied);
});
