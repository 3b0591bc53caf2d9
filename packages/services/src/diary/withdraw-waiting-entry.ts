import { withdrawWaitingEntryInput } from "@withy/contracts/diary";
import { waitingOffers } from "@withy/db/schema";
import { and, eq } from "drizzle-orm";
import type { Context } from "../context";
import { inTransaction } from "../transaction";
import { verb } from "../verb";
import { closeIfAnswered, lockRound } from "./offer-round";
import { auditEntry, saveEntry, takeEntry } from "./waiting-entry";

async function openRoundsOf(ctx: Context, entryId: string): Promise<string[]> {
  const rows = await ctx.db
    .select({ roundId: waitingOffers.roundId })
    .from(waitingOffers)
    .where(
      and(
        eq(waitingOffers.practiceId, ctx.practiceId),
        eq(waitingOffers.entryId, entryId),
        eq(waitingOffers.state, "open"),
      ),
    );
  return rows.map((row) => row.roundId).sort();
}

/** Takes someone off the list, and with them whatever was on offer to them. */
export const withdrawWaitingEntry = verb(
  "diary.book",
  withdrawWaitingEntryInput,
  async (ctx, input): Promise<{ entryId: string }> =>
    inTransaction(ctx, async (tx) => {
      // Rounds before entries, as an acceptance takes them.
      const roundIds = await openRoundsOf(tx, input.entryId);
      for (const id of roundIds) await lockRound(tx, id);
      const before = await takeEntry(tx, input);
      await saveEntry(tx, before, { state: "withdrawn" });
      await tx.db
        .update(waitingOffers)
        .set({ state: "stopped", decidedAt: tx.clock.now() })
        .where(
          and(
            eq(waitingOffers.practiceId, tx.practiceId),
            eq(waitingOffers.entryId, before.id),
            eq(waitingOffers.state, "open"),
          ),
        );
      for (const id of roundIds) await closeIfAnswered(tx, id);
      await auditEntry(tx, before, "withdrawn");
      return { entryId: before.id };
    }),
);
