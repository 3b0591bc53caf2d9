import type { OfferTemplate } from "@withy/contracts/message-words";
import type { OfferMessagePayload } from "@withy/contracts/messaging";
import { formatPhone } from "@withy/core/identifiers/phone";
import type { offerRounds, waitingOffers } from "@withy/db/schema";
import { sql } from "drizzle-orm";
import type { SystemContext } from "../context";
import { enqueueMessage } from "../messaging/enqueue-message";
import { rowsOf } from "./raw-rows";

type RoundRow = typeof offerRounds.$inferSelect;
type Offer = Pick<typeof waitingOffers.$inferSelect, "id" | "entryId">;
type Sender = SystemContext & { readonly practiceId: string };

interface Words {
  entry_id: string;
  patient_id: string;
  email: string | null;
  greeting: string;
  minutes: number;
  therapist: string;
  site: string;
  address_lines: string[] | string;
  postcode: string;
  phone: string;
  zone: string;
}

function readWords(ctx: Sender, round: RoundRow, offers: readonly Offer[]): Promise<Words[]> {
  const ids = sql.join(
    offers.map((offer) => sql`${offer.entryId}`),
    sql`, `,
  );
  return rowsOf<Words>(
    ctx.db,
    sql`select e.id as entry_id, p.id as patient_id, p.email, coalesce(p.preferred_name, p.given_name) as greeting,
        v.duration_minutes as minutes, concat(t.given_name, ' ', t.family_name) as therapist,
        s.name as site, s.address_lines, s.postcode, s.phone, s.zone
      from waiting_entries e
        join patients p on p.practice_id = e.practice_id and p.id = e.patient_id
        join services v on v.practice_id = e.practice_id and v.id = e.service_id
        join staff_members t on t.practice_id = e.practice_id and t.id = ${round.therapistId}
        join sites s on s.practice_id = e.practice_id and s.id = ${round.siteId}
      where e.practice_id = ${ctx.practiceId} and e.id in (${ids})`,
  );
}

export function placeOf(row: Pick<Words, "site" | "address_lines" | "postcode">): string {
  const lines = (
    typeof row.address_lines === "string" ? JSON.parse(row.address_lines) : row.address_lines
  ) as string[];
  return [row.site, ...lines, row.postcode].join(", ");
}

function payloadOf(round: RoundRow, offer: Offer, row: Words, path: string | null): OfferMessagePayload {
  return {
    offerId: offer.id,
    startsAt: round.startsAt.toISOString(),
    endsAt: new Date(round.startsAt.getTime() + row.minutes * 60_000).toISOString(),
    expiresAt: round.expiresAt.toISOString(),
    zone: row.zone,
    place: placeOf(row),
    phone: formatPhone(row.phone),
    withWhom: `with ${row.therapist}`,
    greetingName: row.greeting,
    path,
  };
}

async function send(
  ctx: Sender,
  template: OfferTemplate,
  round: RoundRow,
  offers: readonly Offer[],
  pathOf: (offer: Offer) => string | null,
): Promise<void> {
  if (offers.length === 0) return;
  const words = new Map((await readWords(ctx, round, offers)).map((row) => [row.entry_id, row]));
  for (const offer of offers) {
    const row = words.get(offer.entryId);
    if (!row?.email) continue;
    await enqueueMessage(ctx, {
      template,
      toAddress: row.email,
      payload: payloadOf(round, offer, row, pathOf(offer)),
      aboutKind: "waiting-offer",
      aboutId: offer.id,
      patientId: row.patient_id,
      dedupeKey: `${template}/${offer.id}`,
    });
  }
}

/** Puts the private links into the outbox, in the caller's transaction. */
export function sendOffers(
  ctx: Sender,
  round: RoundRow,
  offers: readonly (Offer & { readonly token: string })[],
): Promise<void> {
  const tokens = new Map(offers.map((offer) => [offer.id, offer.token]));
  return send(ctx, "offer-made", round, offers, (offer) => `/link/${tokens.get(offer.id) ?? ""}/offer`);
}

/** Tells those who had not answered that the time has gone. */
export function sendOfferNotes(ctx: Sender, round: RoundRow, offers: readonly Offer[]): Promise<void> {
  return send(ctx, "offer-gone", round, offers, () => null);
}
