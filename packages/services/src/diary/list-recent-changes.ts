import { listRecentChangesInput, type RecentChange } from "@withy/contracts/diary";
import { weekdayDate } from "@withy/core/date-words";
import { dayOf, timeOf } from "@withy/core/zoned-time";
import { isAppointmentState, stateFacts } from "@withy/diary/appointment-states";
import { sql } from "drizzle-orm";
import { verb } from "../verb";
import { isoOf, rowsOf, utc } from "./raw-rows";
import { readableSites } from "./site-reach";

interface ChangeRow {
  id: string;
  kind: RecentChange["kind"];
  changed_at: string;
  by_name: string;
  patient_name: string;
  appointment_id: string;
  version: number;
  state_now: string;
  state_before: string | null;
  state_after: string;
  starts_before: string | null;
  starts_after: string;
  undone_at: string | null;
  zone: string;
}

/** "Tue 8 Dec 10:15", or the time alone where the day is today's. */
function whenWords(text: string, zone: string, today: string): string {
  const at = new Date(text);
  const day = dayOf(at, zone);
  return day === today ? timeOf(at, zone) : `${weekdayDate(day)} ${timeOf(at, zone)}`;
}

function whatWords(row: ChangeRow, today: string): string {
  const when = whenWords(row.starts_after, row.zone, today);
  const word = isAppointmentState(row.state_after)
    ? stateFacts[row.state_after].word.toLowerCase()
    : row.state_after;
  if (row.kind === "booked") return `booked ${row.patient_name} for ${when}`;
  if (row.kind === "cancelled") return `cancelled ${row.patient_name}, ${when}`;
  if (row.kind === "undone") return `undid the last change: ${row.patient_name} is ${word} again`;
  if (row.kind === "marked") return `marked ${row.patient_name} as ${word}`;
  const isSameTime = row.starts_before === row.starts_after;
  return isSameTime
    ? `changed who or where for ${row.patient_name}, ${when}`
    : `moved ${row.patient_name} to ${when}`;
}

/** What was done in the diary lately, newest first, so that a slip can be seen and taken back. */
export const listRecentChanges = verb(
  "diary.read",
  listRecentChangesInput,
  async (ctx, input): Promise<RecentChange[]> => {
    const siteIds = await readableSites(ctx, input.siteIds);
    if (siteIds.length === 0) return [];
    const ends = siteIds.map(
      (
        id,
      ) => sql`(select c.id from appointment_changes c where c.practice_id = ${ctx.practiceId} and c.site_id = ${id}
      order by c.changed_at desc, c.id desc limit ${input.limit})`,
    );
    const rows = await rowsOf<ChangeRow>(
      ctx.db,
      sql`select c.id, c.kind, c.changed_at, concat(m.given_name, ' ', m.family_name) as by_name,
        concat(p.given_name, ' ', p.family_name) as patient_name, c.appointment_id, a.version, a.state as state_now,
        json_value(c.before, '$.state') as state_before, json_value(c.after, '$.state') as state_after,
        json_value(c.before, '$.startsAt') as starts_before, json_value(c.after, '$.startsAt') as starts_after,
        c.undone_at, s.zone
      from (${sql.join(ends, sql` union all `)}) l
        join appointment_changes c on c.practice_id = ${ctx.practiceId} and c.id = l.id
        join appointments a on a.practice_id = c.practice_id and a.id = c.appointment_id
        join patients p on p.practice_id = a.practice_id and p.id = a.patient_id
        join staff_members m on m.practice_id = c.practice_id and m.id = c.changed_by
        join sites s on s.practice_id = a.practice_id and s.id = a.site_id
      order by c.changed_at desc, c.id desc`,
    );
    const today = dayOf(ctx.clock.now(), ctx.zone);
    // A move between two sites stands once for each; it is told once.
    const once = rows.filter(
      (r, n) =>
        rows.findIndex(
          (o) => o.appointment_id === r.appointment_id && o.changed_at === r.changed_at && o.kind === r.kind,
        ) === n,
    );
    return once.slice(0, input.limit).map((row) => ({
      id: row.id,
      at: isoOf(row.changed_at),
      time: timeOf(new Date(utc(row.changed_at)), row.zone),
      kind: row.kind,
      byName: row.by_name,
      what: whatWords(row, today),
      appointmentId: row.appointment_id,
      canUndo:
        (row.kind === "cancelled" || row.kind === "marked") &&
        row.undone_at === null &&
        row.state_now === row.state_after &&
        // Newest first: an earlier one has something done after it.
        once.find((other) => other.appointment_id === row.appointment_id) === row,
      version: row.version,
    }));
  },
);
