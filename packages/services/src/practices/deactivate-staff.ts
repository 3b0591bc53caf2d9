import { type DeactivatedView, staffMemberIdInput } from "@withy/contracts/practices";
import { refused, refuseIf } from "@withy/core/errors";
import { refusal } from "@withy/core/refusal";
import { appointments, staffMembers } from "@withy/db/schema";
import { holdingStates } from "@withy/diary/appointment-states";
import { and, count, eq, gt, inArray } from "drizzle-orm";
import { recordAudit } from "../audit/record-audit";
import type { Context } from "../context";
import { loadRecord } from "../load-record";
import { inTransaction } from "../transaction";
import { verb } from "../verb";
import { endAccountTokens } from "./account-token";
import { checkOwnerStays, checkReachOfRoles } from "./check-staff-change";
import { endSessionsOf } from "./end-sessions";
import { countOtherOwners, isOwner, rolesOf } from "./staff-roles";

/** Ends a person's access at once: sessions, links and sign-in. Their name stays under what they wrote. */
export const deactivateStaff = verb(
  "staff.manage",
  staffMemberIdInput,
  (ctx, { staffMemberId }): Promise<DeactivatedView> =>
    inTransaction(ctx, async (tx) => {
      await loadRecord(tx, staffMembers, staffMemberId, "colleague", { lock: true });
      if (staffMemberId === tx.staffMemberId)
        throw refused(refusal("own-account", "You cannot end your own access. Ask another owner."));
      const roles = await rolesOf(tx, staffMemberId);
      refuseIf(checkReachOfRoles(tx.roles, roles));
      if (isOwner(roles)) refuseIf(checkOwnerStays(await countOtherOwners(tx, staffMemberId), false));
      const member = { practiceId: tx.practiceId, staffMemberId };
      await setActive(tx, staffMemberId, false);
      await endAccountTokens(tx, member);
      const endedSessions = await endSessionsOf(tx, member);
      const upcomingVisits = await countUpcoming(tx, staffMemberId);
      await recordAudit(tx, {
        action: "staff-member.deactivated",
        subjectKind: "staff-member",
        subjectId: staffMemberId,
        detail: { endedSessions, upcomingVisits },
      });
      return { staffMemberId, endedSessions, upcomingVisits };
    }),
);

/** Lets a person sign in again with the roles they had. */
export const reactivateStaff = verb("staff.manage", staffMemberIdInput, (ctx, { staffMemberId }) =>
  inTransaction(ctx, async (tx) => {
    await loadRecord(tx, staffMembers, staffMemberId, "colleague", { lock: true });
    refuseIf(checkReachOfRoles(tx.roles, await rolesOf(tx, staffMemberId)));
    await setActive(tx, staffMemberId, true);
    await recordAudit(tx, {
      action: "staff-member.reactivated",
      subjectKind: "staff-member",
      subjectId: staffMemberId,
    });
    return { staffMemberId };
  }),
);

async function setActive(tx: Context, staffMemberId: string, isActive: boolean): Promise<void> {
  await tx.db
    .update(staffMembers)
    .set({ isActive })
    .where(and(eq(staffMembers.practiceId, tx.practiceId), eq(staffMembers.id, staffMemberId)));
}

async function countUpcoming(tx: Context, staffMemberId: string): Promise<number> {
  const [row] = await tx.db
    .select({ n: count() })
    .from(appointments)
    .where(
      and(
        eq(appointments.practiceId, tx.practiceId),
        eq(appointments.therapistId, staffMemberId),
        gt(appointments.startsAt, tx.clock.now()),
        inArray(appointments.state, [...holdingStates]),
      ),
    );
  return row?.n ?? 0;
}
