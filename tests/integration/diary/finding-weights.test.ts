import { usualWeights } from "@withy/diary/rank-time";
import { changeFindingWeights, findTimes, getFindingWeights } from "@withy/services/diary";
import { beforeAll, describe, expect, it } from "vitest";
import { auditOf } from "../../support/audit-rows";
import { contextFor } from "../../support/contexts";
import { addAppointment } from "../../support/diary-rows";
import { addPatient } from "../../support/people";
import { buildPractice, type TestPractice } from "../../support/practice";
import { failureOf } from "./booking-steps";

let practice: TestPractice;
beforeAll(async () => {
  practice = await buildPractice();
});

const owner = () => contextFor(practice, "owner");
const waitOnly = { wish: 0, wait: 100, knows: 0, day: 0 };
const knowsOnly = { wish: 0, wait: 0, knows: 100, day: 0 };

describe("how times are ranked", () => {
  it("starts with the usual weights, is changed by the owner, audited, and decides the next search", async () => {
    const patient = await addPatient(practice);
    await addAppointment(practice, {
      ...{ patientId: patient.id, day: "2026-11-24", time: "10:00" },
      values: { state: "fulfilled", therapistId: practice.staff.otherTherapist.id },
    });
    expect(await getFindingWeights(owner(), {})).toEqual(usualWeights);
    const ask = async () =>
      (
        await findTimes(owner(), {
          ...{ serviceId: practice.services.followUp.id, patientId: patient.id, limit: 1 },
        })
      ).times[0]?.therapist.id;
    await changeFindingWeights(owner(), { weights: knowsOnly, before: usualWeights });
    expect(await ask()).toBe(practice.staff.otherTherapist.id);
    expect(await changeFindingWeights(owner(), { weights: waitOnly, before: knowsOnly })).toEqual(waitOnly);
    const rows = await auditOf(practice, practice.practiceId);
    expect(rows.map((r) => r.action)).toContain("practice.finding-weights-changed");
  });

  it("tells who saved meanwhile, and lets one of two at once through", async () => {
    const change = (wish: number) =>
      changeFindingWeights(owner(), { weights: { ...waitOnly, wish }, before: waitOnly });
    const results = await Promise.allSettled([change(10), change(20)]);
    expect(results.filter((r) => r.status === "fulfilled")).toHaveLength(1);
    expect((await failureOf(change(30))).code).toBe("stale");
  });

  it.each<[string, object]>([
    ["nothing counts", { wish: 0, wait: 0, knows: 0, day: 0 }],
    ["half a point", { ...waitOnly, wish: 0.5 }],
    ["too much", { ...waitOnly, wish: 101 }],
    ["less than nothing", { ...waitOnly, wish: -1 }],
  ])("refuses weights where %s", async (_name, weights) => {
    const input = { weights, before: waitOnly } as Parameters<typeof changeFindingWeights>[1];
    expect((await failureOf(changeFindingWeights(owner(), input))).code).toBe("invalid");
  });

  it.each(["therapist", "receptionist", "accounts"] as const)("is not the %s's to change", async (person) => {
    const input = { weights: waitOnly, before: waitOnly };
    const failure = await failureOf(changeFindingWeights(contextFor(practice, person), input));
    expect(failure.code).toBe("forbidden");
  });
});
