import { outboxMessages } from "@withy/db/schema";
import { and, eq } from "drizzle-orm";
import type { SystemContext } from "../context";
import type { OutboxRow } from "./claim-messages";
import { nextTry } from "./retry-schedule";

export type Settlement =
  | { readonly outcome: "sent" }
  | { readonly outcome: "dropped"; readonly reason: string }
  | { readonly outcome: "refused"; readonly reason: string }
  | { readonly outcome: "try-later"; readonly reason: string };

/** These messages carry a secret link, which is worth nothing to us once it has gone out. */
const carriesSecret = new Set(["password-reset", "staff-invitation", "letter-waiting", "offer-made"]);

function changesFor(row: OutboxRow, settlement: Settlement, now: Date): Partial<OutboxRow> {
  const free = { claimedAt: null, claimedBy: null };
  if (settlement.outcome === "sent") {
    const cleared = carriesSecret.has(row.template) ? { payload: {} } : {};
    return { ...free, ...cleared, state: "sent", sentAt: now, lastError: null };
  }
  const lastError = settlement.reason.slice(0, 200);
  if (settlement.outcome === "dropped") return { ...free, state: "dropped", lastError };
  const dueAt = settlement.outcome === "refused" ? null : nextTry(row.attempts, now);
  return dueAt === null
    ? { ...free, state: "failed", lastError }
    : { ...free, state: "waiting", dueAt, lastError };
}

/** Writes down what became of a claimed message; changes nothing where the claim has since been lost to another. */
export async function settleMessage(
  ctx: SystemContext,
  row: OutboxRow,
  settlement: Settlement,
): Promise<void> {
  await ctx.db
    .update(outboxMessages)
    .set(changesFor(row, settlement, ctx.clock.now()))
    .where(
      and(
        eq(outboxMessages.id, row.id),
        eq(outboxMessages.state, "claimed"),
        eq(outboxMessages.claimedBy, row.claimedBy ?? ""),
        eq(outboxMessages.attempts, row.attempts),
      ),
    );
}
