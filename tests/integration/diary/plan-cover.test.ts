import { newId } from "@withy/core/ids";
import { staffMembers } from "@withy/db/schema";
import {
  decideCoverMove,
  getCoverPlan,
  listCoverPlaces,
  listCoverPlans,
  planCover,
} from "@withy/services/diary";
import { eq } from "drizzle-orm";
import { beforeEach, describe, expect, it } from "vitest";
import { auditOf } from "../../support/audit-rows";
import { contextFor } from "../../support/contexts";
import { addAppointment } from "../../support/diary-rows";
import { addPatient } from "../../support/people";
import { buildPractice, type TestPractice } from "../../support/practice";
import { failureOf } from "./booking-steps";
import { absence, desk, onlyGivenBy, planned, visitAt, worked } from "./cover-steps";

let practice: TestPractice;
beforeEach(async () => {
  practice = await buildPractice();
});

describe("planning a cover", () => {
  it("waits for the worker, then places every visit with someone else at its own time where it can", async () => {
    const [first, second] = [await visitAt(practice, "09:00"), await visitAt(practice, "10:00")];
    await visitAt(practice, "10:30", { state: "cancelled" });
    const started = await planCover(desk(practice), absence(practice));
    expect(started).toMatchObject({ state: "solving", moves: [], outcome: null, job: { state: "waiting" } });
    expect((await auditOf(practice, started.id)).map((a) => a.action)).toEqual(["cover.planned"]);
    const plan = await worked(practice, started);
    expect(plan).toMatchObject({
      state: "ready",
      job: null,
      cause: { kind: "therapist", name: "Ana Ferreby" },
      outcome: { visits: 2, placed: 2, points: 80, isProved: true, outOfReach: 0, classes: 0 },
      undoUntil: null,
    });
    expect(plan.moves.map((m) => m.appointmentId)).toEqual([first.id, second.id]);
    for (const move of plan.moves) {
      expect(move.place).toMatchObject({ startsAt: move.before.startsAt, therapist: { name: "Idris Vane" } });
      expect(move.place?.reasons).toEqual(["a new therapist"]);
      expect(move).toMatchObject({ decision: "keep", tells: "message", problem: null, isApplied: false });
    }
    expect((await listCoverPlans(desk(practice), {})).map((p) => p.id)).toEqual([plan.id]);
  });

  it("goes round what stands: the one who covers is busy at one of the times", async () => {
    await visitAt(practice, "09:00");
    const busy = await addPatient(practice);
    const { owningTherapist } = practice.staff;
    const values = { therapistId: owningTherapist.id, roomId: practice.rooms.saltgateRoom2.id };
    await addAppointment(practice, { patientId: busy.id, day: "2026-12-02", time: "09:10", values });
    await onlyGivenBy(practice, [practice.staff.therapist.id, owningTherapist.id]);
    const plan = await planned(practice);
    expect(plan.moves[0]?.place).toMatchObject({ day: "2026-12-02", startTime: "08:35", cost: 45 });
    expect(plan.moves[0]?.place?.reasons).toEqual(["a new therapist", "25 min earlier"]);
  });

  it("names a visit that nobody can take, with the reason, and places the rest", async () => {
    const followUp = await visitAt(practice, "09:00");
    const initial = await visitAt(practice, "10:00", { serviceId: practice.services.initial.id });
    await onlyGivenBy(practice, []);
    const plan = await planned(practice);
    const [left, placed] = [followUp, initial].map((v) => plan.moves.find((m) => m.appointmentId === v.id));
    expect(left).toMatchObject({ place: null, tells: "ring" });
    expect(left?.problem).toContain("Nobody who gives this service");
    expect(placed?.place).not.toBeNull();
    expect(plan.outcome).toMatchObject({ visits: 2, placed: 1 });
  });

  it("takes the visits of a shut room to another at the same time, with the same therapist", async () => {
    await visitAt(practice, "09:00");
    const plan = await planned(practice, { therapistId: null, roomId: practice.rooms.saltgateRoom1.id });
    expect(plan.cause).toMatchObject({ kind: "room" });
    expect(plan.moves[0]).toMatchObject({
      tells: "nobody",
      place: { startTime: "09:00", therapist: { name: "Ana Ferreby" }, cost: 1, reasons: ["another room"] },
    });
  });

  it("is one for a therapist while it is worked on, and a later one closes the one before", async () => {
    await visitAt(practice, "09:00");
    const started = await Promise.all([1, 2, 3].map(() => planCover(desk(practice), absence(practice))));
    expect(new Set(started.map((s) => s.id)).size).toBe(1);
    const first = await worked(practice, started[0] ?? (await planCover(desk(practice), absence(practice))));
    const second = await planned(practice);
    expect(second.id).not.toBe(first.id);
    expect(await getCoverPlan(desk(practice), { coverPlanId: first.id })).toMatchObject({ state: "dropped" });
  });
});

describe("deciding a visit of the plan", () => {
  it("changes to one of the places listed, asks for a call, and refuses an old version and a taken place", async () => {
    await visitAt(practice, "09:00");
    await visitAt(practice, "10:00");
    const plan = await planned(practice);
    const [first, second] = plan.moves;
    const ids = { coverPlanId: plan.id, coverMoveId: first?.id ?? "" };
    const places = await listCoverPlaces(desk(practice), ids);
    expect(places.length).toBeGreaterThan(3);
    const other = places.find((p) => p.startTime !== "09:00");
    if (!other || !second?.place) throw new Error("No other place.");
    const sent = ({ startsAt, therapist, site, room }: typeof other) => ({
      ...{ startsAt, therapistId: therapist.id, siteId: site.id, roomId: room.id },
    });
    const changed = await decideCoverMove(desk(practice), {
      ...{ ...ids, version: plan.version, decision: "change", place: sent(other) },
    });
    expect(changed.moves[0]).toMatchObject({ decision: "change", place: { startsAt: other.startsAt } });
    const stale = decideCoverMove(desk(practice), { ...ids, version: plan.version, decision: "phone" });
    expect(await failureOf(stale)).toMatchObject({ code: "stale" });
    const rung = await decideCoverMove(desk(practice), {
      ...ids,
      version: changed.version,
      decision: "phone",
    });
    expect(rung.moves[0]).toMatchObject({
      decision: "phone",
      tells: "ring",
      place: { startsAt: other.startsAt },
    });
    const taken = decideCoverMove(desk(practice), {
      ...{ ...ids, version: rung.version, decision: "change", place: sent(second.place) },
    });
    expect(await failureOf(taken)).toMatchObject({ kind: "slot-taken" });
    expect((await getCoverPlan(desk(practice), { coverPlanId: plan.id })).moves[0]).toEqual(rung.moves[0]);
  });
});

describe("refusals", () => {
  it.each([
    ["one-cause", () => ({ therapistId: null })],
    ["one-cause", () => ({ roomId: practice.rooms.saltgateRoom1.id })],
    ["dates-reversed", () => ({ endsAt: "2026-12-02T07:00" })],
    ["in-the-past", () => ({ startsAt: "2026-11-20T08:00", endsAt: "2026-11-20T18:00" })],
    ["too-long", () => ({ endsAt: "2027-02-02T18:00" })],
    ["clock-gap", () => ({ endsAt: "2027-03-28T01:30" })],
    ["nothing-to-move", () => ({ startsAt: "2026-12-09T08:00", endsAt: "2026-12-09T18:00" })],
  ])("%s", async (kind, more) => {
    await visitAt(practice, "09:00");
    expect(await failureOf(planCover(desk(practice), absence(practice, more())))).toMatchObject({ kind });
    expect(await listCoverPlans(desk(practice), {})).toEqual([]);
  });

  it("does not know another practice's people, rooms and plans, nor those out of reach", async () => {
    await visitAt(practice, "09:00");
    const plan = await planned(practice);
    const other = await buildPractice({ name: "Cairn & Firth Clinics" });
    const notFound = { code: "not-found" };
    for (const coverPlanId of [plan.id, newId()])
      expect(await failureOf(getCoverPlan(desk(other), { coverPlanId }))).toMatchObject(notFound);
    for (const therapistId of [other.staff.therapist.id, newId()])
      expect(await failureOf(planCover(desk(practice), absence(practice, { therapistId })))).toMatchObject(
        notFound,
      );
    const elsewhere = contextFor(practice, "tollhouseReceptionist");
    expect(await failureOf(getCoverPlan(elsewhere, { coverPlanId: plan.id }))).toMatchObject(notFound);
    expect(await failureOf(planCover(elsewhere, absence(practice)))).toMatchObject(notFound);
    expect(await listCoverPlans(elsewhere, {})).toEqual([]);
    const accounts = contextFor(practice, "accounts");
    expect(await failureOf(planCover(accounts, absence(practice)))).toMatchObject({ code: "forbidden" });
  });

  it("keeps a receptionist's plan to the sites of the desk", async () => {
    await visitAt(practice, "09:00");
    await onlyGivenBy(practice, [practice.staff.therapist.id, practice.staff.otherTherapist.id]);
    const plan = await planned(practice, {}, contextFor(practice, "receptionist"));
    for (const move of plan.moves) expect(move.place?.site.name ?? "Saltgate").toBe("Saltgate");
  });

  it("fails with a sentence where whoever asked has left before the worker came", async () => {
    await visitAt(practice, "09:00");
    const started = await planCover(contextFor(practice, "receptionist"), absence(practice));
    const { id } = practice.staff.receptionist;
    await practice.db.update(staffMembers).set({ isActive: false }).where(eq(staffMembers.id, id));
    const plan = await worked(practice, started);
    expect(plan).toMatchObject({ state: "solving", job: { state: "failed" } });
    expect(plan.job?.problem).toContain("no longer works here");
  });
});
