import { newId } from "@withy/core/ids";
import { isDuplicate } from "@withy/db/database-error";
import { outboxMessages } from "@withy/db/schema";
import { and, eq } from "drizzle-orm";
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

type Sender = SystemContext & { readonly practiceId: string };

/** The statement that writes one message to the outbox, to run with others; it fails where its key was used before. */
export function messageWrite(ctx: Sender, message: OutgoingMessage, id: string = newId()) {
  const now = ctx.clock.now();
  const { template, toAddress, payload, aboutKind, aboutId, patientId = null, dedupeKey } = message;
  const row = { template, toAddress, payload, aboutKind, aboutId, patientId, dedupeKey };
  const dueAt = message.dueAt ?? now;
  return ctx.db
    .insert(outboxMessages)
    .values({ id, practiceId: ctx.practiceId, channel: "email", ...row, dueAt, createdAt: now });
}

/** Writes one message to the outbox with the caller's transaction. Returns its id, also of an earlier one with the key. */
export async function enqueueMessage(ctx: Sender, message: OutgoingMessage): Promise<string> {
  const id = newId();
  const { dedupeKey } = message;
  try {
    await messageWrite(ctx, message, id);
    return id;
  } catch (error) {
    if (!isDuplicate(error, "outbox_messages_once")) throw error;
    const [earlier] = await ctx.db
      .select({ id: outboxMessages.id })
      .from(outboxMessages)
      .where(and(eq(outboxMessages.practiceId, ctx.practiceId), eq(outboxMessages.dedupeKey, dedupeKey)))
      .limit(1);
    if (!earlier) throw error;
    return earlier.id;
  }
}
