import { newId } from "@withy/core/ids";
import { diaryClaims, jobs } from "@withy/db/schema";
import { beatHeart, checkHealth, pruneOldClaims, runNextJob, stopHeart } from "@withy/services/messaging";
import { and, eq } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import { systemContextFor } from "../../support/contexts";
import { buildPractice, type TestPractice } from "../../support/practice";
import { enqueueBooking } from "./outbox-support";

let practice: TestPractice;
beforeAll(async () => {
  practice = await buildPractice();
});

async function addJob(kind: string): Promise<string> {
  const id = newId();
  const now = practice.clock.now();
  await practice.db
    .insert(jobs)
    .values({ id, practiceId: practice.practiceId, kind, input: { n: 3 }, dueAt: now, createdAt: now });
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
