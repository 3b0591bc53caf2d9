import { recordAudit } from "../audit";
import type { Context } from "../context";
import type { LetterAtHand } from "./letter-records";

/** One audit row about a letter, in the caller's transaction. */
export async function auditLetter(
  ctx: Context,
  action: "read" | "drafted" | "saved" | "settled" | "signed" | "sent" | "printed",
  { letter, episode }: LetterAtHand,
  detail: Record<string, unknown> = {},
): Promise<void> {
  await recordAudit(ctx, {
    action: `letter.${action}`,
    subjectKind: "letter",
    subjectId: letter.id,
    patientId: letter.patientId,
    siteId: episode.siteId,
    detail,
  });
}
