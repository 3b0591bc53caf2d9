import type { RoleHolding } from "@withy/core/access/can";
import { practices, sessions, staffMembers, staffRoles } from "@withy/db/schema";
import { and, eq, isNull } from "drizzle-orm";
import type { Context, SystemContext } from "../context";
import { idleMinutes } from "./session-limits";

const touchEveryMs = 60_000;

export interface SessionView {
  readonly context: Context;
  readonly jobTitle: string;
  readonly isTherapist: boolean;
  readonly practiceName: string;
}

/**
 * The live session with this id, with the roles as they stand now; null where it has ended, been idle too long or
 * never was. Asked on every request, in one query, so ending a session or taking a role away works at once.
 */
export async function readSession(
  system: SystemContext,
  sessionId: string,
  idempotencyKey: string | null = null,
): Promise<SessionView | null> {
  const rows = await system.db
    .select({
      session: sessions,
      givenName: staffMembers.givenName,
      familyName: staffMembers.familyName,
      jobTitle: staffMembers.jobTitle,
      isTherapist: staffMembers.isTherapist,
      practiceName: practices.name,
      zone: practices.zone,
      role: staffRoles.role,
      siteId: staffRoles.siteId,
    })
    .from(sessions)
    .innerJoin(
      staffMembers,
      and(
        eq(staffMembers.practiceId, sessions.practiceId),
        eq(staffMembers.id, sessions.staffMemberId),
        eq(staffMembers.isActive, true),
      ),
    )
    .innerJoin(practices, eq(practices.id, sessions.practiceId))
    .leftJoin(
      staffRoles,
      and(
        eq(staffRoles.practiceId, sessions.practiceId),
        eq(staffRoles.staffMemberId, sessions.staffMemberId),
      ),
    )
    .where(and(eq(sessions.id, sessionId), isNull(sessions.revokedAt)));
  const first = rows[0];
  if (!first) return null;
  const now = system.clock.now();
  const idleUntil = first.session.lastSeenAt.getTime() + idleMinutes * 60_000;
  if (now >= first.session.expiresAt || now.getTime() >= idleUntil) return null;
  if (now.getTime() - first.session.lastSeenAt.getTime() > touchEveryMs) {
    await system.db.update(sessions).set({ lastSeenAt: now }).where(eq(sessions.id, sessionId));
  }
  const roles: RoleHolding[] = rows.flatMap((r) =>
    r.role === null ? [] : [{ role: r.role, siteId: r.siteId }],
  );
  return {
    context: {
      practiceId: first.session.practiceId,
      staffMemberId: first.session.staffMemberId,
      staffName: `${first.givenName} ${first.familyName}`,
      sessionId,
      roles,
      deskSiteId: first.session.deskSiteId,
      zone: first.zone,
      requestId: system.requestId,
      idempotencyKey,
      clock: system.clock,
      db: system.db,
    },
    jobTitle: first.jobTitle,
    isTherapist: first.isTherapist,
    practiceName: first.practiceName,
  };
}
