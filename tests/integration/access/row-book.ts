import { emptyProgramme } from "@withy/clinical/programmes/new-item";
import { newId } from "@withy/core/ids";
import {
  cardAttempts,
  courses,
  invoiceLines,
  invoices,
  jobs,
  letters,
  measureRecords,
  notes,
  outboxMessages,
  payments,
  programmes,
  programmeVersions,
  refunds,
  sessions,
} from "@withy/db/schema";
import { addAppointment } from "../../support/diary-rows";
import { addEpisode, addPatient } from "../../support/people";
import type { TestPractice } from "../../support/practice";
import { writeCover } from "./cover-rows";
import { writeDesk } from "./desk-rows";
import { writeWaiting } from "./waiting-rows";

/** One row of every kind that an input can name, by the name that inputs give it. */
export type RowBook = Readonly<Record<string, string>>;

export async function writeRowBook(practice: TestPractice): Promise<RowBook> {
  const { practiceId, db, clock, staff, sites, rooms } = practice;
  const now = clock.now();
  const key = () => ({ practiceId, id: newId() });
  const patient = await addPatient(practice);
  const episode = await addEpisode(practice, patient.id);
  const at = { patientId: patient.id, day: "2026-12-03" };
  const visit = await addAppointment(practice, { ...at, time: "09:00" });
  const course = {
    ...key(),
    patientId: patient.id,
    serviceId: practice.services.followUp.id,
    siteId: sites.saltgate.id,
    therapistId: staff.therapist.id,
    rhythm: { kind: "interval" as const, days: 7 },
    startTime: "11:00",
    plannedVisits: 1,
    createdAt: now,
    createdBy: staff.receptionist.id,
  };
  await db.insert(courses).values(course);
  await addAppointment(practice, { ...at, time: "11:00", values: { courseId: course.id } });
  const noted = await addAppointment(practice, { ...at, time: "10:00", values: { episodeId: episode.id } });
  const record = { episodeId: episode.id, patientId: patient.id };
  const note = {
    ...key(),
    ...record,
    appointmentId: noted.id,
    authorId: staff.therapist.id,
    kind: "session" as const,
    body: {},
    visitAt: noted.startsAt,
    createdAt: now,
    updatedAt: now,
  };
  await db.insert(notes).values(note);
  const measure = {
    ...key(),
    ...record,
    measureKey: "pain-rating",
    ruleVersion: "2026-12",
    answers: { items: [5] },
    scores: { pain: 5 },
    takenOn: "2026-12-01",
    enteredBy: staff.therapist.id,
    enteredAt: now,
  };
  await db.insert(measureRecords).values(measure);
  const programme = {
    ...key(),
    ...record,
    title: "Programme 1",
    createdAt: now,
    createdBy: staff.therapist.id,
    updatedAt: now,
  };
  await db.insert(programmes).values(programme);
  await db.insert(programmeVersions).values({
    practiceId,
    programmeId: programme.id,
    versionNumber: 1,
    content: { ...emptyProgramme },
    savedAt: now,
    savedBy: staff.therapist.id,
  });
  const letter = {
    ...key(),
    ...record,
    authorId: staff.therapist.id,
    kind: "discharge" as const,
    reference: `L-${newId().slice(-6)}`,
    sections: [],
    datedOn: "2026-12-01",
    createdAt: now,
    updatedAt: now,
    recipient: { kind: "gp" as const, name: "Dr Ruth Ellery", addressLines: [], email: null },
  };
  await db.insert(letters).values(letter);
  const money = await writeMoney(practice, patient.id);
  const message = {
    id: newId(),
    practiceId,
    channel: "email" as const,
    template: "booking-confirmed",
    toAddress: "a@post.example",
    payload: {},
    aboutKind: "appointment",
    aboutId: visit.id,
    dedupeKey: newId(),
    state: "failed" as const,
    dueAt: now,
    createdAt: now,
  };
  await db.insert(outboxMessages).values(message);
  const session = {
    id: newId(),
    practiceId,
    staffMemberId: staff.owner.id,
    createdAt: now,
    lastSeenAt: now,
    expiresAt: new Date(now.getTime() + 3_600_000),
    deskSiteId: sites.saltgate.id,
  };
  await db.insert(sessions).values(session);
  const job = { id: newId(), practiceId, kind: "billing.draft-visits", input: {}, state: "done" as const };
  await db.insert(jobs).values({ ...job, dueAt: now, createdAt: now });
  const waits = await writeWaiting(practice, patient.id);
  const cover = await writeCover(practice, visit);
  const desk = await writeDesk(practice);
  return {
    ...waits,
    ...cover,
    insteadOfId: visit.id,
    freedById: visit.id,
    ...desk,
    patientId: patient.id,
    episodeId: episode.id,
    appointmentId: visit.id,
    movingId: visit.id,
    courseId: course.id,
    noteId: note.id,
    replaces: measure.id,
    programmeId: programme.id,
    copyOf: programme.id,
    letterId: letter.id,
    ...money,
    messageId: message.id,
    sessionId: session.id,
    jobId: job.id,
    serviceId: practice.services.followUp.id,
    productId: practice.products.band.id,
    payerId: practice.payers.insurer.id,
    payer: practice.payers.insurer.id,
    gpPracticeId: practice.gpPractices.surgery.id,
    siteId: sites.saltgate.id,
    homeSiteId: sites.saltgate.id,
    siteIds: sites.saltgate.id,
    roomId: rooms.saltgateRoom1.id,
    therapistId: staff.therapist.id,
    therapistIds: staff.therapist.id,
    usualTherapistId: staff.therapist.id,
    staffMemberId: staff.tollhouseReceptionist.id,
    actorId: staff.owner.id,
  };
}

async function writeMoney(
  { practiceId, db, clock, staff, sites, products }: TestPractice,
  patientId: string,
) {
  const now = clock.now();
  const key = () => ({ practiceId, id: newId() });
  const invoice = {
    ...key(),
    patientId,
    siteId: sites.saltgate.id,
    billTo: { name: "Perran Oake", addressLines: [], postcode: null, email: null },
    netPence: 1250,
    vatPence: 250,
    totalPence: 1500,
    vatRounding: "line-nearest",
    createdAt: now,
    createdBy: staff.receptionist.id,
    updatedAt: now,
  };
  await db.insert(invoices).values(invoice);
  const line = {
    ...key(),
    invoiceId: invoice.id,
    position: 1,
    kind: "product" as const,
    productId: products.band.id,
    description: "Resistance band",
    unitPence: 1250,
    vatTreatment: "standard",
    vatBasisPoints: 2000,
    netPence: 1250,
    vatPence: 250,
    totalPence: 1500,
  };
  await db.insert(invoiceLines).values(line);
  const payment = {
    ...key(),
    invoiceId: invoice.id,
    siteId: sites.saltgate.id,
    method: "cash" as const,
    amountPence: 1500,
    receivedAt: now,
  };
  await db.insert(payments).values(payment);
  const refund = {
    ...key(),
    paymentId: payment.id,
    invoiceId: invoice.id,
    amountPence: 100,
    reason: "Trial",
    method: "cash" as const,
    state: "failed" as const,
    refundedAt: now,
    refundedBy: staff.accounts.id,
  };
  await db.insert(refunds).values(refund);
  const attempt = {
    ...key(),
    invoiceId: invoice.id,
    amountPence: 500,
    state: "failed" as const,
    startedBy: staff.accounts.id,
    startedAt: now,
  };
  await db.insert(cardAttempts).values(attempt);
  return {
    invoiceId: invoice.id,
    lineId: line.id,
    paymentId: payment.id,
    refundId: refund.id,
    cardPaymentId: attempt.id,
  };
}
