import type { InviteStaffMemberInput } from "@withy/contracts/practices";
import { newId } from "@withy/core/ids";
import { staffMembers } from "@withy/db/schema";
import {
  changePassword,
  changeRoles,
  createSignInLimits,
  deactivateStaff,
  endSession,
  inviteStaffMember,
  listMySessions,
  listStaff,
  reactivateStaff,
  readSession,
  sendInvitationAgain,
  setPasswordByLink,
  signIn,
} from "@withy/services/practices";
import { eq } from "drizzle-orm";
import { beforeAll, describe, expect, test } from "vitest";
import { demoPassword } from "../../../scripts/settings.mjs";
import { auditOf, messagesAbout } from "../../support/audit-rows";
import { testConnection } from "../../support/connection";
import { contextFor, systemContextFor } from "../../support/contexts";
import { addAppointment } from "../../support/diary-rows";
import { addPatient } from "../../support/people";
import { buildPractice, type TestPractice } from "../../support/practice";
import type { TestPerson } from "../../support/practice-staff";

const databaseName = new URL(process.env.DATABASE_URL ?? "").pathname.slice(1);

const signInAs = (practice: TestPractice, email: string, password = demoPassword) =>
  signIn(systemContextFor(practice), createSignInLimits(testConnection(), databaseName), {
    email,
    password,
    address: practice.practiceId,
    userAgent: "Mozilla/5.0 (Windows NT 10.0; rv:140.0) Gecko/20100101 Firefox/140.0",
  });

/** The context that a person really has: read from their session. */
async function sessionOf(practice: TestPractice, person: TestPerson) {
  const { sessionId } = await signInAs(practice, practice.staff[person].email);
  const session = await readSession(systemContextFor(practice), sessionId);
  if (!session) throw new Error("The session did not open.");
  return session.context;
}

let practice: TestPractice;
beforeAll(async () => {
  practice = await buildPractice();
});
const owner = () => contextFor(practice, "owner");

let invited = 0;
function invitation(values: Partial<InviteStaffMemberInput> = {}): InviteStaffMemberInput {
  invited += 1;
  return {
    givenName: "Kerensa",
    familyName: "Boase",
    email: `kerensa${invited}.${practice.practiceId.slice(-12)}@marram.example`,
    jobTitle: "physiotherapist",
    registrationNumber: "ph 104455",
    homeSiteId: practice.sites.saltgate.id,
    roles: [{ role: "therapist", siteId: null }],
    ...values,
  };
}

async function invitationLink(staffMemberId: string): Promise<string> {
  const messages = await messagesAbout(practice, staffMemberId);
  return String(messages.at(-1)?.payload.path).replace("/invitation/", "");
}

describe("a colleague is invited", () => {
  test("joins by the link, and signs in with the role that was given", async () => {
    const form = invitation();
    const { staffMemberId } = await inviteStaffMember(owner(), form);
    const [message] = await messagesAbout(practice, staffMemberId);
    expect(message).toMatchObject({ template: "staff-invitation", toAddress: form.email });
    expect(message?.payload).toMatchObject({ greetingName: "Kerensa", invitedBy: "Morwenna Teague" });
    const listed = (await listStaff(owner(), {})).find((row) => row.id === staffMemberId);
    expect(listed).toMatchObject({ hasJoined: false, isTherapist: true });

    const token = await invitationLink(staffMemberId);
    const password = "samphire on the step";
    await setPasswordByLink(systemContextFor(practice), { token, purpose: "invitation", password });
    const { sessionId } = await signInAs(practice, form.email, password);
    const session = await readSession(systemContextFor(practice), sessionId);
    expect(session?.context.roles).toEqual([{ role: "therapist", siteId: null }]);
    expect((await listStaff(owner(), {})).find((row) => row.id === staffMemberId)?.hasJoined).toBe(true);
    const actions = (await auditOf(practice, staffMemberId)).map((a) => a.action);
    expect(actions).toEqual(["staff-member.invited", "account.joined"]);
  });

  test("gets a second link, and the first one stops", async () => {
    const { staffMemberId } = await inviteStaffMember(owner(), invitation());
    const first = await invitationLink(staffMemberId);
    practice.clock.advance(1);
    await sendInvitationAgain(owner(), { staffMemberId });
    const second = await invitationLink(staffMemberId);
    const use = (token: string) =>
      setPasswordByLink(systemContextFor(practice), {
        token,
        purpose: "invitation",
        password: "samphire on the step",
      });
    await expect(use(first)).rejects.toMatchObject({ kind: "link-ended" });
    await expect(use(second)).resolves.toBeDefined();
    await expect(sendInvitationAgain(owner(), { staffMemberId })).rejects.toMatchObject({
      kind: "not-waiting",
    });
  });

  test("not with an address that signs in already, nor to another practice's site", async () => {
    const other = await buildPractice();
    await expect(
      inviteStaffMember(owner(), invitation({ email: practice.staff.therapist.email })),
    ).rejects.toMatchObject({ kind: "email-taken", fields: [{ field: "email" }] });
    for (const values of [
      { homeSiteId: other.sites.saltgate.id },
      { roles: [{ role: "receptionist" as const, siteId: other.sites.saltgate.id }] },
    ])
      await expect(inviteStaffMember(owner(), invitation(values))).rejects.toMatchObject({
        code: "not-found",
      });
  });

  test("not by anyone but an owner, and by an owner of one site only there", async () => {
    for (const person of ["therapist", "receptionist", "accounts"] as const)
      await expect(inviteStaffMember(contextFor(practice, person), invitation())).rejects.toMatchObject({
        code: "forbidden",
      });
    const atSaltgate = contextFor(practice, "owner", {
      roles: [{ role: "owner", siteId: practice.sites.saltgate.id }],
    });
    await expect(inviteStaffMember(atSaltgate, invitation())).rejects.toMatchObject({
      kind: "roles-beyond-reach",
    });
    const roles = [{ role: "receptionist" as const, siteId: practice.sites.saltgate.id }];
    await expect(inviteStaffMember(atSaltgate, invitation({ roles }))).resolves.toBeDefined();
  });
});

describe("roles", () => {
  test("work from the next request on", async () => {
    const own = await buildPractice();
    const before = await sessionOf(own, "receptionist");
    const staffMemberId = own.staff.receptionist.id;
    await changeRoles(contextFor(own, "owner"), {
      staffMemberId,
      roles: [
        { role: "accounts", siteId: null },
        { role: "accounts", siteId: null },
      ],
    });
    const after = await readSession(systemContextFor(own), before.sessionId);
    expect(after?.context.roles).toEqual([{ role: "accounts", siteId: null }]);
    const [audit] = await auditOf(own, staffMemberId);
    expect(audit).toMatchObject({ action: "staff-member.roles-changed" });
  });

  test("never leave a practice without an owner", async () => {
    const own = await buildPractice();
    const give = (staffMemberId: string) =>
      changeRoles(contextFor(own, "owner"), { staffMemberId, roles: [{ role: "therapist", siteId: null }] });
    await give(own.staff.owningTherapist.id);
    await expect(give(own.staff.owner.id)).rejects.toMatchObject({ kind: "last-owner" });
  });

  test("of another practice's people are not found", async () => {
    const other = await buildPractice();
    for (const staffMemberId of [other.staff.therapist.id, newId()]) {
      const roles = [{ role: "owner" as const, siteId: null }];
      await expect(changeRoles(owner(), { staffMemberId, roles })).rejects.toMatchObject({
        code: "not-found",
      });
      await expect(deactivateStaff(owner(), { staffMemberId })).rejects.toMatchObject({ code: "not-found" });
      await expect(sendInvitationAgain(owner(), { staffMemberId })).rejects.toMatchObject({
        code: "not-found",
      });
    }
  });
});

describe("access ends", () => {
  test("at once, and says what is left to cover", async () => {
    const own = await buildPractice();
    const member = own.staff.therapist;
    const before = await sessionOf(own, "therapist");
    const patient = await addPatient(own);
    await addAppointment(own, { patientId: patient.id, day: "2026-12-02", time: "10:00" });
    const answer = await deactivateStaff(contextFor(own, "owner"), { staffMemberId: member.id });
    expect(answer).toEqual({ staffMemberId: member.id, endedSessions: 1, upcomingVisits: 1 });
    expect(await readSession(systemContextFor(own), before.sessionId)).toBeNull();
    await expect(signInAs(own, member.email)).rejects.toMatchObject({ kind: "wrong-sign-in" });
    await reactivateStaff(contextFor(own, "owner"), { staffMemberId: member.id });
    expect((await signInAs(own, member.email)).staffMemberId).toBe(member.id);
  });

  test("not one's own, nor the last owner's", async () => {
    const own = await buildPractice();
    const end = (staffMemberId: string) => deactivateStaff(contextFor(own, "owner"), { staffMemberId });
    await expect(end(own.staff.owner.id)).rejects.toMatchObject({ kind: "own-account" });
    await own.db.update(staffMembers).set({ isActive: false }).where(eq(staffMembers.id, own.staff.owner.id));
    await expect(end(own.staff.owningTherapist.id)).rejects.toMatchObject({ kind: "last-owner" });
  });
});

describe("one's own sign-in", () => {
  test("a new password ends the other sessions and keeps this one", async () => {
    const own = await buildPractice();
    const [here, there] = [await sessionOf(own, "therapist"), await sessionOf(own, "therapist")];
    const change = (currentPassword: string, password: string) =>
      changePassword(here, { currentPassword, password });
    await expect(change("not my password at all", "willow basket nine")).rejects.toMatchObject({
      kind: "wrong-password",
      fields: [{ field: "currentPassword" }],
    });
    await expect(change(demoPassword, "short")).rejects.toMatchObject({ kind: "password-short" });
    expect(await change(demoPassword, "willow basket nine")).toEqual({ endedSessions: 1 });
    expect(await readSession(systemContextFor(own), here.sessionId)).not.toBeNull();
    expect(await readSession(systemContextFor(own), there.sessionId)).toBeNull();
  });

  test("sessions are listed and ended one by one, never another person's", async () => {
    const own = await buildPractice();
    const here = await sessionOf(own, "therapist");
    own.clock.advance(5);
    const there = await sessionOf(own, "therapist");
    const strange = await sessionOf(own, "accounts");
    const listed = await listMySessions(here, {});
    expect(listed.map((row) => [row.id, row.isThisOne])).toEqual([
      [there.sessionId, false],
      [here.sessionId, true],
    ]);
    expect(listed[0]?.browser).toBe("Firefox on Windows");
    await endSession(here, { sessionId: there.sessionId });
    expect(await readSession(systemContextFor(own), there.sessionId)).toBeNull();
    await expect(endSession(here, { sessionId: strange.sessionId })).rejects.toMatchObject({
      code: "not-found",
    });
    own.clock.advance(121);
    expect(await listMySessions(here, {})).toEqual([]);
  });
});
