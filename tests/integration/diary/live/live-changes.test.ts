import { connect } from "@withy/db/client";
import { sessions, staffRoles } from "@withy/db/schema";
import { getDiaryWatch } from "@withy/services/diary";
import { and, eq } from "drizzle-orm";
import { afterAll, beforeAll, describe, expect, it, vi } from "vitest";
import { contextFor } from "../../../support/contexts";
import { buildPractice, type TestPractice } from "../../../support/practice";
import { bookedVisit, failureOf } from "../booking-steps";
import { type LiveProcess, openBrowser, openProcess, openSession, writeLater } from "./live-steps";

const writes = 300;

let practice: TestPractice;
let processes: [LiveProcess, LiveProcess];
let visitId: string;

beforeAll(async () => {
  practice = await buildPractice();
  processes = [openProcess(), openProcess()];
  visitId = (await bookedVisit(practice, "2026-12-02T10:00")).visit.id;
});

afterAll(async () => {
  for (const { connection } of processes) await connection.close();
});

/** Mulberry32: the same waits and places on every run. */
function randomOf(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let t = Math.imul(state ^ (state >>> 15), 1 | state);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) / 2 ** 32;
  };
}

const wait = (ms: number) => new Promise((resolve) => setTimeout(resolve, ms));

describe("live changes", () => {
  it("reach every stream of two processes once each, whatever the order of commits and across a reconnection", async () => {
    const [one, two] = processes;
    const { saltgate, tollhouse } = practice.sites;
    const sessionId = await openSession(practice, "owner");
    const both = [saltgate.id, tollhouse.id];
    const steady = openBrowser(practice, sessionId, both);
    const other = openBrowser(practice, sessionId, both);
    const atTollhouse = openBrowser(practice, sessionId, [tollhouse.id]);
    const restless = openBrowser(practice, sessionId, both);
    steady.join(one);
    other.join(two);
    atTollhouse.join(two);
    restless.join(one);
    await vi.waitFor(() => expect(restless.cursor()).not.toBeNull());
    const booking = steady.taken.length;

    const random = randomOf(20_261_201);
    const writers = Array.from({ length: 6 }, () =>
      connect(process.env.DATABASE_URL ?? "", { connectionLimit: 5 }),
    );
    const written: { id: string; siteId: string }[] = [];
    const work = Array.from({ length: writes }, async (_, n) => {
      const siteId = random() < 0.5 ? saltgate.id : tollhouse.id;
      const waitMs = Math.floor(random() * 500);
      await wait(Math.floor(random() * 2000));
      const writer = writers[n % writers.length];
      if (!writer) return;
      written.push({ id: await writeLater(writer, practice, visitId, siteId, waitMs), siteId });
    });
    const reconnections = (async () => {
      for (let n = 0; n < 5; n += 1) {
        await wait(350);
        restless.leave();
        await wait(120);
        // It comes back to the other process, with what it heard last and nothing else.
        restless.join(n % 2 === 0 ? two : one);
      }
    })();
    await Promise.all([...work, reconnections]);
    expect(written).toHaveLength(writes);
    expect(written.map(({ id }) => id)).not.toEqual(written.map(({ id }) => id).sort());

    const all = written.map(({ id }) => id).sort();
    const ofTollhouse = written.filter(({ siteId }) => siteId === tollhouse.id).map(({ id }) => id);
    const own = (ids: readonly string[]) => ids.filter((id) => all.includes(id)).sort();
    await vi.waitFor(() => {
      for (const browser of [steady, other, restless]) expect(own(browser.taken)).toEqual(all);
      expect(own(atTollhouse.taken)).toEqual([...ofTollhouse].sort());
    });
    await wait(300);
    // A stream that was never cut is told nothing twice even without its inbox.
    for (const browser of [steady, other]) expect(own(browser.ofThisStream())).toEqual(all);
    expect(atTollhouse.taken).toHaveLength(ofTollhouse.length);
    expect(steady.taken).toHaveLength(booking + writes);
    for (const browser of [steady, other, atTollhouse, restless]) browser.leave();
    for (const writer of writers) await writer.close();
    expect(processes.flatMap(({ faults }) => faults)).toEqual([]);
  });

  it("end with the session and with the reach of its roles, within a round", async () => {
    const own = await buildPractice();
    const ended = openBrowser(own, await openSession(own, "owner"), [own.sites.saltgate.id]);
    const moved = openBrowser(own, await openSession(own, "receptionist"), [own.sites.saltgate.id]);
    const stays = openBrowser(own, await openSession(own, "tollhouseReceptionist"), [own.sites.tollhouse.id]);
    const beyond = openBrowser(own, await openSession(own, "tollhouseReceptionist"), [own.sites.saltgate.id]);
    for (const browser of [ended, moved, stays, beyond]) browser.join(processes[0]);
    await vi.waitFor(() => expect(stays.cursor()).not.toBeNull());
    expect(beyond.hasEnded()).toBe(true);
    expect([ended.hasEnded(), moved.hasEnded()]).toEqual([false, false]);
    await own.db
      .update(sessions)
      .set({ revokedAt: new Date() })
      .where(and(eq(sessions.practiceId, own.practiceId), eq(sessions.staffMemberId, own.staff.owner.id)));
    await own.db
      .delete(staffRoles)
      .where(
        and(
          eq(staffRoles.practiceId, own.practiceId),
          eq(staffRoles.staffMemberId, own.staff.receptionist.id),
        ),
      );
    await vi.waitFor(() => expect([ended.hasEnded(), moved.hasEnded()]).toEqual([true, true]));
    expect(stays.hasEnded()).toBe(false);
    stays.leave();
  });

  it("are those of one's own practice alone", async () => {
    const other = await buildPractice();
    const stranger = openBrowser(other, await openSession(other, "owner"), [practice.sites.saltgate.id]);
    stranger.join(processes[0]);
    await vi.waitFor(() => expect(stranger.cursor()).not.toBeNull());
    await bookedVisit(practice, "2026-12-02T11:00");
    await wait(300);
    expect(stranger.taken).toEqual([]);
    stranger.leave();
  });
});

describe("where a stream goes on", () => {
  const watch = (after?: string) =>
    getDiaryWatch(contextFor(practice, "receptionist"), after === undefined ? {} : { after });

  it("is from now on at first, from the last event on a reconnection, anew where that is too old", async () => {
    const siteIds = [practice.sites.saltgate.id];
    expect(await watch()).toEqual({ siteIds, since: null, mustReload: false });
    const minuteAgo = Date.now() - 60_000;
    expect(await watch(String(minuteAgo))).toEqual({ siteIds, since: minuteAgo, mustReload: false });
    for (const after of [String(Date.now() - 3_600_000), "yesterday", "1e3", "-5", "99999999999999999999"])
      expect(await watch(after), after).toEqual({ siteIds, since: null, mustReload: true });
  });

  it("is nowhere for sites beyond reach or without the permission", async () => {
    const tollhouse = { siteIds: practice.sites.tollhouse.id };
    const refusal = await failureOf(getDiaryWatch(contextFor(practice, "receptionist"), tollhouse));
    expect(refusal.code).toBe("not-found");
    expect((await failureOf(getDiaryWatch(contextFor(practice, "accounts"), {}))).code).toBe("forbidden");
  });
});
