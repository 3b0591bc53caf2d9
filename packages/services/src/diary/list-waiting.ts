import { listWaitingInput, type WaitingRow } from "@withy/contracts/diary";
import type { Page } from "@withy/contracts/page";
import { sitesWith } from "@withy/core/access/can";
import { dayOf, timeOf } from "@withy/core/zoned-time";
import type { WaitingWishes } from "@withy/diary/waiting-match";
import type { Urgency } from "@withy/diary/waiting-words";
import { wishWords } from "@withy/diary/wish-words";
import { type SQL, sql } from "drizzle-orm";
import type { z } from "zod";
import type { Context } from "../context";
import { verb } from "../verb";
import { isoOf, rowsOf, sqlTime, utc } from "./raw-rows";

interface Row {
  id: string;
  version: number;
  patient_id: string;
  patient_name: string;
  phone: string | null;
  service_id: string;
  service_name: string;
  duration_minutes: number;
  urgency: Urgency;
  waiting_since: string;
  wishes: WaitingWishes | string;
  desk_note: string | null;
  instead_of_id: string | null;
  instead_of_at: string | null;
  instead_of_zone: string | null;
  open_round_id: string | null;
  total: number;
}

const dayMs = 86_400_000;

/** Would come to one of the sites: no site is named, or one of these is. */
function comesTo(siteIds: readonly string[]): SQL {
  const each = siteIds.map(
    (id) => sql`json_contains(json_extract(e.wishes, '$.siteIds'), json_quote(${id}))`,
  );
  const any = sql`coalesce(json_length(json_extract(e.wishes, '$.siteIds')), 0) = 0`;
  return sql`(${sql.join([any, ...each], sql` or `)})`;
}

function listSql(ctx: Context, input: z.output<typeof listWaitingInput>): SQL {
  const { siteId, urgency, patientId, page, pageSize } = input;
  const reach = sitesWith(ctx.roles, "diary.read");
  const now = sqlTime(ctx.clock.now());
  return sql`
    select e.id, e.version, e.patient_id, concat(p.given_name, ' ', p.family_name) as patient_name, p.phone,
      v.id as service_id, v.name as service_name, v.duration_minutes, e.urgency, e.waiting_since, e.wishes, e.desk_note,
      i.id as instead_of_id, i.starts_at as instead_of_at, s.zone as instead_of_zone,
      (select r.id from waiting_offers o join offer_rounds r on r.practice_id = o.practice_id and r.id = o.round_id
        where o.practice_id = e.practice_id and o.entry_id = e.id and o.state = 'open' and r.state = 'open'
          and r.expires_at > ${now} limit 1) as open_round_id,
      count(*) over () as total
    from waiting_entries e
      join patients p on p.practice_id = e.practice_id and p.id = e.patient_id
      join services v on v.practice_id = e.practice_id and v.id = e.service_id
      left join appointments i on i.practice_id = e.practice_id and i.id = e.instead_of_id
        and i.state in ('booked', 'confirmed') and i.starts_at > ${now}
      left join sites s on s.practice_id = i.practice_id and s.id = i.site_id
    where e.practice_id = ${ctx.practiceId} and e.state = 'waiting'
      ${reach === "all" ? sql`` : sql`and ${comesTo(reach)}`}
      ${siteId === undefined ? sql`` : sql`and ${comesTo([siteId])}`}
      ${urgency === undefined ? sql`` : sql`and e.urgency = ${urgency}`}
      ${patientId === undefined ? sql`` : sql`and e.patient_id = ${patientId}`}
    order by field(e.urgency, 'urgent', 'soon', 'routine'), e.waiting_since, e.id
    limit ${pageSize} offset ${(page - 1) * pageSize}`;
}

async function namesOf(ctx: Context): Promise<Map<string, string>> {
  const rows = await rowsOf<{ id: string; name: string }>(
    ctx.db,
    sql`select id, name from sites where practice_id = ${ctx.practiceId}
      union all select id, concat(given_name, ' ', family_name) from staff_members
        where practice_id = ${ctx.practiceId} and is_therapist`,
  );
  return new Map(rows.map((row) => [row.id, row.name]));
}

function viewOf(row: Row, names: Map<string, string>, now: Date): WaitingRow {
  const wishes = typeof row.wishes === "string" ? (JSON.parse(row.wishes) as WaitingWishes) : row.wishes;
  const { instead_of_id: insteadId, instead_of_at: insteadAt, instead_of_zone: zone } = row;
  const at = insteadAt === null ? null : new Date(utc(insteadAt));
  return {
    id: row.id,
    version: row.version,
    patient: { id: row.patient_id, name: row.patient_name, phone: row.phone },
    service: { id: row.service_id, name: row.service_name, durationMinutes: row.duration_minutes },
    urgency: row.urgency,
    waitingSince: isoOf(row.waiting_since),
    waitsDays: Math.max(0, Math.floor((now.getTime() - utc(row.waiting_since)) / dayMs)),
    wishes,
    wishWords: wishWords(wishes, (id) => names.get(id) ?? ""),
    insteadOf:
      insteadId === null || at === null || zone === null
        ? null
        : { id: insteadId, day: dayOf(at, zone), startTime: timeOf(at, zone) },
    deskNote: row.desk_note,
    openRoundId: row.open_round_id,
  };
}

/** Who waits, most urgent first and then by how long; only whom a desk within reach can serve. */
export const listWaiting = verb(
  "diary.read",
  listWaitingInput,
  async (ctx, input): Promise<Page<WaitingRow>> => {
    const [rows, names] = await Promise.all([rowsOf<Row>(ctx.db, listSql(ctx, input)), namesOf(ctx)]);
    const now = ctx.clock.now();
    return {
      rows: rows.map((row) => viewOf(row, names, now)),
      page: input.page,
      pageSize: input.pageSize,
      total: Number(rows[0]?.total ?? 0),
    };
  },
);
