import type { PatientClinicalView } from "@withy/contracts/patients";
import { sitesWith } from "@withy/core/access/can";
import { dayOf } from "@withy/core/zoned-time";
import { episodes, notes, staffMembers } from "@withy/db/schema";
import { and, desc, eq, inArray } from "drizzle-orm";
import type { Context } from "../context";

/** The open episode and what the reader has still to write. Called only for whoever may read notes. */
export async function clinicalView(ctx: Context, patientId: string): Promise<PatientClinicalView> {
  const [openEpisode, draftNotes] = await Promise.all([
    findOpenEpisode(ctx, patientId),
    listDrafts(ctx, patientId),
  ]);
  return { openEpisode, draftNotes };
}

async function findOpenEpisode(ctx: Context, patientId: string): Promise<PatientClinicalView["openEpisode"]> {
  const allowed = sitesWith(ctx.roles, "clinical.read");
  const [row] = await ctx.db
    .select({ episode: episodes, givenName: staffMembers.givenName, familyName: staffMembers.familyName })
    .from(episodes)
    .innerJoin(
      staffMembers,
      and(eq(staffMembers.practiceId, episodes.practiceId), eq(staffMembers.id, episodes.therapistId)),
    )
    .where(
      and(
        eq(episodes.practiceId, ctx.practiceId),
        eq(episodes.patientId, patientId),
        eq(episodes.state, "open"),
        allowed === "all" ? undefined : inArray(episodes.siteId, allowed),
      ),
    )
    .orderBy(desc(episodes.openedOn))
    .limit(1);
  if (!row) return null;
  return {
    id: row.episode.id,
    problem: row.episode.problem,
    side: row.episode.side,
    therapistName: `${row.givenName} ${row.familyName}`,
    openedOn: row.episode.openedOn,
    goals: row.episode.goals.map(({ text, metOn }) => ({ text, isMet: metOn !== null })),
  };
}

async function listDrafts(ctx: Context, patientId: string): Promise<PatientClinicalView["draftNotes"]> {
  const rows = await ctx.db
    .select({ id: notes.id, visitAt: notes.visitAt })
    .from(notes)
    .where(
      and(
        eq(notes.practiceId, ctx.practiceId),
        eq(notes.patientId, patientId),
        eq(notes.authorId, ctx.staffMemberId),
        eq(notes.state, "draft"),
      ),
    )
    .orderBy(desc(notes.visitAt))
    .limit(5);
  return rows.map(({ id, visitAt }) => ({ id, visitOn: dayOf(visitAt, ctx.zone) }));
}
