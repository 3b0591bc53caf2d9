import { type LetterLinkView, letterTokenInput } from "@withy/contracts/letters";
import { notFound } from "@withy/core/errors";
import { dayOf } from "@withy/core/zoned-time";
import { letterDeliveries } from "@withy/db/schema";
import { and, eq, sql } from "drizzle-orm";
import { recordAudit } from "../audit";
import type { SystemContext } from "../context";
import { loadSender } from "../messaging/message-sender";
import { inTransaction } from "../transaction";
import { checkReader } from "./check-reader";
import { hashLetterToken } from "./letter-token";
import { findLinkedLetter, type LinkedLetter, type RenderedLetter, renderLetter } from "./printed-letter";

async function findByToken(ctx: SystemContext, token: string): Promise<LinkedLetter> {
  const parsed = letterTokenInput.safeParse({ token });
  const linked = parsed.success ? await findLinkedLetter(ctx, hashLetterToken(token)) : null;
  if (!linked) throw notFound("letter");
  return linked;
}

/** What the private page says before the letter is opened: who wrote, nothing about whom. */
export async function getLetterLink(ctx: SystemContext, token: string): Promise<LetterLinkView> {
  const { delivery, letter, zone } = await findByToken(ctx, token);
  const sender = await loadSender(ctx, delivery.practiceId);
  return {
    practice: sender.practice,
    contactLines: sender.contactLines,
    reference: letter.reference,
    expiresOn: dayOf(delivery.expiresAt ?? ctx.clock.now(), zone),
  };
}

/** What a reader brings: the link, and the patient's date of birth as they typed it. */
export interface LetterReader {
  readonly token: string;
  readonly bornOn: string;
}

/**
 * Whether the letter would open for this reader; nothing of it is shown.
 * @throws not-found, invalid or refused "wrong-date" and "too-many-tries"
 */
export async function checkLetterReader(ctx: SystemContext, { token, bornOn }: LetterReader): Promise<void> {
  await checkReader(ctx, await findByToken(ctx, token), bornOn);
}

/**
 * Opens the letter for its reader and notes that it was opened. The date is asked for each time: a link that was
 * passed on or left in a mailbox opens nothing by itself.
 * @throws as `checkLetterReader`
 */
export async function openLinkedLetter(
  ctx: SystemContext,
  { token, bornOn }: LetterReader,
): Promise<RenderedLetter> {
  const linked = await findByToken(ctx, token);
  await checkReader(ctx, linked, bornOn);
  const { delivery, letter } = linked;
  const file = await renderLetter({ db: ctx.db, practiceId: delivery.practiceId }, letter);
  await inTransaction({ ...ctx, practiceId: delivery.practiceId }, async (tx) => {
    await tx.db
      .update(letterDeliveries)
      .set({
        firstOpenedAt: sql`coalesce(${letterDeliveries.firstOpenedAt}, ${tx.clock.now()})`,
        openedCount: sql`${letterDeliveries.openedCount} + 1`,
      })
      .where(and(eq(letterDeliveries.practiceId, delivery.practiceId), eq(letterDeliveries.id, delivery.id)));
    await recordAudit(tx, {
      action: "letter.opened",
      subjectKind: "letter",
      subjectId: letter.id,
      patientId: letter.patientId,
      detail: { deliveryId: delivery.id },
    });
  });
  return file;
}
