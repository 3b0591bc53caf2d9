import { episodes } from "@withy/db/schema";
import { and, eq } from "drizzle-orm";
import type { Context } from "../context";
import { loadRecord } from "../load-record";
import type { EpisodeRow } from "./episode-records";

type Changes = Partial<
  Pick<EpisodeRow, "goals" | "redFlags" | "state" | "dischargedAt" | "dischargedBy" | "outcome">
>;

/** Writes changes to a row that this transaction holds, and gives it its next version. */
export async function changeEpisode(
  ctx: Context,
  episode: EpisodeRow,
  changes: Changes,
): Promise<EpisodeRow> {
  await ctx.db
    .update(episodes)
    .set({ ...changes, version: episode.version + 1, updatedAt: ctx.clock.now() })
    .where(and(eq(episodes.practiceId, ctx.practiceId), eq(episodes.id, episode.id)));
  return loadRecord(ctx, episodes, episode.id, "episode");
}
