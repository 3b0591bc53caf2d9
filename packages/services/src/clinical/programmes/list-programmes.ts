import { sessionTime } from "@withy/clinical/programmes/compute-time";
import {
  listProgrammesInput,
  type ProgrammeLine,
  type ProgrammesOfPatient,
} from "@withy/contracts/programmes";
import { can } from "@withy/core/access/can";
import { dayOf } from "@withy/core/zoned-time";
import { episodes, programmes, programmeVersions } from "@withy/db/schema";
import { and, desc, eq, isNotNull, max } from "drizzle-orm";
import { recordAudit } from "../../audit";
import type { Context } from "../../context";
import { verb } from "../../verb";
import { loadPatientForCare } from "../clinical-patient";
import { contentOf } from "./programme-records";
import { episodePlace } from "./programme-view";

function loadRows(ctx: Context, patientId: string) {
  return ctx.db
    .select({ programme: programmes, current: programmeVersions, episode: episodes })
    .from(programmes)
    .innerJoin(
      programmeVersions,
      and(
        eq(programmeVersions.practiceId, programmes.practiceId),
        eq(programmeVersions.programmeId, programmes.id),
        eq(programmeVersions.versionNumber, programmes.currentVersion),
      ),
    )
    .innerJoin(
      episodes,
      and(eq(episodes.practiceId, programmes.practiceId), eq(episodes.id, programmes.episodeId)),
    )
    .where(and(eq(programmes.practiceId, ctx.practiceId), eq(programmes.patientId, patientId)))
    .orderBy(desc(programmes.updatedAt), desc(programmes.id));
}

async function lastIssues(ctx: Context, patientId: string): Promise<Map<string, Date>> {
  const rows = await ctx.db
    .select({ id: programmes.id, at: max(programmeVersions.issuedAt) })
    .from(programmes)
    .innerJoin(
      programmeVersions,
      and(
        eq(programmeVersions.practiceId, programmes.practiceId),
        eq(programmeVersions.programmeId, programmes.id),
      ),
    )
    .where(
      and(
        eq(programmes.practiceId, ctx.practiceId),
        eq(programmes.patientId, patientId),
        isNotNull(programmeVersions.issuedAt),
      ),
    )
    .groupBy(programmes.id);
  return new Map(rows.flatMap((row) => (row.at === null ? [] : [[row.id, row.at] as const])));
}

async function openEpisodes(ctx: Context, patientId: string) {
  const rows = await ctx.db
    .select()
    .from(episodes)
    .where(
      and(
        eq(episodes.practiceId, ctx.practiceId),
        eq(episodes.patientId, patientId),
        eq(episodes.state, "open"),
      ),
    )
    .orderBy(desc(episodes.openedOn));
  return rows.filter((row) => can(ctx.roles, "clinical.write", row.siteId));
}

/** All programmes of a patient, the one worked on last first. */
export const listProgrammes = verb(
  "clinical.read",
  listProgrammesInput,
  async (ctx, input): Promise<ProgrammesOfPatient> => {
    const { view: patient } = await loadPatientForCare(
      ctx,
      input.patientId,
      dayOf(ctx.clock.now(), ctx.zone),
    );
    const rows = await loadRows(ctx, input.patientId);
    const issued = await lastIssues(ctx, input.patientId);
    const open = await openEpisodes(ctx, input.patientId);
    const reachable = rows.filter((row) => can(ctx.roles, "clinical.read", row.episode.siteId));
    await recordAudit(ctx, {
      action: "programmes.listed",
      subjectKind: "patient",
      subjectId: input.patientId,
      patientId: input.patientId,
    });
    return {
      patient,
      programmes: reachable.map(({ programme, current, episode }): ProgrammeLine => {
        const content = contentOf(current);
        return {
          id: programme.id,
          title: programme.title,
          episodeId: episode.id,
          place: episodePlace(episode),
          problem: episode.problem,
          currentVersion: programme.currentVersion,
          exercises: content.items.length,
          sessionSeconds: sessionTime(content).elapsedSeconds,
          sessionsPerWeek: content.sessionsPerWeek,
          updatedAt: programme.updatedAt.toISOString(),
          lastIssuedAt: issued.get(programme.id)?.toISOString() ?? null,
        };
      }),
      openEpisodes: open.map((row) => ({ id: row.id, problem: row.problem, place: episodePlace(row) })),
      canWrite: open.length > 0,
    };
  },
);
