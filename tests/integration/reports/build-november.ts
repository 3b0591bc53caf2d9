import { newId } from "@withy/core/ids";
import { absences, invoices, payments, refunds, siteClosures } from "@withy/db/schema";
import { addAppointment } from "../../support/diary-rows";
import { addPatient } from "../../support/people";
import { buildPractice, type TestPractice } from "../../support/practice";

/** 8 to 16 less an hour's lunch: what each therapist offers on each of November's 21 weekdays, in minutes. */
export const fullDay = 7 * 60;

interface Bill {
  number: number;
  patientId: string;
  issuedOn: string;
  net: number;
  paid?: { at: string; pence: number; refunded?: { at: string; pence: number } };
  values?: Partial<typeof invoices.$inferInsert>;
}

async function bill(practice: TestPractice, { number, patientId, issuedOn, net, paid, values }: Bill) {
  const { practiceId } = practice;
  const invoice = {
    practiceId,
    id: newId(),
    number,
    reference: `MP-${number}`,
    state: "issued" as const,
    patientId,
    siteId: practice.sites.saltgate.id,
    billTo: { name: "", addressLines: [], postcode: null, email: null },
    issuedOn,
    dueOn: issuedOn,
    issuedAt: new Date(`${issuedOn}T12:00:00Z`),
    netPence: net,
    vatPence: 0,
    totalPence: net,
    paidPence: (paid?.pence ?? 0) - (paid?.refunded?.pence ?? 0),
    vatRounding: "line-nearest",
    createdAt: practice.clock.now(),
    createdBy: practice.staff.accounts.id,
    updatedAt: practice.clock.now(),
    ...values,
  };
  await practice.db.insert(invoices).values(invoice);
  if (!paid) return;
  const payment = {
    practiceId,
    id: newId(),
    invoiceId: invoice.id,
    siteId: invoice.siteId,
    method: "cash" as const,
    amountPence: paid.pence,
    refundedPence: paid.refunded?.pence ?? 0,
    receivedAt: new Date(paid.at),
  };
  await practice.db.insert(payments).values(payment);
  if (paid.refunded)
    await practice.db.insert(refunds).values({
      practiceId,
      id: newId(),
      paymentId: payment.id,
      invoiceId: invoice.id,
      amountPence: paid.refunded.pence,
      reason: "Paid twice",
      method: "cash",
      isOwedAgain: true,
      state: "done",
      refundedAt: new Date(paid.refunded.at),
      refundedBy: practice.staff.accounts.id,
    });
}

interface People {
  old: { id: string };
  fresh: { id: string };
  other: { id: string };
}

async function fillDiary(practice: TestPractice, { old, fresh, other }: People) {
  const ana = { therapistId: practice.staff.therapist.id };
  const tomasz = {
    therapistId: practice.staff.otherTherapist.id,
    siteId: practice.sites.tollhouse.id,
    roomId: practice.rooms.tollhouseRoom1.id,
  };
  const visit = (patientId: string, on: string, time: string, values: object, minutes = 30) =>
    addAppointment(practice, { patientId, day: on, time, minutes, values });
  await visit(old.id, "2026-10-20", "10:00", { ...ana, state: "fulfilled" });
  await visit(old.id, "2026-11-03", "10:00", { ...ana, state: "fulfilled" });
  await visit(fresh.id, "2026-11-03", "11:00", { ...ana, state: "fulfilled" }, 45);
  await visit(fresh.id, "2026-11-10", "10:00", { ...ana, state: "fulfilled" });
  await visit(old.id, "2026-11-10", "11:00", { ...ana, state: "noshow" });
  await visit(old.id, "2026-11-17", "10:00", { ...ana, state: "cancelled", isLateCancellation: true });
  await visit(other.id, "2026-11-17", "14:00", { ...tomasz, state: "confirmed" }, 60);
  // The last minutes of November and the first of December, on the practice's clock.
  await visit(other.id, "2026-11-30", "15:30", { ...tomasz, state: "booked" });
  await visit(other.id, "2026-12-01", "08:00", { ...tomasz, state: "booked" });
}

async function shutSomeHours(practice: TestPractice) {
  // Ana is away for a day and a half, lunch included; Saltgate is shut for a day.
  await practice.db.insert(absences).values({
    practiceId: practice.practiceId,
    id: newId(),
    staffMemberId: practice.staff.therapist.id,
    kind: "leave",
    reason: "Leave",
    startsAt: new Date("2026-11-19T08:00:00Z"),
    endsAt: new Date("2026-11-20T12:00:00Z"),
    createdBy: practice.staff.owner.id,
  });
  await practice.db.insert(siteClosures).values({
    practiceId: practice.practiceId,
    siteId: practice.sites.saltgate.id,
    closedOn: "2026-11-27",
    reason: "Boiler",
  });
}

async function fillLedger(practice: TestPractice, { old, fresh }: People) {
  const insurer = { payerId: practice.payers.insurer.id };
  await bill(practice, {
    number: 1,
    patientId: old.id,
    issuedOn: "2026-10-31",
    net: 5200,
    paid: { at: "2026-11-02T10:00:00Z", pence: 5200 },
  });
  await bill(practice, { number: 2, patientId: old.id, issuedOn: "2026-11-01", net: 5200 });
  await bill(practice, {
    number: 3,
    patientId: fresh.id,
    issuedOn: "2026-11-30",
    net: 6800,
    paid: { at: "2026-11-30T23:59:00Z", pence: 6800, refunded: { at: "2026-11-30T23:59:30Z", pence: 1000 } },
  });
  await bill(practice, {
    number: 4,
    patientId: fresh.id,
    issuedOn: "2026-11-12",
    net: 6100,
    values: insurer,
  });
  await bill(practice, {
    number: 5,
    patientId: fresh.id,
    issuedOn: "2026-11-12",
    net: 9900,
    values: { state: "void" },
  });
  await bill(practice, { number: 6, patientId: fresh.id, issuedOn: "2026-12-01", net: 9900 });
}

/** A practice with a November that a person can add up by hand. */
export async function buildNovember(): Promise<TestPractice> {
  const practice = await buildPractice();
  const people = {
    old: await addPatient(practice),
    fresh: await addPatient(practice),
    other: await addPatient(practice),
  };
  await fillDiary(practice, people);
  await shutSomeHours(practice);
  await fillLedger(practice, people);
  return practice;
}
