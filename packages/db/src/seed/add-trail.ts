import { appointmentChanges, auditEvents, letters, notes, outboxMessages, patients } from "../schema";
import type { Books } from "./add-money";
import type { House, Stage } from "./stage";
import type { Visit } from "./visit";

const dayMs = 86_400_000;
const trailDays = 10;
const messageDays = 3;

interface Deed {
  at: Date;
  actorId: string | null;
  action: string;
  subjectKind: string;
  subjectId: string;
  patientId: string | null;
  siteId: string | null;
  detail: Record<string, unknown>;
}

/** Who did what over the last days, and the confirmations that went out. */
export function addTrail(stage: Stage, house: House, visits: readonly Visit[], books: Books): void {
  const { rows, newId, now } = stage;
  const { practiceId } = house;
  const since = new Date(now.getTime() - trailDays * dayMs);
  const deeds = [
    ...diaryDeeds(stage, house, visits),
    ...clinicalDeeds(stage, house),
    ...moneyDeeds(books),
  ].filter((deed) => deed.at > since);
  deeds.sort((a, b) => a.at.getTime() - b.at.getTime());
  rows.add(auditEvents, ...deeds.map((deed) => ({ practiceId, id: newId(), requestId: newId(), ...deed })));
  addMessages(stage, house, visits);
}

function diaryDeeds({ rows }: Stage, house: House, visits: readonly Visit[]): Deed[] {
  const patientOf = new Map(visits.map((visit) => [visit.id, visit.course.patient.id]));
  return rows
    .of(appointmentChanges)
    .filter((change) => change.practiceId === house.practiceId)
    .map((change) => ({
      at: change.changedAt,
      actorId: change.changedBy,
      action: `appointment.${change.kind}`,
      subjectKind: "appointment",
      subjectId: change.appointmentId,
      patientId: patientOf.get(change.appointmentId) ?? null,
      siteId: change.siteId,
      detail: { state: change.after.state },
    }));
}

function clinicalDeeds({ rows }: Stage, house: House): Deed[] {
  const signed = rows.of(notes).flatMap((note) =>
    note.practiceId === house.practiceId && note.signedAt
      ? [
          {
            at: note.signedAt,
            actorId: note.authorId,
            action: "note.signed",
            subjectKind: "note",
            subjectId: note.id,
            patientId: note.patientId,
            siteId: null,
            detail: { version: 2 },
          },
        ]
      : [],
  );
  const written = rows.of(letters).flatMap((letter) =>
    letter.practiceId === house.practiceId && letter.signedAt
      ? [
          {
            at: letter.signedAt,
            actorId: letter.authorId,
            action: "letter.signed",
            subjectKind: "letter",
            subjectId: letter.id,
            patientId: letter.patientId,
            siteId: null,
            detail: { version: 2 },
          },
        ]
      : [],
  );
  return [...signed, ...written];
}

function moneyDeeds(books: Books): Deed[] {
  const byId = new Map(books.drafts.map((invoice) => [invoice.id, invoice]));
  const issued = books.issued.map((invoice) => ({
    at: invoice.issuedAt ?? invoice.createdAt,
    actorId: invoice.issuedBy ?? null,
    action: "invoice.issued",
    subjectKind: "invoice",
    subjectId: invoice.id,
    patientId: invoice.patientId,
    siteId: invoice.siteId,
    detail: { reference: invoice.reference, totalPence: invoice.totalPence },
  }));
  const paid = books.payments.map((payment) => ({
    at: payment.receivedAt,
    actorId: payment.takenBy ?? null,
    action: "payment.taken",
    subjectKind: "invoice",
    subjectId: payment.invoiceId,
    patientId: byId.get(payment.invoiceId)?.patientId ?? null,
    siteId: payment.siteId,
    detail: { paymentId: payment.id, amountPence: payment.amountPence, method: payment.method },
  }));
  return [...issued, ...paid];
}

function addMessages(stage: Stage, house: House, visits: readonly Visit[]): void {
  const { rows, newId, now, zone, random } = stage;
  const { practice } = house;
  const emails = new Map(rows.of(patients).map((patient) => [patient.id, patient]));
  for (const visit of visits) {
    const patient = emails.get(visit.course.patient.id);
    if (
      !patient?.email ||
      visit.state === "cancelled" ||
      visit.bookedAt.getTime() < now.getTime() - messageDays * dayMs ||
      visit.endsAt < now
    )
      continue;
    const failed = random.chance(0.02);
    const sentAt = new Date(Math.min(visit.bookedAt.getTime() + 4_000, now.getTime()));
    const place = [visit.site.name, ...visit.site.addressLines, visit.site.postcode].join(", ");
    rows.add(outboxMessages, {
      id: newId(),
      practiceId: house.practiceId,
      channel: "email",
      template: "booking-confirmed",
      toAddress: patient.email,
      payload: {
        appointmentId: visit.id,
        version: 1,
        startsAt: visit.startsAt.toISOString(),
        endsAt: visit.endsAt.toISOString(),
        previousStartsAt: null,
        zone,
        practice: practice.name,
        practiceEmail: practice.email,
        contactLines: [visit.site.phone, place],
        phone: visit.site.phone,
        place,
        withWhom: `with ${visit.therapist.givenName} ${visit.therapist.familyName}, ${visit.therapist.jobTitle}`,
        attendee: { name: `${patient.givenName} ${patient.familyName}`, email: patient.email },
        greetingName: patient.preferredName ?? patient.givenName,
        noticeHours: 24,
        at: visit.bookedAt.toISOString(),
      },
      aboutKind: "appointment",
      aboutId: visit.id,
      patientId: patient.id,
      dedupeKey: `booking-confirmed/${visit.id}/1`,
      state: failed ? "failed" : "sent",
      dueAt: visit.bookedAt,
      attempts: failed ? 6 : 1,
      sentAt: failed ? null : sentAt,
      lastError: failed ? "550" : null,
      createdAt: visit.bookedAt,
    });
  }
}
