import { releaseHoldInput } from "@withy/contracts/diary";
import { diaryHolds } from "@withy/db/schema";
import { and, eq } from "drizzle-orm";
import { verb } from "../../verb";

/** Gives back the time that one held, when the booking is done or left. */
export const releaseHold = verb("diary.book", releaseHoldInput, async (ctx) => {
  await ctx.db
    .delete(diaryHolds)
    .where(and(eq(diaryHolds.practiceId, ctx.practiceId), eq(diaryHolds.heldBy, ctx.staffMemberId)));
  return { isReleased: true };
});
