import type { CourseMessagePayload } from "@withy/contracts/diary";
import type { CourseTemplate } from "@withy/contracts/message-words";
import type { Context } from "../context";
import { enqueueMessage } from "../messaging";
import { isoOf, utc } from "./raw-rows";
import { addressOf } from "./send-visit-message";
import { readVisitRow, type VisitRow } from "./visit-row";

const visitOf = (row: VisitRow): CourseMessagePayload["visits"][number] => ({
  appointmentId: row.id,
  version: row.version,
  startsAt: isoOf(row.starts_at),
  endsAt: isoOf(row.ends_at),
  place: addressOf(row),
  withWhom: `with ${row.therapist_name}, ${row.job_title}`,
});

/** Puts one e-mail about all the visits of an act into the outbox, in the caller's transaction. */
export async function sendCourseMessage(
  ctx: Context,
  template: CourseTemplate,
  course: { readonly id: string; readonly version: number },
  appointmentIds: readonly string[],
): Promise<void> {
  const rows: VisitRow[] = [];
  for (const id of appointmentIds) rows.push(await readVisitRow(ctx, id));
  const now = ctx.clock.now();
  const ahead = rows.filter((row) => utc(row.starts_at) > now.getTime());
  const [first] = ahead;
  if (!first?.email) return;
  const payload: CourseMessagePayload = {
    courseId: course.id,
    ...{ zone: first.zone, practice: first.practice_name, practiceEmail: first.practice_email },
    contactLines: [first.site_phone, addressOf(first)],
    phone: first.site_phone,
    attendee: { name: first.patient_name, email: first.email },
    greetingName: first.preferred_name ?? first.given_name,
    noticeHours: first.notice_hours,
    at: now.toISOString(),
    visits: ahead.map(visitOf).sort((a, b) => a.startsAt.localeCompare(b.startsAt)),
  };
  await enqueueMessage(ctx, {
    template,
    toAddress: first.email,
    payload: { ...payload },
    aboutKind: "course",
    aboutId: course.id,
    patientId: first.patient_id,
    dedupeKey: `${template}/${course.id}/${course.version}`,
  });
}
