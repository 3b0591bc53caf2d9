import { offerRounds, practices } from "@withy/db/schema";
import { and, asc, eq, inArray, lte, sql } from "drizzle-orm";
import type { SystemContext } from "../context";
import { inTransaction } from "../transaction";
import { endRound, lockRound, type RoundRow } from "./offer-round";
import { rowsOf, sqlTime } from "./raw-rows";

const atOnce = 20;

/** Each round is ended in a transaction of its own: after a crash it is open still, or ended with its messages. */
async function endIf(
  ctx: SystemContext,
  round: Pick<RoundRow, "id" | "practiceId">,
  state: "expired" | "stopped",
  cause: string,
  isDue: (held: RoundRow) => boolean,
): Promise<boolean> {
  return inTransaction({ ...ctx, practiceId: round.practiceId }, async (tx) => {
    const held = await lockRound(tx, round.id);
    return held.state === "open" && isDue(held) && (await endRound(tx, held, { state }, { cause }));
  });
}

/** Every practice is asked for by its own end of the index; there are few. */
async function overdue(ctx: SystemContext): Promise<RoundRow[]> {
  const ids = await ctx.db.select({ id: practices.id }).from(practices);
  if (ids.length === 0) return [];
  return ctx.db
    .select()
    .from(offerRounds)
    .where(
      and(
        inArray(
          offerRounds.practiceId,
          ids.map(({ id }) => id),
        ),
        eq(offerRounds.state, "open"),
        lte(offerRounds.expiresAt, ctx.clock.now()),
      ),
    )
    .orderBy(asc(offerRounds.expiresAt))
    .limit(atOnce);
}

/** Open rounds whose time a desk, a class or a block has taken, so that nobody who was asked hopes in vain. */
function takenElsewhere(ctx: SystemContext): Promise<{ id: string; practiceId: string }[]> {
  return rowsOf(
    ctx.db,
    sql`select r.id, r.practice_id as practiceId from offer_rounds r
      where r.practice_id in (select x.id from practices x) and r.state = 'open'
        and r.expires_at > ${sqlTime(ctx.clock.now())} and exists (select 1 from diary_claims c
          where c.practice_id = r.practice_id and c.resource_id = r.therapist_id and c.slot_at = r.starts_at
            and not exists (select 1 from waiting_offers o join waiting_entries e
              on e.practice_id = o.practice_id and e.id = o.entry_id where o.practice_id = r.practice_id
                and o.round_id = r.id and o.state = 'open' and e.instead_of_id = c.appointment_id))
      limit ${atOnce}`,
  );
}

/**
 * Ends the rounds whose hour has come, and those whose time has been booked by other hands. Two workers at once, or one
 * that was killed, do each once: the round's row decides. @returns how many it ended
 */
export async function settleOffers(ctx: SystemContext): Promise<number> {
  let ended = 0;
  for (const round of await overdue(ctx)) {
    const isDue = (held: RoundRow): boolean => held.expiresAt <= ctx.clock.now();
    if (await endIf(ctx, round, "expired", "time is over", isDue)) ended += 1;
  }
  for (const round of await takenElsewhere(ctx))
    if (await endIf(ctx, round, "stopped", "booked otherwise", () => true)) ended += 1;
  return ended;
}
