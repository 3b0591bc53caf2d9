import type { OfferRoundView } from "@withy/contracts/diary";
import { weekdayDate } from "@withy/core/date-words";
import { dayOf, timeOf } from "@withy/core/zoned-time";
import type { OfferState, RoundState } from "@withy/diary/waiting-words";
import { type SQL, sql } from "drizzle-orm";
import type { Context } from "../context";
import { isoOf, rowsOf, sqlTime, utc } from "./raw-rows";

interface RoundRow {
  id: string;
  version: number;
  state: RoundState;
  site_id: string;
  site_name: string;
  zone: string;
  therapist_name: string;
  starts_at: string;
  ends_at: string;
  created_at: string;
  by_name: string;
  expires_at: string;
  appointment_id: string | null;
}

interface OfferRow {
  id: string;
  round_id: string;
  rank: number;
  patient_id: string;
  patient_name: string;
  phone: string | null;
  service_name: string;
  state: OfferState;
  decided_at: string | null;
  message: "waiting" | "claimed" | "sent" | "failed" | "dropped" | null;
}

export type RoundScope = { readonly roundId: string } | { readonly siteIds: readonly string[] };

/** Rounds that have ended stay in sight for two days. */
const shownDays = 2;
const most = 20;

const list = (values: readonly string[]): SQL =>
  sql.join(
    values.map((v) => sql`${v}`),
    sql`, `,
  );

function roundsSql(ctx: Context, scope: RoundScope): SQL {
  const since = new Date(ctx.clock.now().getTime() - shownDays * 86_400_000);
  const where =
    "roundId" in scope
      ? sql`r.id = ${scope.roundId}`
      : sql`r.site_id in (${list(scope.siteIds)}) and (r.state = 'open' or r.created_at > ${sqlTime(since)})`;
  return sql`
    select r.id, r.version, r.state, r.site_id, s.name as site_name, s.zone,
      concat(t.given_name, ' ', t.family_name) as therapist_name, r.starts_at, r.ends_at, r.created_at,
      concat(m.given_name, ' ', m.family_name) as by_name, r.expires_at, r.appointment_id
    from offer_rounds r
      join sites s on s.practice_id = r.practice_id and s.id = r.site_id
      join staff_members t on t.practice_id = r.practice_id and t.id = r.therapist_id
      join staff_members m on m.practice_id = r.practice_id and m.id = r.created_by
    where r.practice_id = ${ctx.practiceId} and ${where}
    order by (r.state = 'open') desc, r.created_at desc limit ${most}`;
}

function offersSql(ctx: Context, roundIds: readonly string[]): SQL {
  return sql`
    select o.id, o.round_id, o.rank, p.id as patient_id, concat(p.given_name, ' ', p.family_name) as patient_name,
      p.phone, v.name as service_name, o.state, o.decided_at,
      (select b.state from outbox_messages b where b.practice_id = o.practice_id and b.about_kind = 'waiting-offer'
        and b.about_id = o.id and b.template = 'offer-made' order by b.created_at desc limit 1) as message
    from waiting_offers o
      join waiting_entries e on e.practice_id = o.practice_id and e.id = o.entry_id
      join patients p on p.practice_id = e.practice_id and p.id = e.patient_id
      join services v on v.practice_id = e.practice_id and v.id = e.service_id
    where o.practice_id = ${ctx.practiceId} and o.round_id in (${list(roundIds)}) order by o.rank`;
}

function viewOf(row: RoundRow, offers: readonly OfferRow[], now: Date): OfferRoundView {
  const { zone } = row;
  const at = (text: string): Date => new Date(utc(text));
  const clock = (text: string): string => timeOf(at(text), zone);
  const expiresOn = dayOf(at(row.expires_at), zone);
  const isToday = expiresOn === dayOf(now, zone);
  // The worker writes an end down within seconds; on screen it holds from the moment itself.
  const isOver = row.state === "open" && utc(row.expires_at) <= now.getTime();
  return {
    id: row.id,
    version: row.version,
    state: isOver ? "expired" : row.state,
    site: { id: row.site_id, name: row.site_name },
    therapistName: row.therapist_name,
    startsAt: isoOf(row.starts_at),
    day: dayOf(at(row.starts_at), zone),
    startTime: clock(row.starts_at),
    endTime: clock(row.ends_at),
    createdAt: isoOf(row.created_at),
    byName: row.by_name,
    expiresAt: isoOf(row.expires_at),
    expiresTime: isToday ? clock(row.expires_at) : `${weekdayDate(expiresOn)} ${clock(row.expires_at)}`,
    appointmentId: row.appointment_id,
    offers: offers.map((o) => ({
      id: o.id,
      rank: o.rank,
      patientId: o.patient_id,
      patientName: o.patient_name,
      phone: o.phone,
      serviceName: o.service_name,
      state: isOver && o.state === "open" ? "expired" : o.state,
      decidedTime: o.decided_at === null ? null : clock(o.decided_at),
      message: o.message === "claimed" ? "waiting" : o.message,
    })),
  };
}

/** Rounds with each person's state: those that are open first, then what ended lately. */
export async function readRounds(ctx: Context, scope: RoundScope): Promise<OfferRoundView[]> {
  if ("siteIds" in scope && scope.siteIds.length === 0) return [];
  const rounds = await rowsOf<RoundRow>(ctx.db, roundsSql(ctx, scope));
  if (rounds.length === 0) return [];
  const offers = await rowsOf<OfferRow>(
    ctx.db,
    offersSql(
      ctx,
      rounds.map((round) => round.id),
    ),
  );
  const now = ctx.clock.now();
  return rounds.map((round) =>
    viewOf(
      round,
      offers.filter((offer) => offer.round_id === round.id),
      now,
    ),
  );
}
