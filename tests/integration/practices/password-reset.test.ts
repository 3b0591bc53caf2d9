import { accountTokens, sessions, staffMembers } from "@withy/db/schema";
import {
  createResetLimits,
  createSignInLimits,
  openAccountLink,
  readSession,
  requestPasswordReset,
  setPasswordByLink,
  signIn,
} from "@withy/services/practices";
import { and, eq } from "drizzle-orm";
import { beforeAll, describe, expect, test } from "vitest";
import { demoPassword } from "../../../scripts/settings.mjs";
import { auditOf, messagesAbout } from "../../support/audit-rows";
import { testConnection } from "../../support/connection";
import { systemContextFor } from "../../support/contexts";
import { buildPractice, type TestPractice } from "../../support/practice";

const newPassword = "willow basket nine";
const databaseName = new URL(process.env.DATABASE_URL ?? "").pathname.slice(1);
const resetLimits = () => createResetLimits(testConnection(), databaseName);
const signInLimits = () => createSignInLimits(testConnection(), databaseName);

let address = 0;
const ask = (practice: TestPractice, email: string) => {
  address += 1;
  return requestPasswordReset(systemContextFor(practice), resetLimits(), {
    email,
    address: `${practice.practiceId} ${address}`,
  });
};

async function linksTo(practice: TestPractice, memberId: string): Promise<string[]> {
  const messages = await messagesAbout(practice, memberId);
  return messages.map((m) => String(m.payload.path).replace("/reset/", ""));
}

const signInWith = (practice: TestPractice, email: string, password: string) =>
  signIn(systemContextFor(practice), signInLimits(), {
    email,
    password,
    address: practice.practiceId,
    userAgent: "test",
  });

let practice: TestPractice;
beforeAll(async () => {
  practice = await buildPractice();
});

test("the link comes by e-mail, sets the password once, and ends what was open", async () => {
  const member = practice.staff.therapist;
  const opened = await signInWith(practice, member.email, demoPassword);
  await ask(practice, `  ${member.email.toUpperCase()} `);
  const [message] = await messagesAbout(practice, member.id);
  expect(message).toMatchObject({ template: "password-reset", toAddress: member.email, state: "waiting" });
  const [token = ""] = await linksTo(practice, member.id);
  expect(token).toMatch(/^[\w-]{43}$/);

  const link = { token, purpose: "reset" as const };
  expect(await openAccountLink(systemContextFor(practice), link)).toEqual({
    name: "Ana",
    email: member.email,
    practiceName: "Marram Physiotherapy",
  });
  await setPasswordByLink(systemContextFor(practice), { ...link, password: newPassword });
  expect(await readSession(systemContextFor(practice), opened.sessionId)).toBeNull();
  await expect(signInWith(practice, member.email, demoPassword)).rejects.toMatchObject({
    kind: "wrong-sign-in",
  });
  expect((await signInWith(practice, member.email, newPassword)).staffMemberId).toBe(member.id);

  const again = setPasswordByLink(systemContextFor(practice), { ...link, password: "another basket ten" });
  await expect(again).rejects.toMatchObject({ kind: "link-ended" });
  expect(await openAccountLink(systemContextFor(practice), link)).toBeNull();
  const actions = (await auditOf(practice, member.id)).map((a) => a.action);
  expect(actions).toEqual(expect.arrayContaining(["account.reset-asked", "account.password-reset"]));
});

test("only the hash of a token is kept", async () => {
  const member = practice.staff.accounts;
  await ask(practice, member.email);
  const [token = ""] = await linksTo(practice, member.id);
  const rows = await practice.db
    .select()
    .from(accountTokens)
    .where(
      and(eq(accountTokens.practiceId, practice.practiceId), eq(accountTokens.staffMemberId, member.id)),
    );
  expect(rows).toHaveLength(1);
  expect(JSON.stringify(rows)).not.toContain(token);
});

test("an unknown address and one of someone who left get the same answer and no message", async () => {
  const member = practice.staff.tollhouseReceptionist;
  await practice.db
    .update(staffMembers)
    .set({ isActive: false })
    .where(and(eq(staffMembers.practiceId, practice.practiceId), eq(staffMembers.id, member.id)));
  await expect(ask(practice, "nobody@marram.example")).resolves.toBeUndefined();
  await expect(ask(practice, member.email)).resolves.toBeUndefined();
  expect(await messagesAbout(practice, member.id)).toEqual([]);
});

describe("a link stops working", () => {
  test("after an hour", async () => {
    const own = await buildPractice();
    await ask(own, own.staff.owner.email);
    const [token = ""] = await linksTo(own, own.staff.owner.id);
    own.clock.advance(59);
    expect(await openAccountLink(systemContextFor(own), { token, purpose: "reset" })).not.toBeNull();
    own.clock.advance(1);
    expect(await openAccountLink(systemContextFor(own), { token, purpose: "reset" })).toBeNull();
  });

  test("when a newer one was asked for", async () => {
    const own = await buildPractice();
    await ask(own, own.staff.owner.email);
    own.clock.advance(1);
    await ask(own, own.staff.owner.email);
    const [first = "", second = ""] = await linksTo(own, own.staff.owner.id);
    expect(await openAccountLink(systemContextFor(own), { token: first, purpose: "reset" })).toBeNull();
    expect(await openAccountLink(systemContextFor(own), { token: second, purpose: "reset" })).not.toBeNull();
  });

  test("for another purpose, or where it is guessed", async () => {
    const own = await buildPractice();
    await ask(own, own.staff.owner.email);
    const [token = ""] = await linksTo(own, own.staff.owner.id);
    expect(await openAccountLink(systemContextFor(own), { token, purpose: "invitation" })).toBeNull();
    const guessed = "A".repeat(43);
    expect(await openAccountLink(systemContextFor(own), { token: guessed, purpose: "reset" })).toBeNull();
    expect(await openAccountLink(systemContextFor(own), { token: "x", purpose: "reset" })).toBeNull();
  });
});

test("two who use one link at once: one of them sets the password", async () => {
  const own = await buildPractice();
  await ask(own, own.staff.owner.email);
  const [token = ""] = await linksTo(own, own.staff.owner.id);
  const use = (password: string) =>
    setPasswordByLink(systemContextFor(own), { token, purpose: "reset", password });
  const answers = await Promise.allSettled([use("willow basket nine"), use("salt marsh eleven")]);
  expect(answers.map((a) => a.status).toSorted()).toEqual(["fulfilled", "rejected"]);
});

test("a password that is short or easy to guess is refused beside its field, and the link still works", async () => {
  const own = await buildPractice();
  await ask(own, own.staff.owner.email);
  const [token = ""] = await linksTo(own, own.staff.owner.id);
  const use = (password: string) =>
    setPasswordByLink(systemContextFor(own), { token, purpose: "reset", password });
  await expect(use("short")).rejects.toMatchObject({
    kind: "password-short",
    fields: [{ field: "password" }],
  });
  await expect(use("my password is long")).rejects.toMatchObject({ kind: "password-obvious" });
  await expect(use("willow basket nine")).resolves.toEqual({ email: own.staff.owner.email });
});

test("asking too often is refused, for an address that exists and for one that does not", async () => {
  for (const email of [practice.staff.receptionist.email, `nobody.${practice.practiceId}@marram.example`]) {
    for (let i = 0; i < 5; i += 1) await ask(practice, email);
    await expect(ask(practice, email)).rejects.toMatchObject({ code: "refused", kind: "too-many-tries" });
  }
});

test("sessions of other people stay open", async () => {
  const own = await buildPractice();
  const other = await signInWith(own, own.staff.accounts.email, demoPassword);
  await ask(own, own.staff.owner.email);
  const [token = ""] = await linksTo(own, own.staff.owner.id);
  await setPasswordByLink(systemContextFor(own), { token, purpose: "reset", password: newPassword });
  const [row] = await own.db.select().from(sessions).where(eq(sessions.id, other.sessionId));
  expect(row?.revokedAt).toBeNull();
});
