import { mostVisitsAtOnce } from "@withy/billing/draft-groups";
import { newId } from "@withy/core/ids";
import { auditEvents, invoiceLines, staffMembers } from "@withy/db/schema";
import { draftInvoicesFromVisits, getDraftingJob, listToIssue, startDrafting } from "@withy/services/billing";
import { and, eq } from "drizzle-orm";
import { beforeEach, describe, expect, it } from "vitest";
import { auditOf } from "../../support/audit-rows";
import { contextFor } from "../../support/contexts";
import { buildPractice, type TestPractice } from "../../support/practice";
import { attendedBy, interruptedBy, jobRow, killedAfter, standingOf, workOnce } from "./drafting-steps";
import { attend, draftFor } from "./invoice-steps";

let practice: TestPractice;
beforeEach(async () => {
  practice = await buildPractice();
});
const accounts = () => contextFor(practice, "accounts");

/** Runs what is due until this job has ended: other suites' jobs may stand in the same table. */
async function workUntilEnded(jobId: string) {
  for (let rounds = 0; rounds < 20; rounds += 1) {
    const view = await getDraftingJob(accounts(), { jobId });
    if (view.state === "done" || view.state === "failed") return view;
    await workOnce(practice);
  }
  throw new Error("The job did not end.");
}

describe("drafting as a job", () => {
  it("waits, counts visits as their drafts are made, and tells what came of it", async () => {
    await attendedBy(practice, 60, 2);
    const started = await startDrafting(accounts(), {});
    expect(started).toMatchObject({ state: "waiting", progressTotal: 0, result: null, problem: null });
    expect((await listToIssue(accounts(), {})).drafting).toMatchObject({ id: started.id });
    expect((await auditOf(practice, started.id)).map((a) => a.action)).toEqual(["drafting.started"]);

    void workOnce(practice, "killed", killedAfter(practice, 2));
    const half = { state: "running", progressDone: 100, progressTotal: 120 };
    await expect.poll(() => getDraftingJob(accounts(), { jobId: started.id })).toMatchObject(half);
    practice.clock.advance(6);
    expect(await workUntilEnded(started.id)).toMatchObject({
      state: "done",
      progressDone: 120,
      progressTotal: 120,
      result: { drafts: 60, visitsDrafted: 120, visitsWithoutPrice: 0 },
    });
    expect((await listToIssue(accounts(), {})).drafting).toBeNull();
  });

  it("goes on after a kill between two transactions with each visit on one line, each draft whole", async () => {
    await attendedBy(practice, 70, 2);
    const { id } = await startDrafting(accounts(), {});
    void workOnce(practice, "killed", killedAfter(practice, 2));
    await expect.poll(async () => (await jobRow(practice, id))?.progressDone).toBe(100);
    expect((await standingOf(practice)).lines).toHaveLength(100);
    practice.clock.advance(6);
    await workUntilEnded(id);
    const { lines, drafts } = await standingOf(practice);
    expect(new Set(lines.map((l) => l.appointmentId)).size).toBe(140);
    expect(lines).toHaveLength(140);
    expect(drafts.map((d) => d.totalPence)).toEqual(Array.from({ length: 70 }, () => 10_400));
    expect(await jobRow(practice, id)).toMatchObject({ attempts: 2, liveKey: null });
    const audits = await practice.db
      .select()
      .from(auditEvents)
      .where(
        and(
          eq(auditEvents.practiceId, practice.practiceId),
          eq(auditEvents.action, "invoice.drafted"),
          eq(auditEvents.requestId, id),
        ),
      );
    expect(audits.map((a) => a.actorId)).toEqual(
      Array.from({ length: 70 }, () => practice.staff.accounts.id),
    );
    expect(audits.every((a) => (a.detail as { visits: number }).visits === 2)).toBe(true);
  });

  it("is one for a person however often it is started, and two people at once double nothing", async () => {
    await attendedBy(practice, 30);
    const started = await Promise.all(Array.from({ length: 5 }, () => startDrafting(accounts(), {})));
    expect(new Set(started.map((s) => s.id)).size).toBe(1);
    const owners = await startDrafting(contextFor(practice, "owner"), {});
    expect(owners.id).not.toBe(started[0]?.id);
    await Promise.all([workOnce(practice, "w1"), workOnce(practice, "w2")]);
    const ends = [await workUntilEnded(owners.id), await workUntilEnded(started[0]?.id ?? "")];
    expect(ends.reduce((sum, end) => sum + (end.result?.visitsDrafted ?? 0), 0)).toBe(30);
    const { lines, drafts } = await standingOf(practice);
    expect(lines).toHaveLength(30);
    expect(drafts).toHaveLength(30);
    expect((await startDrafting(accounts(), {})).id).not.toBe(started[0]?.id);
  });

  it("takes every visit that waits, oldest without a price or not", async () => {
    const [patientId = ""] = await attendedBy(practice, 1);
    practice.clock.set("2026-02-01T09:00:00Z");
    await attend(practice, patientId, "2025-12-09");
    await attend(practice, patientId, "2026-01-06");
    const { id } = await startDrafting(accounts(), { patientId });
    expect(await workUntilEnded(id)).toMatchObject({
      result: { drafts: 1, visitsDrafted: 2, visitsWithoutPrice: 1 },
    });
  });
});

describe("who may", () => {
  it("is refused where the role may not draft, before and at the work itself", async () => {
    const therapist = contextFor(practice, "therapist");
    await expect(startDrafting(therapist, {})).rejects.toMatchObject({ code: "forbidden" });
    const { id } = await startDrafting(accounts(), {});
    await expect(getDraftingJob(therapist, { jobId: id })).rejects.toMatchObject({ code: "forbidden" });
    await attendedBy(practice, 1);
    await practice.db
      .update(staffMembers)
      .set({ isActive: false })
      .where(eq(staffMembers.id, practice.staff.accounts.id));
    const ended = await workUntilEnded(id);
    expect(ended).toMatchObject({ state: "failed", result: null });
    expect(ended.problem).toContain("no longer works here");
    expect((await standingOf(practice)).lines).toEqual([]);
  });

  it("drafts a receptionist's own site only", async () => {
    const [patientId = ""] = await attendedBy(practice, 1);
    const elsewhere = contextFor(practice, "tollhouseReceptionist");
    const siteId = practice.sites.saltgate.id;
    await expect(startDrafting(elsewhere, { siteId })).rejects.toMatchObject({ code: "not-found" });
    const { id } = await startDrafting(elsewhere, { patientId });
    expect(await workUntilEnded(id)).toMatchObject({ state: "done", result: { visitsDrafted: 0 } });
  });

  it("answers another practice's job, another kind's and none the same", async () => {
    const other = await buildPractice({ name: "Cairn & Firth Clinics" });
    const { id } = await startDrafting(contextFor(other, "accounts"), {});
    for (const jobId of [id, newId()])
      await expect(getDraftingJob(accounts(), { jobId })).rejects.toMatchObject({ code: "not-found" });
  });
});

describe("drafting at once", () => {
  it("takes as many visits as one request may, the oldest first", async () => {
    await attendedBy(practice, mostVisitsAtOnce + 5);
    expect(await draftInvoicesFromVisits(accounts(), {})).toMatchObject({ visitsDrafted: mostVisitsAtOnce });
    expect(await draftInvoicesFromVisits(accounts(), {})).toMatchObject({ visitsDrafted: 5 });
  });

  it("leaves out only the visit that somebody else drafts at that moment", async () => {
    const [perran = ""] = await attendedBy(practice, 1, 3);
    await attendedBy(practice, 4);
    const draft = await draftFor(practice, accounts());
    const waiting = (await listToIssue(accounts(), { patientId: perran })).visits;
    const [line] = (await standingOf(practice)).lines;
    if (!line) throw new Error("The draft has no line.");
    const taken = { ...line, id: newId(), position: 2, appointmentId: waiting[1]?.appointmentId ?? "" };
    const db = interruptedBy(practice, () => practice.db.insert(invoiceLines).values(taken));
    expect(await draftInvoicesFromVisits(contextFor(practice, "accounts", { db }), {})).toMatchObject({
      visitsDrafted: 6,
    });
    const { lines, drafts } = await standingOf(practice);
    expect(lines).toHaveLength(8);
    expect(drafts).toHaveLength(6);
    expect(drafts.find((d) => d.patientId === perran)?.totalPence).toBe(10_400);
    expect((await listToIssue(accounts(), { patientId: perran })).visits).toEqual([]);
    expect(drafts.some((d) => d.id === draft.id)).toBe(true);
  });

  it("doubles nothing where one drafts everything and others each a patient", async () => {
    const patientIds = await attendedBy(practice, 12, 3);
    const runs = await Promise.all([
      draftInvoicesFromVisits(accounts(), {}),
      ...patientIds.map((patientId) => draftInvoicesFromVisits(accounts(), { patientId })),
    ]);
    expect(runs.reduce((sum, run) => sum + run.visitsDrafted, 0)).toBe(36);
    const { lines, drafts } = await standingOf(practice);
    expect(lines).toHaveLength(36);
    expect(drafts.map((d) => d.totalPence)).toEqual(Array.from({ length: 12 }, () => 15_600));
  });
});
