import type { Permission } from "@withy/core/access/permissions";
import { AppError } from "@withy/core/errors";
import { practices, staffMembers, staffRoles } from "@withy/db/schema";
import { and, eq } from "drizzle-orm";
import type { Context, SystemContext } from "../context";
import { authorize } from "../verb";
import type { JobRow } from "./job-run";

/**
 * The context of the person who started the job, with the roles of this moment: whoever has left or lost the right
 * meanwhile is refused. Audit rows name the person and, as their request, the job.
 */
export async function actForRequester(
  system: SystemContext,
  job: JobRow,
  permission: Permission,
): Promise<Context> {
  if (job.requestedBy === null) throw new Error(`A job of kind ${job.kind} needs someone who asked for it.`);
  const rows = await system.db
    .select({ member: staffMembers, zone: practices.zone, role: staffRoles.role, siteId: staffRoles.siteId })
    .from(staffMembers)
    .innerJoin(practices, eq(practices.id, staffMembers.practiceId))
    .innerJoin(
      staffRoles,
      and(eq(staffRoles.practiceId, staffMembers.practiceId), eq(staffRoles.staffMemberId, staffMembers.id)),
    )
    .where(
      and(
        eq(staffMembers.practiceId, job.practiceId),
        eq(staffMembers.id, job.requestedBy),
        eq(staffMembers.isActive, true),
      ),
    );
  const [first] = rows;
  if (!first) throw new AppError("forbidden", "Whoever started this no longer works here. Start it again.");
  const { member, zone } = first;
  const ctx: Context = {
    practiceId: job.practiceId,
    staffMemberId: member.id,
    staffName: `${member.givenName} ${member.familyName}`,
    sessionId: job.id,
    roles: rows.map(({ role, siteId }) => ({ role, siteId })),
    deskSiteId: member.homeSiteId,
    zone,
    requestId: job.id,
    idempotencyKey: null,
    clock: system.clock,
    db: system.db,
  };
  authorize(ctx, permission);
  return ctx;
}
