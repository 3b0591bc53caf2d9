import { changeRolesInput } from "@withy/contracts/practices";
import { refuseIf } from "@withy/core/errors";
import { staffMembers } from "@withy/db/schema";
import { and, eq } from "drizzle-orm";
import { recordAudit } from "../audit/record-audit";
import { loadRecord } from "../load-record";
import { inTransaction } from "../transaction";
import { verb } from "../verb";
import { checkOwnerStays, checkReachOfRoles } from "./check-staff-change";
import { countOtherOwners, isOwner, replaceRoles, rolesOf } from "./staff-roles";

/** Gives a person these roles and no others. It works from their next request on. */
export const changeRoles = verb("staff.manage", changeRolesInput, (ctx, { staffMemberId, roles }) =>
  inTransaction(ctx, async (tx) => {
    await loadRecord(tx, staffMembers, staffMemberId, "colleague", { lock: true });
    const before = await rolesOf(tx, staffMemberId);
    refuseIf(checkReachOfRoles(tx.roles, [...before, ...roles]));
    if (isOwner(before)) refuseIf(checkOwnerStays(await countOtherOwners(tx, staffMemberId), isOwner(roles)));
    await replaceRoles(tx, staffMemberId, roles);
    await tx.db
      .update(staffMembers)
      .set({ isTherapist: roles.some(({ role }) => role === "therapist") })
      .where(and(eq(staffMembers.practiceId, tx.practiceId), eq(staffMembers.id, staffMemberId)));
    await recordAudit(tx, {
      action: "staff-member.roles-changed",
      subjectKind: "staff-member",
      subjectId: staffMemberId,
      detail: { before, after: roles },
    });
    return { staffMemberId };
  }),
);
