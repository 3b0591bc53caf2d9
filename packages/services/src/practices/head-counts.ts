import { can } from "@withy/core/access/can";
import { notes } from "@withy/db/schema";
import { and, count, eq, lt } from "drizzle-orm";
import { z } from "zod";
import { verb } from "../verb";

/** The small figures beside the head's tabs, by address: what waits for this person. */
export const headCounts = verb(
  "account.own",
  z.strictObject({}),
  async (ctx): Promise<Record<string, number>> => {
    const counts: Record<string, number> = {};
    if (can(ctx.roles, "clinical.write")) {
      const [unsigned] = await ctx.db
        .select({ n: count() })
        .from(notes)
        .where(
          and(
            eq(notes.practiceId, ctx.practiceId),
            eq(notes.authorId, ctx.staffMemberId),
            eq(notes.state, "draft"),
            lt(notes.visitAt, ctx.clock.now()),
          ),
        );
      counts["/notes"] = unsigned?.n ?? 0;
    }
    return counts;
  },
);
