import type { AppointmentMessagePayload } from "@withy/contracts/diary";
import type { AppointmentTemplate } from "@withy/contracts/message-words";
import type { Context } from "../context";
import { enqueueMessage, type OutgoingMessage } from "../messaging";
import { isoOf, utc } from "./raw-rows";
import { readVisitRow, type VisitRow } from "./visit-row";

/** Site and address in one line. */
export function addressOf(row: VisitRow): string {
  const lines = (
    typeof row.address_lines === "string" ? JSON.parse(row.address_lines) : row.address_lines
  ) as string[];
  return [row.site_name, ...lines, row.site_postcode].join(", ");
}

/** Everything that a message about the visit says. */
export function visitPayload(
  ctx: Pick<Context, "clock">,
  row: VisitRow & { email: string },
  previousStartsAt: Date | null,
): AppointmentMessagePayload {
  const place = addressOf(row);
  return {
    appointmentId: row.id,
    version: row.version,
    startsAt: isoOf(row.starts_at),
    endsAt: isoOf(row.ends_at),
    previousStartsAt: previousStartsAt?.toISOString() ?? null,
    zone: row.zone,
    practice: row.practice_name,
    practiceEmail: row.practice_email,
    contactLines: [row.site_phone, place],
    phone: row.site_phone,
    place,
    withWhom: `with ${row.therapist_name}, ${row.job_title}`,
    attendee: { name: row.patient_name, email: row.email },
    greetingName: row.preferred_name ?? row.given_name,
    noticeHours: row.notice_hours,
    at: ctx.clock.now().toISOString(),
  };
}

/**
 * Puts an e-mail with its calendar file into the outbox, in the caller's transaction. Nothing is sent without an
 * address, nor about a visit that has begun: whoever walks in needs no invitation.
 * @returns the visit as it now stands, for the answer
 */
export async function sendVisitMessage(
  ctx: Context,
  template: AppointmentTemplate,
  appointmentId: string,
  previousStartsAt: Date | null = null,
): Promise<VisitRow> {
  const row = await readVisitRow(ctx, appointmentId);
  const message = visitMessage(ctx, template, row, previousStartsAt);
  if (message) await enqueueMessage(ctx, message);
  return row;
}

/** The message about a visit, or null where none is to be sent. */
export function visitMessage(
  ctx: Context,
  template: AppointmentTemplate,
  row: VisitRow,
  previousStartsAt: Date | null = null,
): OutgoingMessage | null {
  const { email } = row;
  if (email === null || email === "" || utc(row.starts_at) <= ctx.clock.now().getTime()) return null;
  return {
    template,
    toAddress: email,
    payload: { ...visitPayload(ctx, { ...row, email }, previousStartsAt) },
    aboutKind: "appointment",
    aboutId: row.id,
    patientId: row.patient_id,
    dedupeKey: `${template}/${row.id}/${row.version}`,
  };
}
