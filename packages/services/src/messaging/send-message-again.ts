import { sendMessageAgainInput } from "@withy/contracts/messaging";
import { notFound, refused } from "@withy/core/errors";
import { newId } from "@withy/core/ids";
import { refusal } from "@withy/core/refusal";
import { outboxMessages, patients } from "@withy/db/schema";
import { and, eq } from "drizzle-orm";
import { recordAudit } from "../audit";
import type { Context } from "../context";
import { findRecord } from "../load-record";
import { once } from "../once";
import { verb } from "../verb";
import type { OutboxRow } from "./claim-messages";
import { enqueueMessage } from "./enqueue-message";
import { canSendAgain } from "./message-row";

async function loadMessage(ctx: Context, id: string): Promise<OutboxRow> {
  const [row] = await ctx.db
    .select()
    .from(outboxMessages)
    .where(and(eq(outboxMessages.practiceId, ctx.practiceId), eq(outboxMessages.id, id)))
    .limit(1)
    .for("update");
  if (!row) throw notFound("message");
  return row;
}

/** The patient's address of today, for a message that goes to the patient: the old one may be why it failed. */
async function addressOf(ctx: Context, row: OutboxRow): Promise<string> {
  if (row.patientId === null || row.aboutKind === "letter") return row.toAddress;
  const patient = await findRecord(ctx, patients, row.patientId);
  return patient?.email ?? row.toAddress;
}

/** A failed message starts over under its own id; one that went is sent as a new message. */
async function again(ctx: Context, row: OutboxRow, toAddress: string): Promise<string> {
  const now = ctx.clock.now();
  if (row.state === "failed") {
    await ctx.db
      .update(outboxMessages)
      .set({ state: "waiting", toAddress, attempts: 0, dueAt: now, lastError: null })
      .where(eq(outboxMessages.id, row.id));
    return row.id;
  }
  return enqueueMessage(ctx, {
    template: row.template,
    toAddress,
    payload: row.payload,
    aboutKind: row.aboutKind,
    aboutId: row.aboutId,
    patientId: row.patientId,
    dedupeKey: `again:${newId()}`,
  });
}

/** Sends a message once more. Whether what it says is still true is looked at again when it goes. */
export const sendMessageAgain = verb(
  "messaging.send",
  sendMessageAgainInput,
  async (ctx, input): Promise<{ messageId: string }> =>
    once(ctx, "message.send-again", async (tx) => {
      const row = await loadMessage(tx, input.messageId);
      if (!canSendAgain(row)) {
        throw refused(
          refusal(
            "cannot-repeat",
            "This message cannot be sent again from here. Make it anew where it came from: the letter, or the password page.",
          ),
        );
      }
      const messageId = await again(tx, row, await addressOf(tx, row));
      await recordAudit(tx, {
        action: "message.sent-again",
        subjectKind: "message",
        subjectId: row.id,
        patientId: row.patientId,
        detail: { template: row.template, from: row.state, messageId },
      });
      return { messageId };
    }),
);
