import type { RoleHolding } from "@withy/core/access/can";
import { sessions, staffMembers, staffRoles } from "@withy/db/schema";
import { and, eq, gt, inArray, isNull } from "drizzle-orm";
import type { SystemContext } from "../context";
import { idleMinutes } from "./session-limits";

/**
 * Which of these sessions still live, with the roles of this moment. An open stream is no sign of a person, so unlike
 * a request it does not keep a session awake.
 */
export async function readLiveSessions(
  system: Pick<SystemContext, "db" | "clock">,
  practiceId: string,
  sessionIds: readonly string[],
): Promise<ReadonlyMap<string, readonly RoleHolding[]>> {
  const live = new Map<string, RoleHolding[]>();
  if (sessionIds.length === 0) return live;
  const now = system.clock.now();
  const rows = await system.db
    .select({ id: sessions.id, role: staffRoles.role, siteId: staffRoles.siteId })
    .from(sessions)
    .innerJoin(
      staffMembers,
      and(
        eq(staffMembers.practiceId, sessions.practiceId),
        eq(staffMembers.id, sessions.staffMemberId),
        eq(staffMembers.isActive, true),
      ),
    )
    .innerJoin(
      staffRoles,
      and(
        eq(staffRoles.practiceId, sessions.practiceId),
        eq(staffRoles.staffMemberId, sessions.staffMemberId),
      ),
    )
    .where(
      and(
        eq(sessions.practiceId, practiceId),
        inArray(sessions.id, [...new Set(sessionIds)]),
        isNull(sessions.revokedAt),
        gt(sessions.expiresAt, now),
        gt(sessions.lastSeenAt, new Date(now.getTime() - idleMinutes * 60_000)),
      ),
    );
  for (const { id, role, siteId } of rows) live.set(id, [...(live.get(id) ?? []), { role, siteId }]);
  return live;
}
