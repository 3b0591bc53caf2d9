import { newId } from "@withy/core/ids";
import { appointments, outboxMessages } from "@withy/db/schema";
import type { OutgoingMail } from "@withy/gateways/mail";
import { enqueueMessage } from "@withy/services/messaging";
import { and, eq } from "drizzle-orm";
import { systemContextFor } from "../../support/contexts";
import { addPatient } from "../../support/people";
import type { TestPractice } from "../../support/practice";

type MailResult =
  | { outcome: "sent"; messageId: string }
  | { outcome: "try-later" | "refused"; reason: string };

/** A mail gateway that keeps what it is given and answers as it is told. */
export function recordingMail(
  answer: (mail: OutgoingMail) => MailResult = (mail) => ({ outcome: "sent", messageId: mail.id }),
) {
  const sent: OutgoingMail[] = [];
  return {
    sent,
    to: (address: string) => sent.filter((mail) => mail.to === address),
    async send(mail: OutgoingMail): Promise<MailResult> {
      sent.push(mail);
      return answer(mail);
    },
    close() {},
  };
}

export const officeWith = (
  mail: ReturnType<typeof recordingMail>,
  workerId = `worker-${newId().slice(-8)}`,
) => ({
  workerId,
  mail,
  fromAddress: "post@withy.example",
  appUrl: "http://localhost:3000",
});

/** A message about an account, which says nothing that could go out of date. */
export async function enqueueReset(practice: TestPractice, toAddress: string): Promise<string> {
  const ctx = { ...systemContextFor(practice), practiceId: practice.practiceId };
  return enqueueMessage(ctx, {
    template: "password-reset",
    toAddress,
    payload: { greetingName: "Nia", path: "/reset/abc_DEF-123", validFor: "one hour", invitedBy: null },
    aboutKind: "staff-account",
    aboutId: newId(),
    dedupeKey: `reset:${newId()}`,
  });
}

/** A booked visit and the message that says so. */
export async function enqueueBooking(practice: TestPractice, toAddress: string, startsAt: Date) {
  const patient = await addPatient(practice, {});
  const id = newId();
  const endsAt = new Date(startsAt.getTime() + 45 * 60_000);
  const now = practice.clock.now();
  const { practiceId } = practice;
  await practice.db.insert(appointments).values({
    practiceId,
    id,
    siteId: practice.sites.saltgate.id,
    therapistId: practice.staff.therapist.id,
    roomId: practice.rooms.saltgateRoom1.id,
    patientId: patient.id,
    serviceId: practice.services.initial.id,
    startsAt,
    endsAt,
    createdAt: now,
    createdBy: practice.staff.receptionist.id,
    updatedAt: now,
  });
  const messageId = await enqueueMessage(
    { ...systemContextFor(practice), practiceId },
    {
      template: "booking-confirmed",
      toAddress,
      payload: {
        appointmentId: id,
        version: 1,
        startsAt: startsAt.toISOString(),
        endsAt: endsAt.toISOString(),
        previousStartsAt: null,
        zone: "Europe/London",
        practice: "Marram Physiotherapy",
        practiceEmail: "office@marram.example",
        contactLines: ["01632 960100"],
        phone: "01632 960100",
        place: "Saltgate, Easterhaven",
        withWhom: "with Nia Prosser, physiotherapist",
        attendee: { name: "Eleri Tamworth", email: toAddress },
        greetingName: "Eleri",
        noticeHours: 24,
        at: now.toISOString(),
      },
      aboutKind: "appointment",
      aboutId: id,
      patientId: patient.id,
      dedupeKey: `booking-confirmed:${id}`,
    },
  );
  return { appointmentId: id, messageId, patientId: patient.id };
}

export async function outboxRow(practice: TestPractice, id: string) {
  const [row] = await practice.db
    .select()
    .from(outboxMessages)
    .where(and(eq(outboxMessages.practiceId, practice.practiceId), eq(outboxMessages.id, id)));
  if (!row) throw new Error("no such outbox row");
  return row;
}
