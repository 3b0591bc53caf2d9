import { type CoverPlanRow, listCoverPlansInput } from "@withy/contracts/diary";
import { isAppError } from "@withy/core/errors";
import { dayOf } from "@withy/core/zoned-time";
import { coverPlans } from "@withy/db/schema";
import { and, desc, eq, ne } from "drizzle-orm";
import type { Context } from "../../context";
import { verb } from "../../verb";
import { loadPlan, type PlanRow } from "./cover-rows";
import { readPlaceNames } from "./cover-view";

const most = 8;

async function isWithinReach(ctx: Context, plan: PlanRow): Promise<boolean> {
  try {
    await loadPlan(ctx, plan.id);
    return true;
  } catch (error) {
    if (isAppError(error) && error.code === "not-found") return false;
    throw error;
  }
}

/** The latest plans that this person may open, for whoever comes back to one. */
export const listCoverPlans = verb(
  "diary.book",
  listCoverPlansInput,
  async (ctx): Promise<readonly CoverPlanRow[]> => {
    const plans = await ctx.db
      .select()
      .from(coverPlans)
      .where(and(eq(coverPlans.practiceId, ctx.practiceId), ne(coverPlans.state, "dropped")))
      .orderBy(desc(coverPlans.createdAt))
      .limit(most);
    const names = await readPlaceNames(ctx);
    const rows: CoverPlanRow[] = [];
    for (const plan of plans) {
      if (!(await isWithinReach(ctx, plan))) continue;
      const name =
        plan.therapistId === null
          ? names.rooms.get(plan.roomId ?? "")
          : names.therapists.get(plan.therapistId);
      const startDay = dayOf(plan.startsAt, ctx.zone);
      rows.push({ id: plan.id, state: plan.state, causeName: name ?? "", reason: plan.reason, startDay });
    }
    return rows;
  },
);
