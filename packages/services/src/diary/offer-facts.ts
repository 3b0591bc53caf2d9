import type { AppointmentState } from "@withy/diary/appointment-states";
import { holdingStates, stateFacts } from "@withy/diary/appointment-states";
import { type OfferFacts, type OfferStanding, offerStanding } from "@withy/diary/offer-standing";
import type { OfferState, RoundState } from "@withy/diary/waiting-words";
import { sql } from "drizzle-orm";
import type { SystemContext } from "../context";
import { rowsOf, sqlTime, utc } from "./raw-rows";

/** An offer with everything that its page says and its answer needs. */
export interface LinkedOffer {
  readonly id: string;
  readonly practice_id: string;
  readonly round_id: string;
  readonly entry_id: string;
  readonly patient_id: string;
  readonly service_id: string;
  readonly site_id: string;
  readonly therapist_id: string;
  readonly offer_state: OfferState;
  readonly round_state: RoundState;
  readonly entry_state: OfferFacts["entry"];
  readonly starts_at: string;
  readonly expires_at: string;
  readonly created_by: string;
  readonly duration_minutes: number;
  readonly clean_down_minutes: number;
  readonly room_kind: string;
  readonly greeting: string;
  readonly therapist: string;
  readonly practice: string;
  readonly site: string;
  readonly address_lines: string[] | string;
  readonly postcode: string;
  readonly phone: string;
  readonly zone: string;
  readonly instead_of_id: string | null;
  readonly instead_of_at: string | null;
  readonly instead_of_state: AppointmentState | null;
}

/** The offer behind a token's hash; the hash is the only key that is looked for. */
export async function findLinkedOffer(ctx: SystemContext, hash: Buffer): Promise<LinkedOffer | null> {
  const [row] = await rowsOf<LinkedOffer>(
    ctx.db,
    sql`select o.id, o.practice_id, o.round_id, o.entry_id, o.state as offer_state, r.state as round_state,
        e.state as entry_state, e.patient_id, e.service_id, r.site_id, r.therapist_id, r.starts_at, r.expires_at,
        r.created_by, v.duration_minutes, v.clean_down_minutes, v.room_kind,
        coalesce(p.preferred_name, p.given_name) as greeting,
        concat(t.given_name, ' ', t.family_name) as therapist, x.name as practice,
        s.name as site, s.address_lines, s.postcode, s.phone, s.zone,
        i.id as instead_of_id, i.starts_at as instead_of_at, i.state as instead_of_state
      from waiting_offers o
        join offer_rounds r on r.practice_id = o.practice_id and r.id = o.round_id
        join waiting_entries e on e.practice_id = o.practice_id and e.id = o.entry_id
        join services v on v.practice_id = e.practice_id and v.id = e.service_id
        join patients p on p.practice_id = e.practice_id and p.id = e.patient_id
        join staff_members t on t.practice_id = r.practice_id and t.id = r.therapist_id
        join practices x on x.id = o.practice_id
        join sites s on s.practice_id = r.practice_id and s.id = r.site_id
        left join appointments i on i.practice_id = e.practice_id and i.id = e.instead_of_id
      where o.token_hash = ${hash}`,
  );
  return row ?? null;
}

/** The visit that an acceptance gives up: still to come and not begun. */
export function givenUpBy(offer: LinkedOffer, now: Date): string | null {
  const { instead_of_id: id, instead_of_at: at, instead_of_state: state } = offer;
  if (id === null || at === null || state === null || utc(at) <= now.getTime()) return null;
  return stateFacts[state].isOpen && (state === "booked" || state === "confirmed") ? id : null;
}

/** What the offer is worth now: what was written down about it, the clock, the claims and the patient's own diary. */
export async function standingOf(ctx: SystemContext, offer: LinkedOffer): Promise<OfferStanding> {
  const now = ctx.clock.now();
  const from = utc(offer.starts_at);
  const visitEnd = new Date(from + offer.duration_minutes * 60_000);
  const until = new Date(visitEnd.getTime() + offer.clean_down_minutes * 60_000);
  const givenUp = givenUpBy(offer, now);
  const [facts] = await rowsOf<{ is_taken: number; is_busy: number }>(
    ctx.db,
    sql`select exists (select 1 from diary_claims c where c.practice_id = ${offer.practice_id}
          and c.resource_id = ${offer.therapist_id} and c.slot_at >= ${sqlTime(new Date(from))}
          and c.slot_at < ${sqlTime(until)} and not (c.appointment_id <=> ${givenUp})) as is_taken,
        exists (select 1 from appointments a where a.practice_id = ${offer.practice_id}
          and a.patient_id = ${offer.patient_id} and a.starts_at > ${sqlTime(new Date(from - 86_400_000))}
          and a.starts_at < ${sqlTime(visitEnd)} and a.ends_at > ${sqlTime(new Date(from))}
          and a.state in (${sql.join(
            holdingStates.map((s) => sql`${s}`),
            sql`, `,
          )}) and not (a.id <=> ${givenUp})) as is_busy`,
  );
  return offerStanding({
    offer: offer.offer_state,
    round: offer.round_state,
    entry: offer.entry_state,
    expiresAt: new Date(utc(offer.expires_at)),
    now,
    isTimeFree: facts?.is_taken !== 1,
    isPatientFree: facts?.is_busy !== 1,
  });
}
