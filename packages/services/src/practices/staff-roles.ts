import type { RoleHolding } from "@withy/core/access/can";
import { newId } from "@withy/core/ids";
import { sites, staffMembers, staffRoles } from "@withy/db/schema";
import { and, countDistinct, eq, isNull, ne } from "drizzle-orm";
import type { Context } from "../context";
import { loadRecord } from "../load-record";

export async function rolesOf(tx: Context, staffMemberId: string): Promise<RoleHolding[]> {
  return tx.db
    .select({ role: staffRoles.role, siteId: staffRoles.siteId })
    .from(staffRoles)
    .where(and(eq(staffRoles.practiceId, tx.practiceId), eq(staffRoles.staffMemberId, staffMemberId)));
}

/** Replaces a person's roles, each site looked up inside the practice, a repeated one kept once. */
export async function replaceRoles(tx: Context, staffMemberId: string, roles: readonly RoleHolding[]) {
  const unique = [...new Map(roles.map((held) => [`${held.role} ${held.siteId}`, held])).values()];
  for (const { siteId } of unique) if (siteId !== null) await loadRecord(tx, sites, siteId, "site");
  await tx.db
    .delete(staffRoles)
    .where(and(eq(staffRoles.practiceId, tx.practiceId), eq(staffRoles.staffMemberId, staffMemberId)));
  await tx.db
    .insert(staffRoles)
    .values(unique.map((held) => ({ practiceId: tx.practiceId, id: newId(), staffMemberId, ...held })));
}

/** Owners of the whole practice who work there, without this person. */
export async function countOtherOwners(tx: Context, staffMemberId: string): Promise<number> {
  const [row] = await tx.db
    .select({ n: countDistinct(staffRoles.staffMemberId) })
    .from(staffRoles)
    .innerJoin(
      staffMembers,
      and(
        eq(staffMembers.practiceId, staffRoles.practiceId),
        eq(staffMembers.id, staffRoles.staffMemberId),
        eq(staffMembers.isActive, true),
      ),
    )
    .where(
      and(
        eq(staffRoles.practiceId, tx.practiceId),
        eq(staffRoles.role, "owner"),
        isNull(staffRoles.siteId),
        ne(staffRoles.staffMemberId, staffMemberId),
      ),
    );
  return row?.n ?? 0;
}

export const isOwner = (roles: readonly RoleHolding[]): boolean =>
  roles.some(({ role, siteId }) => role === "owner" && siteId === null);
