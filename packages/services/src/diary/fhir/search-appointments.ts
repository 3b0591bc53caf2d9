import { isId } from "@withy/core/ids";
import { type AppointmentState, appointmentStates, stateFacts } from "@withy/diary/appointment-states";
import { type AppointmentFacts, appointmentResource } from "@withy/documents/fhir/resources";
import { type SQL, sql } from "drizzle-orm";
import { rowsOf, sqlTime, utc } from "../raw-rows";
import type { KeyContext } from "./open-by-key";
import { type FhirQuery, strangePage } from "./read-query";

interface Row {
  readonly id: string;
  readonly version: number;
  readonly state: AppointmentState;
  readonly starts_at: string;
  readonly ends_at: string;
  readonly created_at: string;
  readonly updated_at: string;
  readonly cancelled_by: "patient" | "clinic" | null;
  readonly patient_id: string;
  readonly given_name: string;
  readonly family_name: string;
  readonly therapist_id: string;
  readonly therapist_name: string;
  readonly site_id: string;
  readonly site_name: string;
}

const instantOf = (text: string): Date => new Date(utc(text));

const factsOf = (row: Row): AppointmentFacts => ({
  id: row.id,
  version: row.version,
  state: row.state,
  startsAt: instantOf(row.starts_at),
  endsAt: instantOf(row.ends_at),
  createdAt: instantOf(row.created_at),
  updatedAt: instantOf(row.updated_at),
  cancelledBy: row.cancelled_by,
  patientId: row.patient_id,
  givenName: row.given_name,
  familyName: row.family_name,
  therapistId: row.therapist_id,
  therapistName: row.therapist_name,
  siteId: row.site_id,
  siteName: row.site_name,
});

const list = (values: readonly string[]): SQL =>
  sql.join(
    values.map((value) => sql`${value}`),
    sql`, `,
  );

function readRows(ctx: KeyContext, where: SQL, limit: number): Promise<Row[]> {
  return rowsOf<Row>(
    ctx.db,
    sql`
    select a.id, a.version, a.state, a.starts_at, a.ends_at, a.created_at, a.updated_at, a.cancelled_by,
      a.patient_id, p.given_name, p.family_name,
      a.therapist_id, concat(t.given_name, ' ', t.family_name) as therapist_name, a.site_id, s.name as site_name
    from appointments a
      join patients p on p.practice_id = a.practice_id and p.id = a.patient_id
      join staff_members t on t.practice_id = a.practice_id and t.id = a.therapist_id
      join sites s on s.practice_id = a.practice_id and s.id = a.site_id
    where a.practice_id = ${ctx.practiceId} and ${where}
    order by a.starts_at, a.ends_at, a.id limit ${limit}`,
  );
}

/** Where the page before ended: start, end and id of its last visit. */
interface Place {
  readonly start: string;
  readonly end: string;
  readonly id: string;
}

function placeOf(after: string): Place {
  const [start = "", end = "", id = ""] = Buffer.from(after, "base64url").toString("utf8").split("/");
  if (!/^\d{1,15}$/.test(start) || !/^\d{1,15}$/.test(end) || !isId(id)) throw strangePage();
  return { start: sqlTime(new Date(Number(start))), end: sqlTime(new Date(Number(end))), id };
}

const afterOf = (row: Row): string =>
  Buffer.from(`${utc(row.starts_at)}/${utc(row.ends_at)}/${row.id}`).toString("base64url");

const statesOf = (statuses: readonly string[]): AppointmentState[] =>
  appointmentStates.filter((state) => statuses.includes(stateFacts[state].fhir));

function conditions(q: FhirQuery, after: Place | null): SQL {
  const parts: SQL[] = [];
  if (q.from !== null) parts.push(sql`a.starts_at >= ${sqlTime(new Date(q.from))}`);
  if (q.to !== null) parts.push(sql`a.starts_at < ${sqlTime(new Date(q.to))}`);
  if (q.statuses !== null) parts.push(sql`a.state in (${list(statesOf(q.statuses))})`);
  if (after !== null) {
    const { start, end, id } = after;
    parts.push(sql`a.starts_at >= ${start} and (a.starts_at > ${start} or a.ends_at > ${end}
      or (a.ends_at = ${end} and a.id > ${id}))`);
  }
  return parts.length === 0 ? sql`1 = 1` : sql.join(parts, sql` and `);
}

const inOrder = (a: Row, b: Row): number =>
  utc(a.starts_at) - utc(b.starts_at) || utc(a.ends_at) - utc(b.ends_at) || (a.id < b.id ? -1 : 1);

async function siteIdsOf(ctx: KeyContext): Promise<string[]> {
  const rows = await rowsOf<{ id: string }>(
    ctx.db,
    sql`select id from sites where practice_id = ${ctx.practiceId}`,
  );
  return rows.map((row) => row.id);
}

/**
 * One page of visits in the order of their start. Each therapist asked for, or else each site, is read by its own
 * index in that order and only as far as the page goes, so a page costs the same at any size of the diary.
 */
export async function searchAppointments(ctx: KeyContext, q: FhirQuery) {
  if (q.statuses !== null && statesOf(q.statuses).length === 0) return { resources: [], after: null };
  const rest = conditions(q, q.after === null ? null : placeOf(q.after));
  const at = q.locations === null ? sql`1 = 1` : sql`a.site_id in (${list(q.locations)})`;
  const lanes =
    q.practitioners !== null
      ? q.practitioners.map((id) => sql`a.therapist_id = ${id} and ${at}`)
      : (q.locations ?? (await siteIdsOf(ctx))).map((id) => sql`a.site_id = ${id}`);
  const read = await Promise.all(lanes.map((lane) => readRows(ctx, sql`${lane} and ${rest}`, q.count + 1)));
  const rows = read.flat().sort(inOrder);
  const page = rows.slice(0, q.count);
  const last = page.at(-1);
  return {
    resources: page.map((row) => appointmentResource(factsOf(row))),
    after: rows.length > page.length && last ? afterOf(last) : null,
  };
}

export async function readAppointmentResource(ctx: KeyContext, id: string) {
  if (!isId(id)) return null;
  const [row] = await readRows(ctx, sql`a.id = ${id}`, 1);
  return row ? appointmentResource(factsOf(row)) : null;
}
