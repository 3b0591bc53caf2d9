import { diarySettings } from "@withy/db/schema";
import { usualWeights, type Weights } from "@withy/diary/rank-time";
import { eq } from "drizzle-orm";
import type { Context } from "../context";

/** How the practice ranks times: its own weights, or the usual ones while nobody has changed them. */
export async function readFindingWeights(ctx: Pick<Context, "db" | "practiceId">): Promise<Weights> {
  const [row] = await ctx.db
    .select({ weights: diarySettings.findingWeights })
    .from(diarySettings)
    .where(eq(diarySettings.practiceId, ctx.practiceId))
    .limit(1);
  return row?.weights ?? usualWeights;
}
