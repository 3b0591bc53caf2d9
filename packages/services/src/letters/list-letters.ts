import { type LetterRow, listLettersInput } from "@withy/contracts/letters";
import type { Page } from "@withy/contracts/page";
import { sitesWith } from "@withy/core/access/can";
import {
  episodes,
  letterDeliveries,
  letters,
  outboxMessages,
  patients,
  staffMembers,
} from "@withy/db/schema";
import { and, count, desc, eq, inArray, type SQL } from "drizzle-orm";
import { recordAudit } from "../audit";
import type { Context } from "../context";
import { verb } from "../verb";
import { letterTitles } from "./letter-records";

type Sent = { state: string | null; channel: "email" | "print"; isOpened: boolean };

/** Where a letter stands, by its drafts and sendings; the best of several sendings counts, a failed one alone is told. */
export function standingOf(
  state: "draft" | "signed",
  sent: readonly Sent[],
): { standing: string; needsAttention: boolean } {
  if (state === "draft") return { standing: "Draft", needsAttention: false };
  if (sent.length === 0) return { standing: "Signed, not sent", needsAttention: true };
  if (sent.some((one) => one.isOpened)) return { standing: "Opened", needsAttention: false };
  if (sent.some((one) => one.state === "sent")) return { standing: "Sent", needsAttention: false };
  if (sent.some((one) => one.channel === "print")) return { standing: "Posted", needsAttention: false };
  if (sent.some((one) => one.state === "waiting" || one.state === "claimed"))
    return { standing: "Waiting to go", needsAttention: false };
  return { standing: "Not sent", needsAttention: true };
}

async function sendingsOf(ctx: Context, letterIds: readonly string[]): Promise<Map<string, Sent[]>> {
  const byLetter = new Map<string, Sent[]>();
  if (letterIds.length === 0) return byLetter;
  const rows = await ctx.db
    .select({
      letterId: letterDeliveries.letterId,
      channel: letterDeliveries.channel,
      openedAt: letterDeliveries.firstOpenedAt,
      state: outboxMessages.state,
    })
    .from(letterDeliveries)
    .leftJoin(outboxMessages, eq(outboxMessages.id, letterDeliveries.outboxMessageId))
    .where(
      and(
        eq(letterDeliveries.practiceId, ctx.practiceId),
        inArray(letterDeliveries.letterId, [...letterIds]),
      ),
    );
  for (const row of rows) {
    const sent = { state: row.state, channel: row.channel, isOpened: row.openedAt !== null };
    byLetter.set(row.letterId, [...(byLetter.get(row.letterId) ?? []), sent]);
  }
  return byLetter;
}

/** Letters of the sites that this person may read, newest first. */
export const listLetters = verb(
  "letters.read",
  listLettersInput,
  async (ctx, input): Promise<Page<LetterRow>> => {
    const sites = sitesWith(ctx.roles, "letters.read");
    const conditions: (SQL | undefined)[] = [
      eq(letters.practiceId, ctx.practiceId),
      input.state === "all" ? undefined : eq(letters.state, input.state),
      input.patientId === undefined ? undefined : eq(letters.patientId, input.patientId),
      sites === "all" ? undefined : inArray(episodes.siteId, sites),
    ];
    const episodeOf = and(eq(episodes.practiceId, letters.practiceId), eq(episodes.id, letters.episodeId));
    const [counted] = await ctx.db
      .select({ total: count() })
      .from(letters)
      .innerJoin(episodes, episodeOf)
      .where(and(...conditions));
    const rows = await ctx.db
      .select({ letter: letters, patient: patients, author: staffMembers })
      .from(letters)
      .innerJoin(episodes, episodeOf)
      .innerJoin(
        patients,
        and(eq(patients.practiceId, letters.practiceId), eq(patients.id, letters.patientId)),
      )
      .innerJoin(
        staffMembers,
        and(eq(staffMembers.practiceId, letters.practiceId), eq(staffMembers.id, letters.authorId)),
      )
      .where(and(...conditions))
      .orderBy(desc(letters.createdAt), desc(letters.id))
      .limit(input.pageSize)
      .offset((input.page - 1) * input.pageSize);
    const sendings = await sendingsOf(
      ctx,
      rows.map((row) => row.letter.id),
    );
    if (input.patientId !== undefined) await auditList(ctx, input.patientId, rows.length);
    return {
      rows: rows.map(({ letter, patient, author }) => ({
        id: letter.id,
        reference: letter.reference,
        title: letterTitles[letter.kind],
        state: letter.state,
        patientId: patient.id,
        patientName: `${patient.givenName} ${patient.familyName}`,
        recipientName: letter.recipient.name,
        authorName: `${author.givenName} ${author.familyName}`,
        updatedAt: letter.updatedAt.toISOString(),
        signedAt: letter.signedAt?.toISOString() ?? null,
        ...standingOf(letter.state, sendings.get(letter.id) ?? []),
      })),
      page: input.page,
      pageSize: input.pageSize,
      total: counted?.total ?? 0,
    };
  },
);

async function auditList(ctx: Context, patientId: string, found: number): Promise<void> {
  await recordAudit(ctx, {
    action: "letters.listed",
    subjectKind: "patient",
    subjectId: patientId,
    patientId,
    detail: { found },
  });
}
