import { listMySessionsInput, type SessionRow } from "@withy/contracts/practices";
import { sessions, sites } from "@withy/db/schema";
import { and, desc, eq, gt, isNull } from "drizzle-orm";
import { verb } from "../verb";
import { browserWords } from "./browser-words";
import { idleMinutes } from "./session-limits";

/** The browsers in which the person is signed in now, the last used first. */
export const listMySessions = verb("account.own", listMySessionsInput, async (ctx): Promise<SessionRow[]> => {
  const now = ctx.clock.now();
  const rows = await ctx.db
    .select({ session: sessions, siteName: sites.name })
    .from(sessions)
    .innerJoin(sites, and(eq(sites.practiceId, sessions.practiceId), eq(sites.id, sessions.deskSiteId)))
    .where(
      and(
        eq(sessions.practiceId, ctx.practiceId),
        eq(sessions.staffMemberId, ctx.staffMemberId),
        isNull(sessions.revokedAt),
        gt(sessions.expiresAt, now),
        gt(sessions.lastSeenAt, new Date(now.getTime() - idleMinutes * 60_000)),
      ),
    )
    .orderBy(desc(sessions.lastSeenAt))
    .limit(50);
  return rows.map(({ session, siteName }) => ({
    id: session.id,
    openedAt: session.createdAt.toISOString(),
    lastSeenAt: session.lastSeenAt.toISOString(),
    browser: browserWords(session.userAgent),
    deskSiteName: siteName,
    isThisOne: session.id === ctx.sessionId,
  }));
});
