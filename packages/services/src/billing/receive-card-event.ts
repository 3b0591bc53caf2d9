import type { CardEvent } from "@withy/billing/card/card-gateway";
import { AppError } from "@withy/core/errors";
import { isId } from "@withy/core/ids";
import { isDuplicate } from "@withy/db/database-error";
import { cardAttempts, cardEvents } from "@withy/db/schema";
import { eq, or } from "drizzle-orm";
import type { SystemContext } from "../context";
import { inTransaction } from "../transaction";
import { cardGateway } from "./card-gateway";
import { settleCardPayment } from "./end-card-payment";

/**
 * Takes an event of the card provider. Its signature is checked, then the provider is asked for the state: the event
 * says when to look, never what is true, so repeats and wrong order do no harm. The event's id is kept with what it
 * caused; a repeat is answered without effect.
 * @throws AppError "invalid" where the signature is wrong
 */
export async function receiveCardEvent(
  ctx: SystemContext,
  rawBody: string,
  signature: string,
): Promise<void> {
  const event = cardGateway().readEvent(rawBody, signature);
  if (!event)
    throw new AppError("invalid", "This event is not signed with our secret.", { kind: "bad-signature" });
  if (await isKnown(ctx, event)) return;
  const report = event.checkoutId === null ? null : await cardGateway().getCheckout(event.checkoutId);
  const attempt = report === null ? null : await findAttempt(ctx, report.checkoutId, report.reference);
  try {
    await inTransaction(ctx, async (tx) => {
      await tx.db.insert(cardEvents).values({
        id: event.eventId,
        kind: event.kind,
        receivedAt: tx.clock.now(),
        detail: { cardPaymentId: attempt?.id ?? null, status: report?.status ?? null },
      });
      if (attempt && report) await settleCardPayment(tx, attempt, report);
    });
  } catch (error) {
    if (!isDuplicate(error, "PRIMARY") || !(await isKnown(ctx, event))) throw error;
  }
}

async function isKnown(ctx: SystemContext, event: CardEvent): Promise<boolean> {
  const rows = await ctx.db
    .select({ id: cardEvents.id })
    .from(cardEvents)
    .where(eq(cardEvents.id, event.eventId));
  return rows.length > 0;
}

/** By our own id where the event is quicker than the answer that names the session. */
async function findAttempt(ctx: SystemContext, checkoutId: string, reference: string | null) {
  const bySession = eq(cardAttempts.sessionReference, checkoutId);
  const [row] = await ctx.db
    .select({ practiceId: cardAttempts.practiceId, id: cardAttempts.id })
    .from(cardAttempts)
    .where(reference !== null && isId(reference) ? or(bySession, eq(cardAttempts.id, reference)) : bySession)
    .limit(1);
  return row ?? null;
}
