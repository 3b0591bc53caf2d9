import type { MailGateway } from "@withy/gateways/mail";
import type { SystemContext } from "../context";
import { claimMessages, type OutboxRow, releaseLostMessages } from "./claim-messages";
import type { PostOffice } from "./message-renderer";
import { loadSender } from "./message-sender";
import { renderMessage } from "./render-message";
import { type Settlement, settleMessage } from "./settle-message";

export interface DrainOptions extends PostOffice {
  readonly workerId: string;
  readonly mail: MailGateway;
  /** The address that every mail comes from; the practice's own stands in reply-to. */
  readonly fromAddress: string;
  readonly batch?: number;
  /** Told of bugs, without personal data. */
  readonly onFault?: (fault: { messageId: string; template: string; error: unknown }) => void;
}

async function sendOne(ctx: SystemContext, row: OutboxRow, options: DrainOptions): Promise<Settlement> {
  const rendered = await renderMessage(ctx, row, options);
  if (!rendered) return { outcome: "dropped", reason: "superseded" };
  const sender = await loadSender(ctx, row.practiceId);
  return options.mail.send({
    id: row.id,
    from: { name: sender.practice, address: options.fromAddress },
    replyTo: sender.email,
    to: row.toAddress,
    ...rendered,
  });
}

/**
 * Sends one batch of due messages, each at least once: a worker killed after the mail went and before it was marked
 * sends again with the same Message-ID. Returns how many were claimed, so that the caller can go on while there is more.
 */
export async function drainOutbox(ctx: SystemContext, options: DrainOptions): Promise<number> {
  await releaseLostMessages(ctx);
  const rows = await claimMessages(ctx, options.workerId, options.batch ?? 20);
  for (const row of rows) {
    let settlement: Settlement;
    try {
      settlement = await sendOne(ctx, row, options);
    } catch (error) {
      options.onFault?.({ messageId: row.id, template: row.template, error });
      settlement = { outcome: "try-later", reason: "fault" };
    }
    await settleMessage(ctx, row, settlement);
  }
  return rows.length;
}
