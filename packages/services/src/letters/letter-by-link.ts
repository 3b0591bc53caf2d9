import { type LetterLinkView, letterTokenInput } from "@withy/contracts/letters";
import { notFound } from "@withy/core/errors";
import { dayOf } from "@withy/core/zoned-time";
import { letterDeliveries, practices } from "@withy/db/schema";
import { and, eq, sql } from "drizzle-orm";
import { recordAudit } from "../audit";
import type { SystemContext } from "../context";
import { loadSender } from "../messaging/message-sender";
import { inTransaction } from "../transaction";
import { hashLetterToken } from "./letter-token";
import { findLinkedLetter, type RenderedLetter, renderLetter } from "./printed-letter";

async function findByToken(ctx: SystemContext, token: string) {
  const parsed = letterTokenInput.safeParse({ token });
  const row = parsed.success ? await findLinkedLetter(ctx, hashLetterToken(token)) : null;
  if (!row) throw notFound("letter");
  return row;
}

/** What the private page says before the letter is opened: who wrote, nothing about whom. */
export async function getLetterLink(ctx: SystemContext, token: string): Promise<LetterLinkView> {
  const { delivery, letter } = await findByToken(ctx, token);
  const sender = await loadSender(ctx, delivery.practiceId);
  const [practice] = await ctx.db
    .select({ zone: practices.zone })
    .from(practices)
    .where(eq(practices.id, delivery.practiceId))
    .limit(1);
  return {
    practice: sender.practice,
    contactLines: sender.contactLines,
    reference: letter.reference,
    expiresOn: dayOf(delivery.expiresAt ?? ctx.clock.now(), practice?.zone ?? "Europe/London"),
  };
}

/** Opens the letter for its reader and notes that it was opened. A scanner that only follows links does not get here. */
export async function openLinkedLetter(ctx: SystemContext, token: string): Promise<RenderedLetter> {
  const { delivery, letter } = await findByToken(ctx, token);
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
      action: "letter.opened-by-link",
      subjectKind: "letter",
      subjectId: letter.id,
      patientId: letter.patientId,
      detail: { deliveryId: delivery.id },
    });
  });
  return file;
}
