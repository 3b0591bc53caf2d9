import type { Programme } from "@withy/clinical/programmes/programme";
import { programmeContent } from "@withy/contracts/programmes";
import type { Permission } from "@withy/core/access/permissions";
import { notFound } from "@withy/core/errors";
import { programmes, programmeVersions } from "@withy/db/schema";
import { and, desc, eq } from "drizzle-orm";
import type { Context } from "../../context";
import { loadRecord } from "../../load-record";
import { type EpisodeRow, loadEpisode } from "../episode-records";

export type ProgrammeRow = typeof programmes.$inferSelect;
export type ProgrammeVersionRow = typeof programmeVersions.$inferSelect;

export interface LoadedProgramme {
  readonly programme: ProgrammeRow;
  readonly episode: EpisodeRow;
}

/** One programme whose episode this person may reach, or "not found". */
export async function loadProgramme(
  ctx: Context,
  permission: Permission,
  programmeId: string,
  options: { lock?: boolean } = {},
): Promise<LoadedProgramme> {
  const programme = await loadRecord(ctx, programmes, programmeId, "programme", options);
  const episode = await loadEpisode(ctx, permission, programme.episodeId);
  return { programme, episode };
}

export async function listVersions(ctx: Context, programmeId: string): Promise<ProgrammeVersionRow[]> {
  return ctx.db
    .select()
    .from(programmeVersions)
    .where(
      and(eq(programmeVersions.practiceId, ctx.practiceId), eq(programmeVersions.programmeId, programmeId)),
    )
    .orderBy(desc(programmeVersions.versionNumber));
}

export async function loadVersion(
  ctx: Context,
  programmeId: string,
  versionNumber: number,
): Promise<ProgrammeVersionRow> {
  const [row] = await ctx.db
    .select()
    .from(programmeVersions)
    .where(
      and(
        eq(programmeVersions.practiceId, ctx.practiceId),
        eq(programmeVersions.programmeId, programmeId),
        eq(programmeVersions.versionNumber, versionNumber),
      ),
    )
    .limit(1);
  if (!row) throw notFound("version of the programme");
  return row;
}

/** The stored content, checked again on the way out: a row that no longer fits is a fault, not a guess. */
export function contentOf(row: ProgrammeVersionRow): Programme {
  return programmeContent.parse(row.content);
}
