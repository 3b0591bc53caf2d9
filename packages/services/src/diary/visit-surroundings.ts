import type { VisitMention } from "@withy/contracts/diary";
import { dayOf, timeOf } from "@withy/core/zoned-time";
import { type AppointmentState, canUndo, isAppointmentState } from "@withy/diary/appointment-states";
import { type SQL, sql } from "drizzle-orm";
import type { Context } from "../context";
import { rowsOf, utc } from "./raw-rows";
import type { VisitRow } from "./visit-row";

/** What lies around a visit: alerts, the visits before and after, what is owed, what was last done and hangs on it. */
export interface Surroundings {
  readonly alerts: readonly string[];
  readonly owesPence: number;
  readonly previousVisit: VisitMention | null;
  readonly nextVisit: VisitMention | null;
  readonly undo: Undo | null;
}

/** The change that "undo" would take back. */
export interface Undo {
  readonly changeId: string;
  readonly to: AppointmentState;
  /** What depends on the present state and forbids it, in words; null where nothing does. */
  readonly dependsOn: string | null;
}

interface Fact {
  kind: "alert" | "owes" | "previous" | "next" | "change" | "note" | "line";
  id: string | null;
  text: string | null;
  at: string | null;
  state: string | null;
  pence: number | string | null;
}

const neighbour = (practiceId: string, row: VisitRow, kind: "previous" | "next"): SQL => {
  const [compare, order] = kind === "previous" ? [sql`<`, sql`desc`] : [sql`>`, sql`asc`];
  return sql`(select ${kind} as kind, a.id, concat(t.given_name, ' ', t.family_name) as text, a.starts_at as at, a.state, null as pence
    from appointments a join staff_members t on t.practice_id = a.practice_id and t.id = a.therapist_id
    where a.practice_id = ${practiceId} and a.patient_id = ${row.patient_id} and a.starts_at ${compare} ${row.starts_at}
      and a.state <> 'cancelled' order by a.starts_at ${order} limit 1)`;
};

function factsSql(practiceId: string, row: VisitRow): SQL {
  return sql`${neighbour(practiceId, row, "previous")} union all ${neighbour(practiceId, row, "next")}
    union all (select 'alert', l.id, l.text, null, null, null from patient_alerts l
      where l.practice_id = ${practiceId} and l.patient_id = ${row.patient_id} and l.resolved_at is null and l.is_clinical = 0)
    union all (select 'owes', null, null, null, null, coalesce(sum(i.total_pence - i.paid_pence - i.credited_pence), 0) from invoices i
      where i.practice_id = ${practiceId} and i.patient_id = ${row.patient_id} and i.payer_id is null and i.state in ('issued', 'part-paid'))
    union all (select 'change', c.id, json_value(c.before, '$.state'), c.changed_at, json_value(c.after, '$.state'), null from appointment_changes c
      where c.practice_id = ${practiceId} and c.appointment_id = ${row.id} and c.kind in ('marked', 'cancelled') and c.undone_at is null
      order by c.changed_at desc, c.id desc limit 1)
    union all (select 'note', n.id, n.state, null, null, null from notes n
      where n.practice_id = ${practiceId} and n.appointment_id = ${row.id})
    union all (select 'line', i.id, i.state, null, null, null from invoice_lines l join invoices i on i.practice_id = l.practice_id and i.id = l.invoice_id
      where l.practice_id = ${practiceId} and l.appointment_id = ${row.id} and i.state <> 'void' limit 1)`;
}

function mention(fact: Fact | undefined, zone: string): VisitMention | null {
  if (!fact?.id || !fact.at || !fact.state || !isAppointmentState(fact.state)) return null;
  const at = new Date(utc(fact.at));
  return {
    id: fact.id,
    day: dayOf(at, zone),
    startTime: timeOf(at, zone),
    state: fact.state,
    therapistName: fact.text ?? "",
  };
}

function dependsOn(facts: readonly Fact[], state: AppointmentState): string | null {
  const isSeen = state === "fulfilled" || state === "in-session";
  if (isSeen && facts.some((f) => f.kind === "note" && f.text === "signed")) return "its note is signed";
  if (facts.some((f) => f.kind === "line")) return "it stands on an invoice";
  return null;
}

function undoOf(facts: readonly Fact[], row: VisitRow): Undo | null {
  const change = facts.find((f) => f.kind === "change");
  if (!change?.id || !change.text || change.state !== row.state || !isAppointmentState(change.text))
    return null;
  if (!canUndo(row.state, change.text)) return null;
  return { changeId: change.id, to: change.text, dependsOn: dependsOn(facts, row.state) };
}

export async function readSurroundings(ctx: Context, row: VisitRow): Promise<Surroundings> {
  const facts = await rowsOf<Fact>(ctx.db, factsSql(ctx.practiceId, row));
  const one = (kind: Fact["kind"]): Fact | undefined => facts.find((f) => f.kind === kind);
  return {
    alerts: facts.flatMap((f) => (f.kind === "alert" && f.text ? [f.text] : [])),
    owesPence: Number(one("owes")?.pence ?? 0),
    previousVisit: mention(one("previous"), row.zone),
    nextVisit: mention(one("next"), row.zone),
    undo: undoOf(facts, row),
  };
}
