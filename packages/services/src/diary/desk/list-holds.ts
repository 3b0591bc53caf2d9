import { type HeldTime, listHoldsInput } from "@withy/contracts/diary";
import { dayOf, minutesBetween, timeOf } from "@withy/core/zoned-time";
import { diaryHolds, sites, staffMembers } from "@withy/db/schema";
import { and, asc, eq, gt, inArray, ne } from "drizzle-orm";
import { verb } from "../../verb";
import { readableSites } from "../site-reach";

const minuteOf = (time: string): number => Number(time.slice(0, 2)) * 60 + Number(time.slice(3, 5));

/** The times that other people are booking at this moment. */
export const listHolds = verb("diary.read", listHoldsInput, async (ctx, input): Promise<HeldTime[]> => {
  const siteIds = await readableSites(ctx, input.siteIds);
  if (siteIds.length === 0) return [];
  const rows = await ctx.db
    .select({
      hold: diaryHolds,
      zone: sites.zone,
      givenName: staffMembers.givenName,
      familyName: staffMembers.familyName,
    })
    .from(diaryHolds)
    .innerJoin(sites, and(eq(sites.practiceId, diaryHolds.practiceId), eq(sites.id, diaryHolds.siteId)))
    .innerJoin(
      staffMembers,
      and(eq(staffMembers.practiceId, diaryHolds.practiceId), eq(staffMembers.id, diaryHolds.heldBy)),
    )
    .where(
      and(
        eq(diaryHolds.practiceId, ctx.practiceId),
        inArray(diaryHolds.siteId, siteIds),
        gt(diaryHolds.expiresAt, ctx.clock.now()),
        ne(diaryHolds.heldBy, ctx.staffMemberId),
      ),
    )
    .orderBy(asc(diaryHolds.startsAt), asc(diaryHolds.id));
  return rows.map(({ hold, zone, givenName, familyName }) => {
    const fromMinute = minuteOf(timeOf(hold.startsAt, zone));
    return {
      byName: `${givenName} ${familyName}`,
      siteId: hold.siteId,
      therapistId: hold.therapistId,
      day: dayOf(hold.startsAt, zone),
      fromMinute,
      untilMinute: fromMinute + minutesBetween(hold.startsAt, hold.endsAt),
    };
  });
});
