import { newId } from "@withy/core/ids";
import { outboxMessages } from "@withy/db/schema";
import { sql } from "drizzle-orm";
import type { SystemContext } from "../context";

export interface OutgoingMessage {
  template: string;
  toAddress: string;
  /** What the template needs, checked by its own contract when it is rendered. No clinical text. */
  payload: Record<string, unknown>;
  /** The row that it speaks of, looked at again before it is sent. */
  aboutKind: string;
  aboutId: string;
  patientId?: string | null;
  /** Same key, same message: a repeated cause does not send twice. */
  dedupeKey: string;
  dueAt?: Date;
}

/** Writes one message to the outbox with the caller's transaction. Returns its id, also of an earlier one with the key. */
export async function enqueueMessage(
  ctx: SystemContext & { readonly practiceId: string },
  message: OutgoingMessage,
): Promise<string> {
  const now = ctx.clock.now();
  const id = newId();
  await ctx.db
    .insert(outboxMessages)
    .values({
      id,
      practiceId: ctx.practiceId,
      channel: "email",
      template: message.template,
      toAddress: message.toAddress,
      payload: message.payload,
      aboutKind: message.aboutKind,
      aboutId: message.aboutId,
      patientId: message.patientId ?? null,
      dedupeKey: message.dedupeKey,
      dueAt: message.dueAt ?? now,
      createdAt: now,
    })
    .onDuplicateKeyUpdate({ set: { dedupeKey: sql`dedupe_key` } });
  const [row] = await ctx.db
    .select({ id: outboxMessages.id })
    .from(outboxMessages)
    .where(
      sql`${outboxMessages.practiceId} = ${ctx.practiceId} and ${outboxMessages.dedupeKey} = ${message.dedupeKey}`,
    )
    .limit(1);
  return row?.id ?? id;
}
