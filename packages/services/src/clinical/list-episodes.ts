import { type EpisodeSummary, listEpisodesInput } from "@withy/contracts/clinical";
import { can } from "@withy/core/access/can";
import { episodes, patients } from "@withy/db/schema";
import { and, desc, eq } from "drizzle-orm";
import { recordAudit } from "../audit";
import { loadRecord } from "../load-record";
import { verb } from "../verb";
import { episodeSummary } from "./episode-view";

/** A patient's episodes at the sites within reach, open ones first, then the latest. */
export const listEpisodes = verb(
  "clinical.read",
  listEpisodesInput,
  async (ctx, input): Promise<EpisodeSummary[]> => {
    const patient = await loadRecord(ctx, patients, input.patientId, "patient");
    const rows = await ctx.db
      .select()
      .from(episodes)
      .where(and(eq(episodes.practiceId, ctx.practiceId), eq(episodes.patientId, patient.id)))
      .orderBy(desc(episodes.state), desc(episodes.openedOn), desc(episodes.id));
    const within = rows.filter((row) => can(ctx.roles, "clinical.read", row.siteId));
    await recordAudit(ctx, {
      action: "episodes.listed",
      subjectKind: "patient",
      subjectId: patient.id,
      patientId: patient.id,
      detail: { episodes: within.length },
    });
    return Promise.all(within.map((row) => episodeSummary(ctx, row)));
  },
);
