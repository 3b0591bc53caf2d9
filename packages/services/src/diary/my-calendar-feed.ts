import type { CalendarFeedView, MyCalendarFeedView } from "@withy/contracts/diary";
import { dayOf } from "@withy/core/zoned-time";
import { calendarFeeds, staffMembers } from "@withy/db/schema";
import { and, eq, isNull } from "drizzle-orm";
import type { Context } from "../context";
import { loadRecord } from "../load-record";

type FeedRow = typeof calendarFeeds.$inferSelect;

export const calendarFeedView = (ctx: Context, row: FeedRow): CalendarFeedView => ({
  createdAt: row.createdAt.toISOString(),
  lastReadOn: row.lastReadAt === null ? null : dayOf(row.lastReadAt, ctx.zone),
});

const ownLive = (ctx: Context) =>
  and(
    eq(calendarFeeds.practiceId, ctx.practiceId),
    eq(calendarFeeds.staffMemberId, ctx.staffMemberId),
    isNull(calendarFeeds.revokedAt),
  );

/** One's own live feed, and whether one's work fills one: a feed is made of a therapist's visits. */
export async function readMyCalendarFeed(ctx: Context): Promise<MyCalendarFeedView> {
  const [member, [row]] = await Promise.all([
    loadRecord(ctx, staffMembers, ctx.staffMemberId, "colleague"),
    ctx.db.select().from(calendarFeeds).where(ownLive(ctx)).limit(1),
  ]);
  return { canHaveFeed: member.isTherapist, feed: row ? calendarFeedView(ctx, row) : null };
}

/** Ends whatever address the person has had. @returns the ids of the ended */
export async function endMyCalendarFeeds(ctx: Context): Promise<string[]> {
  const rows = await ctx.db
    .select({ id: calendarFeeds.id })
    .from(calendarFeeds)
    .where(ownLive(ctx))
    .for("update");
  if (rows.length > 0)
    await ctx.db.update(calendarFeeds).set({ revokedAt: ctx.clock.now() }).where(ownLive(ctx));
  return rows.map((row) => row.id);
}
