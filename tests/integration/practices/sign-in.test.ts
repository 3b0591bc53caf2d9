import { newId } from "@withy/core/ids";
import { sessions, staffMembers, staffRoles } from "@withy/db/schema";
import {
  createSignInLimits,
  readSession,
  type SignInInput,
  signIn,
  signOut,
  signOutEverywhere,
} from "@withy/services/practices";
import { and, eq } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import { demoPassword } from "../../../scripts/settings.mjs";
import { auditOf } from "../../support/audit-rows";
import { testConnection } from "../../support/connection";
import { contextFor, systemContextFor } from "../../support/contexts";
import { buildPractice, type TestPractice } from "../../support/practice";

let practice: TestPractice;
const limits = () =>
  createSignInLimits(testConnection(), new URL(process.env.DATABASE_URL ?? "").pathname.slice(1));
const tryIn = (email: string, password: string, more: Partial<SignInInput> = {}) =>
  signIn(systemContextFor(practice), limits(), {
    email,
    password,
    address: newId(),
    userAgent: "test",
    ...more,
  });
const live = (sessionId: string) => readSession(systemContextFor(practice), sessionId);

beforeAll(async () => {
  practice = await buildPractice();
});

describe("signing in", () => {
  it("opens a session for a right password, in any case and with spaces around the address", async () => {
    const email = practice.staff.receptionist.email;
    const opened = await tryIn(`  ${email.toUpperCase()} `, demoPassword);
    const session = await live(opened.sessionId);
    expect(session?.context.staffMemberId).toBe(practice.staff.receptionist.id);
    expect(session?.context.roles).toEqual([{ role: "receptionist", siteId: practice.sites.saltgate.id }]);
    const audit = await auditOf(practice, opened.sessionId);
    expect(audit.map((a) => a.action)).toEqual(["session.opened"]);
  });

  it("answers a wrong password and an unknown address with the same words", async () => {
    const wrong = await tryIn(practice.staff.therapist.email, "not the password at all").catch((e) => e);
    const unknown = await tryIn("nobody@marram.example", "not the password at all").catch((e) => e);
    expect(wrong.kind).toBe("wrong-sign-in");
    expect(unknown.kind).toBe("wrong-sign-in");
    expect(unknown.message).toBe(wrong.message);
  });

  it("makes an account wait after ten tries, and lets it in again when the time is over", async () => {
    const email = `throttle-${newId()}@marram.example`;
    for (let i = 0; i < 10; i += 1)
      expect((await tryIn(email, "wrong").catch((e) => e)).kind).toBe("wrong-sign-in");
    const eleventh = await tryIn(email, "wrong").catch((e) => e);
    expect(eleventh.kind).toBe("too-many-tries");
    expect(eleventh.message).toMatch(/Wait \d+ minutes/);
  });

  it("makes an address wait after sixty tries over many accounts", async () => {
    const address = newId();
    let last = "";
    for (let i = 0; i < 61; i += 1)
      last = (await tryIn(`a${i}-${address}@marram.example`, "wrong", { address }).catch((e) => e)).kind;
    expect(last).toBe("too-many-tries");
  });

  it("refuses a person who no longer works here", async () => {
    const leaver = practice.staff.tollhouseReceptionist;
    await testConnection()
      .db.update(staffMembers)
      .set({ isActive: false })
      .where(and(eq(staffMembers.practiceId, practice.practiceId), eq(staffMembers.id, leaver.id)));
    expect((await tryIn(leaver.email, demoPassword).catch((e) => e)).kind).toBe("wrong-sign-in");
    await testConnection()
      .db.update(staffMembers)
      .set({ isActive: true })
      .where(and(eq(staffMembers.practiceId, practice.practiceId), eq(staffMembers.id, leaver.id)));
  });
});

describe("a session", () => {
  it("ends at once when it is signed out", async () => {
    const opened = await tryIn(practice.staff.accounts.email, demoPassword);
    const session = await live(opened.sessionId);
    if (!session) throw new Error("the session should live");
    await signOut(session.context, {});
    expect(await live(opened.sessionId)).toBeNull();
  });

  it("ends everywhere for that person and for nobody else", async () => {
    const mine = [
      await tryIn(practice.staff.therapist.email, demoPassword),
      await tryIn(practice.staff.therapist.email, demoPassword),
    ];
    const other = await tryIn(practice.staff.accounts.email, demoPassword);
    await signOutEverywhere(contextFor(practice, "therapist"), {});
    for (const opened of mine) expect(await live(opened.sessionId)).toBeNull();
    expect(await live(other.sessionId)).not.toBeNull();
  });

  it("lapses when idle for two hours and after twelve in any case", async () => {
    const start = practice.clock.now();
    const idle = await tryIn(practice.staff.accounts.email, demoPassword);
    practice.clock.advance(119);
    expect(await live(idle.sessionId)).not.toBeNull();
    practice.clock.advance(121);
    expect(await live(idle.sessionId)).toBeNull();
    const busy = await tryIn(practice.staff.accounts.email, demoPassword);
    for (let i = 0; i < 11; i += 1) {
      practice.clock.advance(60);
      expect(await live(busy.sessionId)).not.toBeNull();
    }
    practice.clock.advance(60);
    expect(await live(busy.sessionId)).toBeNull();
    practice.clock.set(start);
  });

  it("loses a role in the request after it was taken away", async () => {
    const opened = await tryIn(practice.staff.accounts.email, demoPassword);
    const { db } = testConnection();
    const mine = and(
      eq(staffRoles.practiceId, practice.practiceId),
      eq(staffRoles.staffMemberId, practice.staff.accounts.id),
    );
    const before = await db.select().from(staffRoles).where(mine);
    await db.delete(staffRoles).where(mine);
    expect((await live(opened.sessionId))?.context.roles).toEqual([]);
    await db.insert(staffRoles).values(before);
    expect(await db.select().from(sessions).where(eq(sessions.id, opened.sessionId))).toHaveLength(1);
  });
});
