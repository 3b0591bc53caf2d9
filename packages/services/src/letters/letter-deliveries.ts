import type { LetterDeliveryView } from "@withy/contracts/letters";
import { messageProblem } from "@withy/contracts/messaging";
import { letterDeliveries, outboxMessages } from "@withy/db/schema";
import { and, desc, eq } from "drizzle-orm";
import type { Context } from "../context";

/** What was sent of a letter and what became of it, newest first. */
export async function listDeliveries(
  ctx: Pick<Context, "db" | "practiceId">,
  letterId: string,
): Promise<LetterDeliveryView[]> {
  const rows = await ctx.db
    .select({ delivery: letterDeliveries, message: outboxMessages })
    .from(letterDeliveries)
    .leftJoin(outboxMessages, eq(outboxMessages.id, letterDeliveries.outboxMessageId))
    .where(and(eq(letterDeliveries.practiceId, ctx.practiceId), eq(letterDeliveries.letterId, letterId)))
    .orderBy(desc(letterDeliveries.requestedAt), desc(letterDeliveries.id));
  return rows.map(({ delivery, message }) => ({
    id: delivery.id,
    channel: delivery.channel,
    toName: delivery.toName,
    toAddress: delivery.toAddress,
    requestedAt: delivery.requestedAt.toISOString(),
    state: message?.state ?? null,
    sentAt: message?.sentAt?.toISOString() ?? null,
    firstOpenedAt: delivery.firstOpenedAt?.toISOString() ?? null,
    problem: message?.lastError && message.state !== "sent" ? messageProblem(message.lastError) : null,
    expiresAt: delivery.expiresAt?.toISOString() ?? null,
  }));
}
