import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { findTimes } from "./find-times";
import type { FindTimesInput } from "./found-times";
import type { Interval } from "./interval";
import type { TimeWishes, WishKind } from "./time-wishes";

const start = Date.parse("2026-12-02T00:00:00Z");
const minute = 60_000;

/** Sorted, disjoint gaps on five minutes, from pairs of a pause and a length. */
const gaps = fc
  .array(fc.tuple(fc.integer({ min: 1, max: 150 }), fc.integer({ min: 2, max: 40 })), { maxLength: 12 })
  .map((pairs) => {
    const out: Interval[] = [];
    let at = start + 7 * 60 * minute;
    for (const [pause, length] of pairs) {
      const from = at + pause * 5 * minute;
      at = from + length * 5 * minute;
      out.push({ from, to: at });
    }
    return out;
  });
const maybe = <T>(value: fc.Arbitrary<T>) => fc.option(value, { nil: undefined });
const wishes: fc.Arbitrary<TimeWishes> = fc.record({
  weekdays: maybe(fc.subarray([1, 2, 3, 4, 5, 6, 7], { minLength: 1, maxLength: 2 })),
  partsOfDay: maybe(
    fc.subarray(["morning", "afternoon", "evening"] as const, { minLength: 1, maxLength: 1 }),
  ),
  fromTime: maybe(fc.constantFrom("09:00", "15:00", "19:30")),
  siteIds: maybe(fc.constantFrom(["saltgate"], ["tollhouse"], ["wharf"])),
  therapistIds: maybe(fc.constantFrom(["nia"], ["ingrid"], ["owen"])),
  latestOn: maybe(fc.constantFrom("2026-12-02", "2026-12-03", "2026-12-05")),
  windows: maybe(
    fc
      .array(fc.tuple(fc.nat(6000), fc.integer({ min: 20, max: 600 })), { minLength: 1, maxLength: 2 })
      .map((list) => list.map(([at, n]) => ({ from: start + at * minute, to: start + (at + n) * minute }))),
  ),
  needsRoom: maybe(fc.boolean()),
});
const input: fc.Arbitrary<FindTimesInput> = fc
  .record({ wishes, nia: gaps, niaAway: gaps, ingrid: gaps, reed: gaps, bay: gaps, plain: gaps })
  .map(({ wishes: asked, nia, niaAway, ingrid, reed, bay, plain }) => ({
    ...{ now: new Date(start), from: new Date(start), to: new Date(start + 12 * 1440 * minute) },
    ...{ durationMinutes: 30, cleanDownMinutes: 5, shortestSellableMinutes: 30, seenBy: [], limit: 5 },
    sites: ["saltgate", "tollhouse"].map((id) => ({ id, name: id, zone: "Europe/London" })),
    therapists: ["nia", "ingrid"].map((id) => ({ id, name: id })),
    free: [
      { therapistId: "nia", siteId: "saltgate", intervals: nia },
      { therapistId: "nia", siteId: "tollhouse", intervals: niaAway },
      { therapistId: "ingrid", siteId: "saltgate", intervals: ingrid },
    ],
    rooms: [
      { id: "reed", name: "Reed", siteId: "saltgate", free: reed, meetsNeeds: true },
      { id: "plain", name: "Plain", siteId: "saltgate", free: plain, meetsNeeds: false },
      { id: "bay", name: "Bay", siteId: "tollhouse", free: bay, meetsNeeds: false },
    ],
    wishes: asked,
  }));

/** What each wish is made of, so that it can be taken back whole. */
const without: Record<WishKind, Partial<TimeWishes>> = {
  days: { weekdays: undefined },
  hours: { fromTime: undefined, untilTime: undefined, partsOfDay: undefined },
  site: { siteIds: undefined },
  therapist: { therapistIds: undefined },
  latest: { latestOn: undefined },
  windows: { windows: undefined },
  needs: { needsRoom: undefined },
};

describe("the wish to give up", () => {
  it("is the one that gives most, with as many times as a search without it finds", () => {
    let named = 0;
    fc.assert(
      fc.property(input, (question) => {
        const { none } = findTimes(question);
        if (none === null || none.kind !== "wishes") return;
        const given = (Object.keys(without) as WishKind[]).map((wish) => ({
          wish,
          times: findTimes({ ...question, wishes: { ...question.wishes, ...without[wish] } })
            .meetingEveryWish,
        }));
        const most = Math.max(...given.map((g) => g.times));
        expect(none.relax?.times ?? 0).toBe(most);
        if (none.relax === null) return;
        named += 1;
        expect(given.find((g) => g.wish === none.relax?.wish)?.times).toBe(most);
      }),
      { numRuns: 2000 },
    );
    expect(named).toBeGreaterThan(100);
  });

  it("never offers a room that the patient cannot use", () => {
    fc.assert(
      fc.property(input, (question) => {
        const asked = { ...question, wishes: { ...question.wishes, needsRoom: true } };
        expect(findTimes(asked).times.every((t) => t.roomId === "reed")).toBe(true);
      }),
    );
  });
});
