import { inviteStaffMemberInput, staffMemberIdInput } from "@withy/contracts/practices";
import { refused, refuseIf } from "@withy/core/errors";
import { newId } from "@withy/core/ids";
import { refusal } from "@withy/core/refusal";
import { isDuplicate } from "@withy/db/database-error";
import { sites, staffAccounts, staffMembers } from "@withy/db/schema";
import { and, eq } from "drizzle-orm";
import { recordAudit } from "../audit/record-audit";
import type { Context } from "../context";
import { loadRecord } from "../load-record";
import { enqueueMessage } from "../messaging/enqueue-message";
import { once } from "../once";
import { inTransaction } from "../transaction";
import { verb } from "../verb";
import { issueAccountToken } from "./account-token";
import { checkReachOfRoles } from "./check-staff-change";
import { replaceRoles, rolesOf } from "./staff-roles";

/** Adds a colleague and sends them a link to choose a password. */
export const inviteStaffMember = verb("staff.manage", inviteStaffMemberInput, async (ctx, input) => {
  refuseIf(checkReachOfRoles(ctx.roles, input.roles));
  try {
    return await once(ctx, "staff.invite", async (tx) => {
      await loadRecord(tx, sites, input.homeSiteId, "site");
      const staffMemberId = newId();
      await tx.db.insert(staffMembers).values({
        practiceId: tx.practiceId,
        id: staffMemberId,
        givenName: input.givenName,
        familyName: input.familyName,
        jobTitle: input.jobTitle,
        registrationNumber: input.registrationNumber,
        isTherapist: input.roles.some(({ role }) => role === "therapist"),
        homeSiteId: input.homeSiteId,
        position: 1000,
        createdAt: tx.clock.now(),
      });
      await tx.db
        .insert(staffAccounts)
        .values({ id: newId(), practiceId: tx.practiceId, staffMemberId, email: input.email });
      await replaceRoles(tx, staffMemberId, input.roles);
      await sendInvitation(tx, staffMemberId, input.givenName, input.email);
      await recordAudit(tx, {
        action: "staff-member.invited",
        subjectKind: "staff-member",
        subjectId: staffMemberId,
        detail: { roles: input.roles },
      });
      return { staffMemberId };
    });
  } catch (error) {
    if (!isDuplicate(error, "staff_accounts_email")) throw error;
    const message = "This address already signs in. Ask the person for another one.";
    throw refused(refusal("email-taken", message, "email"));
  }
});

/** Sends the link once more to someone who has not joined yet; the earlier one stops working. */
export const sendInvitationAgain = verb("staff.manage", staffMemberIdInput, (ctx, { staffMemberId }) =>
  inTransaction(ctx, async (tx) => {
    const member = await loadRecord(tx, staffMembers, staffMemberId, "colleague", { lock: true });
    refuseIf(checkReachOfRoles(tx.roles, await rolesOf(tx, staffMemberId)));
    const [account] = await tx.db
      .select()
      .from(staffAccounts)
      .where(and(eq(staffAccounts.practiceId, tx.practiceId), eq(staffAccounts.staffMemberId, staffMemberId)))
      .limit(1);
    if (!member.isActive || !account || account.passwordHash !== null)
      throw refused(
        refusal(
          "not-waiting",
          "This person does not wait for an invitation. Reload the list and look again.",
        ),
      );
    await sendInvitation(tx, staffMemberId, member.givenName, account.email);
    await recordAudit(tx, {
      action: "staff-member.invited-again",
      subjectKind: "staff-member",
      subjectId: staffMemberId,
    });
    return { staffMemberId };
  }),
);

async function sendInvitation(tx: Context, staffMemberId: string, greetingName: string, email: string) {
  const member = { practiceId: tx.practiceId, staffMemberId };
  const { id, token, validFor } = await issueAccountToken(tx, member, "invitation");
  await enqueueMessage(tx, {
    template: "staff-invitation",
    toAddress: email,
    payload: { greetingName, path: `/invitation/${token}`, validFor, invitedBy: tx.staffName },
    aboutKind: "staff-member",
    aboutId: staffMemberId,
    dedupeKey: `staff-invitation:${id}`,
  });
}
