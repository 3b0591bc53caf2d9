import { createHash } from "node:crypto";
import { feedTokenPattern } from "@withy/contracts/diary";
import { notFound } from "@withy/core/errors";
import { addDays, dayBounds, dayOf } from "@withy/core/zoned-time";
import { calendarFeeds, practices, staffMembers } from "@withy/db/schema";
import { therapistCalendar } from "@withy/documents/calendar/therapist-calendar";
import { and, eq, isNull, lt, or } from "drizzle-orm";
import { recordAudit } from "../audit";
import type { SystemContext } from "../context";
import { hashSecretToken } from "../secret-token";
import { spendTry, type TryLimit } from "../spend-try";
import { inTransaction } from "../transaction";
import { readDiarySettings } from "./diary-settings";
import { readFeedEvents } from "./feed-events";

/** What a feed shows of the past and of what is to come. */
export const feedDays = { back: 30, ahead: 180 } as const;

/** Calendars ask every few minutes at most; several of one's own devices may share an address. */
const reads: TryLimit = { name: "feed", tries: 60, minutes: 15, advice: "let the calendar ask again" };
/** A caller who knows no address finds none by trying; this only keeps the trying cheap. */
const misses: TryLimit = { name: "feed-miss", tries: 60, minutes: 15, advice: "try the right address" };

export interface FeedRequest {
  readonly token: string;
  /** Where the request comes from, to hold back whoever tries addresses. */
  readonly caller: string;
  /** The version that the calendar holds, as its If-None-Match header names it. */
  readonly known: string | null;
}

export interface FeedAnswer {
  readonly etag: string;
  /** Null where the calendar already holds this version. */
  readonly content: string | null;
}

async function findFeed(ctx: SystemContext, token: string) {
  if (!feedTokenPattern.test(token)) return null;
  const [row] = await ctx.db
    .select({
      feed: calendarFeeds,
      givenName: staffMembers.givenName,
      familyName: staffMembers.familyName,
      practice: practices.name,
      zone: practices.zone,
    })
    .from(calendarFeeds)
    .innerJoin(practices, eq(practices.id, calendarFeeds.practiceId))
    .innerJoin(
      staffMembers,
      and(
        eq(staffMembers.practiceId, calendarFeeds.practiceId),
        eq(staffMembers.id, calendarFeeds.staffMemberId),
      ),
    )
    .where(
      and(
        eq(calendarFeeds.tokenHash, hashSecretToken(token)),
        isNull(calendarFeeds.revokedAt),
        // Whoever has left reads nothing any more, whatever address they kept.
        eq(staffMembers.isActive, true),
        eq(staffMembers.isTherapist, true),
      ),
    )
    .limit(1);
  return row ?? null;
}

type Feed = NonNullable<Awaited<ReturnType<typeof findFeed>>>;

/** Writes the first reading of each day into the audit; a calendar that asks all day is one event. */
async function noteReading(ctx: SystemContext, { feed, zone }: Feed): Promise<void> {
  const now = ctx.clock.now();
  const today = dayBounds(dayOf(now, zone), zone).from;
  if (feed.lastReadAt !== null && feed.lastReadAt >= today) return;
  await inTransaction({ ...ctx, practiceId: feed.practiceId }, async (tx) => {
    const [written] = await tx.db
      .update(calendarFeeds)
      .set({ lastReadAt: now })
      .where(
        and(
          eq(calendarFeeds.practiceId, feed.practiceId),
          eq(calendarFeeds.id, feed.id),
          or(isNull(calendarFeeds.lastReadAt), lt(calendarFeeds.lastReadAt, today)),
        ),
      );
    if (written.affectedRows === 0) return;
    await recordAudit(tx, {
      action: "calendar-feed.read",
      subjectKind: "calendar-feed",
      subjectId: feed.id,
      detail: { staffMemberId: feed.staffMemberId },
    });
  });
}

async function contentOf(ctx: SystemContext, found: Feed): Promise<string> {
  const { feed, zone, practice, givenName, familyName } = found;
  const today = dayOf(ctx.clock.now(), zone);
  const own = { db: ctx.db, practiceId: feed.practiceId };
  const { hasNamesInFeed } = await readDiarySettings(own);
  const events = await readFeedEvents(own, {
    therapistId: feed.staffMemberId,
    from: dayBounds(addDays(today, -feedDays.back), zone).from,
    to: dayBounds(addDays(today, feedDays.ahead + 1), zone).from,
    hasNames: hasNamesInFeed,
  });
  return therapistCalendar({ name: `${givenName} ${familyName}, ${practice}`, events });
}

/** Whether a header such as `W/"a", "b"` or `*` names this version. */
const isKnown = (known: string | null, etag: string): boolean =>
  known?.split(",").some((one) => one.trim() === "*" || one.trim().replace(/^W\//, "") === etag) ?? false;

/**
 * A therapist's calendar for whoever holds its secret address.
 * @throws not-found in the same words for an address that is wrong, was revoked or whose owner has left;
 *   refused "too-many-tries"
 */
export async function readCalendarFeed(ctx: SystemContext, request: FeedRequest): Promise<FeedAnswer> {
  const found = await findFeed(ctx, request.token);
  if (!found) {
    await spendTry(ctx, misses, request.caller.slice(0, 80));
    throw notFound("calendar feed");
  }
  await spendTry(ctx, reads, found.feed.id);
  await noteReading(ctx, found);
  const content = await contentOf(ctx, found);
  const etag = `"${createHash("sha256").update(content).digest("base64url")}"`;
  return { etag, content: isKnown(request.known, etag) ? null : content };
}
