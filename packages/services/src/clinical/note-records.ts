import type { Permission } from "@withy/core/access/permissions";
import { notFound } from "@withy/core/errors";
import { appointments, episodes, notes, sites, staffMembers } from "@withy/db/schema";
import { and, eq, sql } from "drizzle-orm";
import type { Context } from "../context";
import { requireClinicalReach } from "./clinical-reach";

export type NoteRow = typeof notes.$inferSelect;

export interface NoteAtHand {
  readonly note: NoteRow;
  readonly episode: typeof episodes.$inferSelect;
  readonly authorName: string;
  readonly visitEndsAt: Date | null;
  readonly siteId: string;
  readonly siteName: string;
  readonly zone: string;
}

/**
 * One note with its episode, author and the site of its visit, within reach; or "not found".
 * @param options.lock take the note's row first, for a write
 */
export async function loadNote(
  ctx: Context,
  permission: Permission,
  noteId: string,
  options: { lock?: boolean } = {},
): Promise<NoteAtHand> {
  if (options.lock) await lockNote(ctx, noteId);
  const [row] = await ctx.db
    .select({ note: notes, episode: episodes, author: staffMembers, appointment: appointments, site: sites })
    .from(notes)
    .innerJoin(episodes, and(eq(episodes.practiceId, notes.practiceId), eq(episodes.id, notes.episodeId)))
    .innerJoin(
      staffMembers,
      and(eq(staffMembers.practiceId, notes.practiceId), eq(staffMembers.id, notes.authorId)),
    )
    .leftJoin(
      appointments,
      and(eq(appointments.practiceId, notes.practiceId), eq(appointments.id, notes.appointmentId)),
    )
    .innerJoin(
      sites,
      and(
        eq(sites.practiceId, notes.practiceId),
        eq(sites.id, sql`coalesce(${appointments.siteId}, ${episodes.siteId})`),
      ),
    )
    .where(and(eq(notes.practiceId, ctx.practiceId), eq(notes.id, noteId)))
    .limit(1);
  if (!row) throw notFound("note");
  requireClinicalReach(ctx, permission, [row.episode.siteId, row.site.id], "note");
  return {
    note: row.note,
    episode: row.episode,
    authorName: `${row.author.givenName} ${row.author.familyName}`,
    visitEndsAt: row.appointment?.endsAt ?? null,
    siteId: row.site.id,
    siteName: row.site.name,
    zone: row.site.zone,
  };
}

async function lockNote(ctx: Context, noteId: string): Promise<void> {
  await ctx.db
    .select({ id: notes.id })
    .from(notes)
    .where(and(eq(notes.practiceId, ctx.practiceId), eq(notes.id, noteId)))
    .for("update");
}
