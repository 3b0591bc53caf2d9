import type { CoverPlanView } from "@withy/contracts/diary";
import { absences, appointments } from "@withy/db/schema";
import {
  applyCoverPlan,
  bookAppointment,
  decideCoverMove,
  markAppointment,
  moveAppointment,
  undoCoverPlan,
} from "@withy/services/diary";
import { and, eq } from "drizzle-orm";
import { beforeEach, describe, expect, it } from "vitest";
import { auditOf, messagesAbout } from "../../support/audit-rows";
import { contextFor } from "../../support/contexts";
import { addPatient } from "../../support/people";
import { buildPractice, type TestPractice } from "../../support/practice";
import { claimsFor, failureOf, followUp } from "./booking-steps";
import { desk, onlyGivenBy, planned, visitAt } from "./cover-steps";

let practice: TestPractice;
let visits: Awaited<ReturnType<typeof visitAt>>[];
let plan: CoverPlanView;

beforeEach(async () => {
  practice = await buildPractice();
  await onlyGivenBy(practice, [practice.staff.therapist.id, practice.staff.owningTherapist.id]);
  visits = [
    await visitAt(practice, "09:00", { state: "confirmed" }),
    await visitAt(practice, "10:00"),
    await visitAt(practice, "11:00", {}, { email: null }),
  ];
  plan = await planned(practice);
});

const given = (view = plan) => ({ coverPlanId: view.id, version: view.version });

async function rowOf(id: string) {
  const [row] = await practice.db
    .select()
    .from(appointments)
    .where(and(eq(appointments.practiceId, practice.practiceId), eq(appointments.id, id)));
  if (!row) throw new Error("The visit is gone.");
  return row;
}

const absencesNow = () =>
  practice.db.select().from(absences).where(eq(absences.practiceId, practice.practiceId));

/** Everything that an act of a cover may change. */
async function standing() {
  const rows = await Promise.all(visits.map((v) => rowOf(v.id)));
  const claims = await Promise.all(visits.map((v) => claimsFor(practice, v.id)));
  const sent = await Promise.all(visits.map((v) => messagesAbout(practice, v.id)));
  return { rows, claims: claims.flat(), sent: sent.flat().length, absences: await absencesNow() };
}

describe("applying a cover", () => {
  it("moves every visit with its claims, blocks the absence, and tells each patient once but those to be rung", async () => {
    const phone = plan.moves.find((m) => m.appointmentId === visits[1]?.id);
    const rung = await decideCoverMove(desk(practice), {
      ...{ ...given(), coverMoveId: phone?.id ?? "", decision: "phone" },
    });
    const applied = await applyCoverPlan(desk(practice), given(rung));
    expect(applied.state).toBe("applied");
    expect(applied.moves.map((m) => m.tells)).toEqual(["message", "ring", "ring"]);
    for (const move of applied.moves) {
      const row = await rowOf(move.appointmentId);
      expect(row.therapistId).toBe(practice.staff.owningTherapist.id);
      expect(row.startsAt.toISOString()).toBe(move.place?.startsAt);
      const claims = await claimsFor(practice, row.id);
      expect(claims).toHaveLength(14);
      expect(new Set(claims.map((c) => c.resourceId))).toEqual(new Set([row.therapistId, row.roomId]));
      expect((await auditOf(practice, row.id)).map((a) => a.action)).toEqual(["appointment.moved"]);
    }
    // A confirmed visit whose time stays is still confirmed.
    expect((await rowOf(visits[0]?.id ?? "")).state).toBe("confirmed");
    const sent = await Promise.all(visits.map((v) => messagesAbout(practice, v.id)));
    expect(sent.map((list) => list.map((m) => m.template))).toEqual([["booking-moved"], [], []]);
    expect(await absencesNow()).toMatchObject([
      { staffMemberId: practice.staff.therapist.id, kind: "leave", reason: "Unwell" },
    ]);
    const again = applyCoverPlan(desk(practice), given(applied));
    expect(await failureOf(again)).toMatchObject({ kind: "wrong-state" });
  });

  it("refuses a visit that changed since by name, and moves nothing", async () => {
    const [, second] = visits;
    await markAppointment(desk(practice), { appointmentId: second?.id ?? "", version: 1, to: "confirmed" });
    const before = await standing();
    const failure = await failureOf(applyCoverPlan(desk(practice), given()));
    expect(failure).toMatchObject({ code: "refused", kind: "visits-changed" });
    expect(failure.message).toContain("10:00");
    expect(failure.detail).toMatchObject({ visits: [{ appointmentId: second?.id }] });
    expect(await standing()).toEqual(before);
  });

  it("refuses by name where a booking took a proposed place after the plan, and moves nothing", async () => {
    const [move] = plan.moves;
    const stranger = await addPatient(practice);
    const { startsAt, therapist } = move?.place ?? { startsAt: "", therapist: { id: "" } };
    await bookAppointment(
      desk(practice),
      followUp(practice, stranger.id, startsAt, { therapistId: therapist.id }),
    );
    const before = await standing();
    const failure = await failureOf(applyCoverPlan(desk(practice), given()));
    expect(failure).toMatchObject({
      kind: "places-taken",
      detail: { visits: [{ appointmentId: visits[0]?.id }] },
    });
    expect(failure.message).toContain("09:00");
    expect(await standing()).toEqual(before);
  });

  it("races with bookings for the same places: the cover stands whole or not at all", async () => {
    const strangers = await Promise.all([1, 2, 3].map(() => addPatient(practice)));
    const { owningTherapist } = practice.staff;
    const [applied, ...booked] = await Promise.allSettled([
      applyCoverPlan(desk(practice), given()),
      ...plan.moves.map((m, n) =>
        bookAppointment(
          contextFor(practice, "receptionist"),
          followUp(practice, strangers[n]?.id ?? "", m.place?.startsAt ?? "", {
            therapistId: owningTherapist.id,
          }),
        ),
      ),
    ]);
    const moved = await Promise.all(
      visits.map(async (v) => (await rowOf(v.id)).therapistId === owningTherapist.id),
    );
    expect(moved.every((m) => m === (applied.status === "fulfilled"))).toBe(true);
    if (applied.status === "rejected") expect(applied.reason).toMatchObject({ kind: "places-taken" });
    else expect(booked.every((b) => b.status === "rejected")).toBe(true);
    for (const v of visits) expect(await claimsFor(practice, v.id)).toHaveLength(14);
  });

  it("applies once however often it is sent at once", async () => {
    const tries = await Promise.allSettled([1, 2, 3, 4].map(() => applyCoverPlan(desk(practice), given())));
    expect(tries.filter((t) => t.status === "fulfilled")).toHaveLength(1);
    expect(await absencesNow()).toHaveLength(1);
  });
});

describe("taking it back", () => {
  it("puts every visit where and as it was, frees the absence, and tells whoever was told", async () => {
    const before = await standing();
    const applied = await applyCoverPlan(desk(practice), given());
    practice.clock.advance(9);
    const undone = await undoCoverPlan(desk(practice), given(applied));
    expect(undone).toMatchObject({ state: "undone", undoUntil: null });
    const after = await standing();
    expect(after.rows.map(({ version: _v, updatedAt: _u, ...row }) => row)).toEqual(
      before.rows.map(({ version: _v, updatedAt: _u, ...row }) => row),
    );
    expect(after.claims).toEqual(before.claims);
    expect(after.absences).toEqual([]);
    expect(after.sent).toBe(4);
    const again = await failureOf(undoCoverPlan(desk(practice), given(undone)));
    expect(again).toMatchObject({ kind: "wrong-state" });
  });

  it("is refused after ten minutes", async () => {
    const applied = await applyCoverPlan(desk(practice), given());
    expect(applied.undoUntil).not.toBeNull();
    practice.clock.advance(10);
    const before = await standing();
    expect(await failureOf(undoCoverPlan(desk(practice), given(applied)))).toMatchObject({
      kind: "too-late",
    });
    expect(await standing()).toEqual(before);
  });

  it("is refused by name once something depends on a moved visit", async () => {
    const applied = await applyCoverPlan(desk(practice), given());
    const appointmentId = visits[2]?.id ?? "";
    await moveAppointment(desk(practice), { appointmentId, version: 2, startsAt: "2026-12-02T14:00" });
    const before = await standing();
    const failure = await failureOf(undoCoverPlan(desk(practice), given(applied)));
    expect(failure).toMatchObject({ kind: "depends", detail: { visits: [{ appointmentId }] } });
    expect(await standing()).toEqual(before);
  });

  it("is refused by name where an old time has gone to someone else", async () => {
    const applied = await applyCoverPlan(desk(practice), given());
    const stranger = await addPatient(practice);
    const [first] = visits;
    await bookAppointment(
      desk(practice),
      followUp(practice, stranger.id, first?.startsAt.toISOString() ?? "", {
        overrideReason: "She came after all",
      }),
    );
    const before = await standing();
    const failure = await failureOf(undoCoverPlan(desk(practice), given(applied)));
    expect(failure).toMatchObject({
      kind: "places-taken",
      detail: { visits: [{ appointmentId: first?.id }] },
    });
    expect(await standing()).toEqual(before);
  });
});
