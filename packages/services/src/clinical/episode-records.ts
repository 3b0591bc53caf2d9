import type { Permission } from "@withy/core/access/permissions";
import { notFound, stale } from "@withy/core/errors";
import { appointments, episodes, noteAddenda, notes, sites, staffMembers } from "@withy/db/schema";
import { and, asc, count, eq, sql } from "drizzle-orm";
import type { Context } from "../context";
import { loadRecord } from "../load-record";
import { requireClinicalReach } from "./clinical-reach";

export type EpisodeRow = typeof episodes.$inferSelect;

/** One episode that this person may reach, or "not found". */
export async function loadEpisode(
  ctx: Context,
  permission: Permission,
  episodeId: string,
  options: { lock?: boolean } = {},
): Promise<EpisodeRow> {
  const episode = await loadRecord(ctx, episodes, episodeId, "episode", options);
  requireClinicalReach(ctx, permission, [episode.siteId], "episode");
  return episode;
}

export function requireVersion(what: string, row: { version: number }, seen: number): void {
  if (row.version !== seen) throw stale(what, { version: row.version });
}

/** A site's name and zone. */
export async function loadSite(ctx: Context, siteId: string): Promise<{ name: string; zone: string }> {
  const [site] = await ctx.db
    .select({ name: sites.name, zone: sites.zone })
    .from(sites)
    .where(and(eq(sites.practiceId, ctx.practiceId), eq(sites.id, siteId)))
    .limit(1);
  if (!site) throw notFound("site");
  return site;
}

export async function loadStaffName(ctx: Context, staffMemberId: string): Promise<string> {
  const member = await loadRecord(ctx, staffMembers, staffMemberId, "staff member");
  return `${member.givenName} ${member.familyName}`;
}

/** The episode's notes in the order of their visits, without their text. */
export async function listNoteLines(ctx: Context, episodeId: string) {
  const addenda = ctx.db
    .select({ noteId: noteAddenda.noteId, addenda: count().as("addenda") })
    .from(noteAddenda)
    .where(eq(noteAddenda.practiceId, ctx.practiceId))
    .groupBy(noteAddenda.noteId)
    .as("addenda_of");
  return ctx.db
    .select({
      id: notes.id,
      kind: notes.kind,
      state: notes.state,
      visitAt: notes.visitAt,
      siteId: appointments.siteId,
      givenName: staffMembers.givenName,
      familyName: staffMembers.familyName,
      addenda: sql<number>`coalesce(${addenda.addenda}, 0)`.mapWith(Number),
    })
    .from(notes)
    .innerJoin(
      staffMembers,
      and(eq(staffMembers.practiceId, notes.practiceId), eq(staffMembers.id, notes.authorId)),
    )
    .leftJoin(
      appointments,
      and(eq(appointments.practiceId, notes.practiceId), eq(appointments.id, notes.appointmentId)),
    )
    .leftJoin(addenda, eq(addenda.noteId, notes.id))
    .where(and(eq(notes.practiceId, ctx.practiceId), eq(notes.episodeId, episodeId)))
    .orderBy(asc(notes.visitAt), asc(notes.id));
}

export type NoteLineRow = Awaited<ReturnType<typeof listNoteLines>>[number];
