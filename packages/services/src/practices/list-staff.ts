import { listStaffInput, type StaffRow } from "@withy/contracts/practices";
import { sessions, staffAccounts, staffMembers, staffRoles } from "@withy/db/schema";
import { and, asc, desc, eq, max } from "drizzle-orm";
import { verb } from "../verb";

/** Everyone who works or worked at the practice, with roles and whether they have joined. */
export const listStaff = verb("staff.manage", listStaffInput, async (ctx): Promise<StaffRow[]> => {
  const [members, held, seen] = await Promise.all([
    ctx.db
      .select({
        member: staffMembers,
        email: staffAccounts.email,
        passwordChangedAt: staffAccounts.passwordChangedAt,
      })
      .from(staffMembers)
      .leftJoin(
        staffAccounts,
        and(
          eq(staffAccounts.practiceId, staffMembers.practiceId),
          eq(staffAccounts.staffMemberId, staffMembers.id),
        ),
      )
      .where(eq(staffMembers.practiceId, ctx.practiceId))
      .orderBy(desc(staffMembers.isActive), asc(staffMembers.position), asc(staffMembers.familyName)),
    ctx.db.select().from(staffRoles).where(eq(staffRoles.practiceId, ctx.practiceId)),
    ctx.db
      .select({ staffMemberId: sessions.staffMemberId, at: max(sessions.lastSeenAt) })
      .from(sessions)
      .where(eq(sessions.practiceId, ctx.practiceId))
      .groupBy(sessions.staffMemberId),
  ]);
  const lastSeen = new Map(seen.map((row) => [row.staffMemberId, row.at]));
  return members.map(({ member, email, passwordChangedAt }) => ({
    id: member.id,
    name: `${member.givenName} ${member.familyName}`,
    jobTitle: member.jobTitle,
    email,
    isActive: member.isActive,
    isTherapist: member.isTherapist,
    roles: held
      .filter((row) => row.staffMemberId === member.id)
      .map(({ role, siteId }) => ({ role, siteId })),
    hasJoined: passwordChangedAt !== null,
    lastSeenAt: lastSeen.get(member.id)?.toISOString() ?? null,
  }));
});
