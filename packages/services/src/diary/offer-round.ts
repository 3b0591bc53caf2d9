import { offerRounds, waitingOffers } from "@withy/db/schema";
import { and, eq, sql } from "drizzle-orm";
import { recordAudit } from "../audit";
import type { SystemContext } from "../context";
import { loadRecord } from "../load-record";
import { sendOfferNotes } from "./send-offer-message";

/** Anyone who acts on a round: a person at a desk, the worker, or a patient behind a link. */
export type RoundActor = SystemContext & {
  readonly practiceId: string;
  readonly staffMemberId?: string | null;
};
export type RoundRow = typeof offerRounds.$inferSelect;

/** Takes a round for this transaction. All that decides a round begins here, so that one decision waits for the other. */
export function lockRound(ctx: RoundActor, roundId: string): Promise<RoundRow> {
  return loadRecord(ctx, offerRounds, roundId, "offer", { lock: true });
}

type Ending =
  | { readonly state: "taken"; readonly appointmentId: string }
  | { readonly state: "expired" | "stopped" };

/** What becomes of the offers that nobody has answered. */
const leftOver = { taken: "lost", expired: "expired", stopped: "stopped" } as const;

/**
 * Ends an open round once: writes its state, settles the offers that are still open, tells those people where the time
 * has gone, and records it. @returns false where it had ended already
 */
export async function endRound(
  ctx: RoundActor,
  round: RoundRow,
  ending: Ending,
  detail: Record<string, unknown> = {},
): Promise<boolean> {
  const now = ctx.clock.now();
  const isRound = and(eq(offerRounds.practiceId, round.practiceId), eq(offerRounds.id, round.id));
  const [result] = await ctx.db
    .update(offerRounds)
    .set({ ...ending, version: sql`${offerRounds.version} + 1` })
    .where(and(isRound, eq(offerRounds.state, "open")));
  if (result.affectedRows !== 1) return false;
  const isLeft = and(
    eq(waitingOffers.practiceId, round.practiceId),
    eq(waitingOffers.roundId, round.id),
    eq(waitingOffers.state, "open"),
  );
  const left = await ctx.db.select().from(waitingOffers).where(isLeft);
  await ctx.db.update(waitingOffers).set({ state: leftOver[ending.state], decidedAt: now }).where(isLeft);
  if (ending.state !== "expired") await sendOfferNotes(ctx, round, left);
  await recordAudit(ctx, {
    action: `offer-round.${ending.state}`,
    subjectKind: "offer-round",
    subjectId: round.id,
    siteId: round.siteId,
    detail: { ...detail, left: left.length },
  });
  return true;
}

/** A round in which everyone has said no, or is off the list, is over before its time. */
export async function closeIfAnswered(ctx: RoundActor, roundId: string): Promise<void> {
  const round = await lockRound(ctx, roundId);
  const [open] = await ctx.db
    .select({ id: waitingOffers.id })
    .from(waitingOffers)
    .where(
      and(
        eq(waitingOffers.practiceId, ctx.practiceId),
        eq(waitingOffers.roundId, roundId),
        eq(waitingOffers.state, "open"),
      ),
    )
    .limit(1);
  if (!open) await endRound(ctx, round, { state: "expired" }, { cause: "everyone answered" });
}
