import type { TodayArrival, TodayOwed } from "@withy/contracts/diary";
import { can } from "@withy/core/access/can";
import { timeOf } from "@withy/core/zoned-time";
import { type SQL, sql } from "drizzle-orm";
import type { Context } from "../context";
import type { DayVisit } from "./day-appointments";
import type { Frame } from "./frame";
import { rowsOf, utc } from "./raw-rows";

const listOf = (ids: readonly string[]): SQL =>
  sql.join(
    ids.map((id) => sql`${id}`),
    sql`, `,
  );

interface Beside {
  id: string;
  born_on: string;
  arrived_at: string | null;
  communication_needs: string | null;
  desk_note: string | null;
  alert: string | null;
}

interface OwedRow {
  patient_id: string;
  owed: number | string;
  invoice_id: string;
  reference: string;
}

/** What the day's visits do not carry themselves: date of birth, arrival, and the one line that the desk must know. */
function besideSql(practiceId: string, ids: readonly string[]): SQL {
  return sql`select a.id, p.born_on, a.arrived_at, p.communication_needs, a.desk_note,
      (select l.text from patient_alerts l where l.practice_id = a.practice_id and l.patient_id = a.patient_id
        and l.resolved_at is null and l.is_clinical = 0 order by l.created_at desc limit 1) as alert
    from appointments a join patients p on p.practice_id = a.practice_id and p.id = a.patient_id
    where a.practice_id = ${practiceId} and a.id in (${listOf(ids)})`;
}

/** What each patient owes themselves, oldest invoice first; what an insurer owes is not collected at the desk. */
async function readOwed(ctx: Context, patientIds: readonly string[]): Promise<Map<string, OwedRow>> {
  if (patientIds.length === 0) return new Map();
  const rows = await rowsOf<OwedRow>(
    ctx.db,
    sql`select i.patient_id, i.total_pence - i.paid_pence - i.credited_pence as owed, i.id as invoice_id, i.reference
      from invoices i where i.practice_id = ${ctx.practiceId} and i.patient_id in (${listOf(patientIds)})
        and i.payer_id is null and i.state in ('issued', 'part-paid') order by i.due_on, i.number`,
  );
  const owed = new Map<string, OwedRow>();
  for (const row of rows) {
    const first = owed.get(row.patient_id);
    if (first) first.owed = Number(first.owed) + Number(row.owed);
    else owed.set(row.patient_id, { ...row, owed: Number(row.owed) });
  }
  return owed;
}

const nextMarks: Partial<Record<DayVisit["state"], TodayArrival["nextMark"]>> = {
  booked: "arrived",
  confirmed: "arrived",
  arrived: "in-session",
  "in-session": "fulfilled",
};

/** The day's visits as lines of the desk's list, in order of their start. */
export async function readArrivals(
  ctx: Context,
  frame: Frame,
  visits: readonly DayVisit[],
): Promise<TodayArrival[]> {
  if (visits.length === 0) return [];
  const patientIds = [...new Set(visits.map((v) => v.patient_id))];
  const beside = await rowsOf<Beside>(
    ctx.db,
    besideSql(
      ctx.practiceId,
      visits.map((v) => v.id),
    ),
  );
  const owed = await readOwed(ctx, patientIds);
  const known = new Map(beside.map((b) => [b.id, b]));
  const sites = new Map(frame.sites.map((s) => [s.id, s]));
  const now = ctx.clock.now().getTime();
  return visits.map((v) => {
    const more = known.get(v.id);
    const site = sites.get(v.site_id);
    const arrivedAt = v.state === "arrived" && more?.arrived_at ? utc(more.arrived_at) : null;
    const startsAt = new Date(v.from);
    return {
      appointmentId: v.id,
      version: v.version,
      state: v.state,
      startsAt: startsAt.toISOString(),
      startTime: timeOf(startsAt, site?.zone ?? ctx.zone),
      patientId: v.patient_id,
      patientName: v.patient_name,
      bornOn: more?.born_on.slice(0, 10) ?? "",
      serviceName: v.service_name,
      therapistName: v.therapist_name,
      roomName: v.room_name,
      siteName: site?.name ?? "",
      nextMark: can(ctx.roles, "diary.mark", v.site_id) ? (nextMarks[v.state] ?? null) : null,
      waitingMinutes: arrivedAt === null ? null : Math.max(0, Math.floor((now - arrivedAt) / 60_000)),
      remark: more?.alert ?? more?.communication_needs ?? more?.desk_note ?? null,
      owesPence: can(ctx.roles, "billing.read", v.site_id) ? Number(owed.get(v.patient_id)?.owed ?? 0) : null,
    };
  });
}

/** Whom to ask for money today: everyone on the list who owes, in the order in which they come. */
export async function toCollect(ctx: Context, lines: readonly TodayArrival[]): Promise<TodayOwed[]> {
  const here = lines.filter((l) => l.state !== "cancelled" && (l.owesPence ?? 0) > 0);
  const owed = await readOwed(ctx, [...new Set(here.map((l) => l.patientId))]);
  const seen = new Set<string>();
  return here.flatMap((l) => {
    const row = owed.get(l.patientId);
    if (!row || seen.has(l.patientId)) return [];
    seen.add(l.patientId);
    const { patientId, patientName, startTime } = l;
    return [
      {
        patientId,
        patientName,
        startTime,
        owesPence: Number(row.owed),
        invoiceId: row.invoice_id,
        reference: row.reference,
      },
    ];
  });
}
