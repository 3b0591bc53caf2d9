import { diarySettings, practices } from "@withy/db/schema";
import { dueReminder, usualReminderHours } from "@withy/diary/due-reminder";
import { asc, eq, sql } from "drizzle-orm";
import type { SystemContext } from "../context";
import { enqueueMessage } from "../messaging/enqueue-message";
import { isConsentWithdrawn } from "../patients/is-consent-withdrawn";
import { rowsOf, sqlTime, utc } from "./raw-rows";
import { visitPayload } from "./send-visit-message";
import { readVisitRow } from "./visit-row";

type PracticeContext = SystemContext & { readonly practiceId: string };

interface Candidate {
  readonly id: string;
  readonly patient_id: string;
  readonly starts_at: string;
  readonly placed_at: string;
}

/**
 * Visits that start within the longest reminder, of patients who like e-mail. The index by state and start finds
 * them: what lies in the past or far ahead is never looked at, however much of it there is.
 */
function readCandidates(ctx: PracticeContext, now: Date, mostHours: number): Promise<Candidate[]> {
  const until = new Date(now.getTime() + mostHours * 3_600_000);
  // A change that gave the visit its time, or the same time anew: whoever was told of it needs no reminder.
  return rowsOf<Candidate>(
    ctx.db,
    sql`
    select a.id, a.patient_id, a.starts_at, greatest(a.created_at, coalesce((
        select max(c.changed_at) from appointment_changes c
        where c.practice_id = a.practice_id and c.appointment_id = a.id
          and (c.kind in ('booked', 'moved') or (c.kind = 'undone'
            and (json_value(c.\`before\`, '$.state') = 'cancelled'
              or json_value(c.\`before\`, '$.startsAt') <> json_value(c.\`after\`, '$.startsAt'))))
      ), a.created_at)) as placed_at
    from appointments a
      join patients p on p.practice_id = a.practice_id and p.id = a.patient_id
    where a.practice_id = ${ctx.practiceId} and a.state in ('booked', 'confirmed')
      and a.starts_at > ${sqlTime(now)} and a.starts_at <= ${sqlTime(until)}
      and p.preferred_channel = 'email' and p.email is not null and p.email <> ''
    order by a.starts_at`,
  );
}

interface Due {
  readonly visitId: string;
  readonly patientId: string;
  readonly dedupeKey: string;
}

/**
 * The key names the visit by its start and not by its version: a confirmation raises the version too, and must not
 * bring the same reminder a second time.
 */
const keyOf = (visit: Candidate, hours: number): string =>
  `visit-reminder/${visit.id}/${utc(visit.starts_at) / 60_000}/${hours}`;

async function withoutThoseWritten(ctx: PracticeContext, due: readonly Due[]): Promise<Due[]> {
  if (due.length === 0) return [];
  const keys = sql.join(
    due.map((one) => sql`${one.dedupeKey}`),
    sql`, `,
  );
  const rows = await rowsOf<{ dedupe_key: string }>(
    ctx.db,
    sql`select dedupe_key from outbox_messages where practice_id = ${ctx.practiceId} and dedupe_key in (${keys})`,
  );
  const written = new Set(rows.map((row) => row.dedupe_key));
  return due.filter((one) => !written.has(one.dedupeKey));
}

async function remind(ctx: PracticeContext, due: Due): Promise<boolean> {
  if (await isConsentWithdrawn(ctx, due.patientId, "email")) return false;
  const row = await readVisitRow(ctx, due.visitId);
  const { email } = row;
  if (email === null || email === "") return false;
  await enqueueMessage(ctx, {
    template: "visit-reminder",
    toAddress: email,
    payload: { ...visitPayload(ctx, { ...row, email }, null) },
    aboutKind: "appointment",
    aboutId: row.id,
    patientId: row.patient_id,
    dedupeKey: due.dedupeKey,
  });
  return true;
}

async function remindOfPractice(ctx: PracticeContext, hours: readonly number[]): Promise<number> {
  if (hours.length === 0) return 0;
  const now = ctx.clock.now();
  const candidates = await readCandidates(ctx, now, Math.max(...hours));
  const due = candidates.flatMap((visit): Due[] => {
    const at = { startsAt: utc(visit.starts_at), placedAt: utc(visit.placed_at) };
    const which = dueReminder(at, hours, now.getTime());
    if (which === null) return [];
    return [{ visitId: visit.id, patientId: visit.patient_id, dedupeKey: keyOf(visit, which) }];
  });
  let written = 0;
  for (const one of await withoutThoseWritten(ctx, due)) written += (await remind(ctx, one)) ? 1 : 0;
  return written;
}

/**
 * Writes the reminders that are due into the outbox, one row each. The row's key makes a repeat harmless: a worker
 * that dies anywhere in here, or two at once, change nothing about what goes out. @returns how many were written
 */
export async function sendDueReminders(ctx: SystemContext): Promise<number> {
  const rows = await ctx.db
    .select({ practiceId: practices.id, hours: diarySettings.reminderHours })
    .from(practices)
    .leftJoin(diarySettings, eq(diarySettings.practiceId, practices.id))
    .orderBy(asc(practices.id));
  let written = 0;
  for (const { practiceId, hours } of rows)
    written += await remindOfPractice({ ...ctx, practiceId }, hours ?? usualReminderHours);
  return written;
}
