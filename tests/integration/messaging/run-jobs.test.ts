import { refused } from "@withy/core/errors";
import { newId } from "@withy/core/ids";
import { refusal } from "@withy/core/refusal";
import { diaryClaims, jobs } from "@withy/db/schema";
import { recordAudit } from "@withy/services/audit";
import {
  beatHeart,
  checkHealth,
  type JobHandler,
  pruneOldClaims,
  runNextJob,
  stopHeart,
} from "@withy/services/messaging";
import { inTransaction } from "@withy/services/transaction";
import { and, eq } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import { auditOf } from "../../support/audit-rows";
import { systemContextFor } from "../../support/contexts";
import { buildPractice, type TestPractice } from "../../support/practice";
import { enqueueBooking } from "./outbox-support";

let practice: TestPractice;
beforeAll(async () => {
  practice = await buildPractice();
});

async function addJob(kind: string, values: Partial<typeof jobs.$inferInsert> = {}): Promise<string> {
  const id = newId();
  const now = practice.clock.now();
  const job = { id, practiceId: practice.practiceId, kind, input: { n: 3 }, dueAt: now, createdAt: now };
  await practice.db.insert(jobs).values({ ...job, ...values });
  return id;
}
async function jobRow(id: string) {
  const [row] = await practice.db.select().from(jobs).where(eq(jobs.id, id));
  return row;
}

describe("jobs", () => {
  it("run once, with their input, and show how far they are", async () => {
    const id = await addJob("count");
    const seen: unknown[] = [];
    const handlers = {
      count: async (
        _: unknown,
        run: { row: { input: unknown }; progress(done: number, total: number): Promise<void> },
      ) => {
        seen.push(run.row.input);
        await run.progress(1, 3);
        seen.push((await jobRow(id))?.progressDone);
        await run.progress(3, 3);
      },
    };
    const options = { workerId: "w1", handlers };
    expect(await runNextJob(systemContextFor(practice), options)).toBe(true);
    expect(await runNextJob(systemContextFor(practice), options)).toBe(false);
    expect(seen).toEqual([{ n: 3 }, 1]);
    expect(await jobRow(id)).toMatchObject({ state: "done", progressDone: 3, progressTotal: 3, attempts: 1 });
  });

  it("are tried again after a failure, and given up visibly", async () => {
    const id = await addJob("break");
    const faults: string[] = [];
    const options = {
      workerId: "w1",
      handlers: {
        break: async () => {
          throw new TypeError("secret detail");
        },
      },
      onFault: (fault: { kind: string }) => faults.push(fault.kind),
    };
    for (let tries = 0; tries < 20 && (await jobRow(id))?.state !== "failed"; tries += 1) {
      await runNextJob(systemContextFor(practice), options);
      practice.clock.advance(1441);
    }
    expect(faults.length).toBe(8);
    expect(await jobRow(id)).toMatchObject({ state: "failed", attempts: 8, lastError: "TypeError" });
  });

  it("are taken up again where their worker was killed", async () => {
    const id = await addJob("hang");
    void runNextJob(systemContextFor(practice), {
      workerId: "killed",
      handlers: { hang: () => new Promise(() => {}) },
    });
    await expect.poll(async () => (await jobRow(id))?.state).toBe("claimed");
    practice.clock.advance(6);
    expect(
      await runNextJob(systemContextFor(practice), { workerId: "w2", handlers: { hang: async () => {} } }),
    ).toBe(true);
    expect(await jobRow(id)).toMatchObject({ state: "done", attempts: 2 });
  });
});

describe("a job that a person waits for", () => {
  const askedFor = () => ({ requestedBy: practice.staff.accounts.id, liveKey: newId() });
  const runWith = (kind: string, handler: JobHandler, more: Partial<Parameters<typeof runNextJob>[1]> = {}) =>
    runNextJob(systemContextFor(practice), { workerId: "w1", handlers: { [kind]: handler }, ...more });

  it("fails at once on a refusal, with its sentence, and is no fault", async () => {
    const id = await addJob("refuse", askedFor());
    const faults: unknown[] = [];
    const refuse = async () => {
      throw refused(refusal("too-late", "The month is closed. Choose another."));
    };
    await runWith("refuse", refuse, { onFault: (fault) => faults.push(fault) });
    const failed = { state: "failed", attempts: 1, problem: "The month is closed. Choose another." };
    expect(await jobRow(id)).toMatchObject({ ...failed, liveKey: null });
    expect(faults).toEqual([]);
  });

  it("is given up after three tries, and says what to do", async () => {
    const id = await addJob("stumble", askedFor());
    const stumble = async () => {
      throw new TypeError("secret detail");
    };
    for (let tries = 0; tries < 6; tries += 1) {
      await runWith("stumble", stumble);
      practice.clock.advance(20);
    }
    const row = await jobRow(id);
    expect(row).toMatchObject({ state: "failed", attempts: 3, liveKey: null });
    expect(row?.problem).toMatch(/start it again/);
    expect(row?.problem).not.toContain("secret");
  });

  it("goes back to the queue where its worker is asked to stop, and the try does not count", async () => {
    const id = await addJob("long", askedFor());
    const control = new AbortController();
    const long: JobHandler = async (_, run) => {
      await run.progress(1, 2, { result: { made: 1 } });
      run.pauseIfAsked();
      control.abort();
      run.pauseIfAsked();
    };
    await runWith("long", long, { signal: control.signal });
    expect(await jobRow(id)).toMatchObject({ state: "waiting", attempts: 0, result: { made: 1 } });
    await runWith("long", async (_, run) => run.progress(2, 2));
    expect(await jobRow(id)).toMatchObject({ state: "done", attempts: 1, result: { made: 1 } });
  });

  it("takes its last part back where another worker holds it by now", async () => {
    const id = await addJob("slow", askedFor());
    const about = newId();
    const slow: JobHandler = async (ctx, run) => {
      await practice.db.update(jobs).set({ claimedBy: "w2" }).where(eq(jobs.id, id));
      await inTransaction(ctx, async (tx) => {
        const actor = { ...tx, practiceId: practice.practiceId };
        await recordAudit(actor, { action: "trial.made", subjectKind: "trial", subjectId: about });
        await run.progress(1, 1, { within: tx });
      });
    };
    await runWith("slow", slow);
    expect(await jobRow(id)).toMatchObject({ state: "claimed", claimedBy: "w2", progressDone: 0 });
    expect(await auditOf(practice, about)).toEqual([]);
    await practice.db.update(jobs).set({ state: "done" }).where(eq(jobs.id, id));
  });
});

describe("the worker's heartbeat", () => {
  it("makes health well, and its end makes it not well", async () => {
    const ctx = systemContextFor(practice);
    practice.clock.set("2031-01-01T00:00:00Z");
    expect((await checkHealth(ctx)).worker).toBe("not ok");
    await beatHeart(ctx, "w1", practice.clock.now());
    expect(await checkHealth(ctx)).toMatchObject({ isWell: true, worker: "ok" });
    practice.clock.advance(1);
    expect((await checkHealth(ctx)).worker).toBe("not ok");
    await beatHeart(ctx, "w1", practice.clock.now());
    await stopHeart(ctx, "w1");
    expect((await checkHealth(ctx)).isWell).toBe(false);
  });
});

describe("old claims of the diary", () => {
  it("go after 60 days and not before", async () => {
    practice.clock.set("2026-12-01T09:00:00Z");
    const { appointmentId } = await enqueueBooking(
      practice,
      "claims@post.example",
      new Date("2026-12-02T10:00:00Z"),
    );
    const claim = (slotAt: string) => ({
      practiceId: practice.practiceId,
      resourceId: practice.staff.therapist.id,
      slotAt: new Date(slotAt),
      appointmentId,
    });
    await practice.db
      .insert(diaryClaims)
      .values([claim("2026-10-02T08:55:00Z"), claim("2026-10-02T09:05:00Z")]);
    expect(await pruneOldClaims(systemContextFor(practice))).toBeGreaterThanOrEqual(1);
    const left = await practice.db
      .select({ slotAt: diaryClaims.slotAt })
      .from(diaryClaims)
      .where(
        and(eq(diaryClaims.practiceId, practice.practiceId), eq(diaryClaims.appointmentId, appointmentId)),
      );
    expect(left.map((row) => row.slotAt.toISOString())).toEqual(["2026-10-02T09:05:00.000Z"]);
  });
});
