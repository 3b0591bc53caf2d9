import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { findTimes } from "./find-times";
import type { FindTimesInput } from "./found-times";
import type { Interval } from "./interval";
import {
  bestScoreAfter,
  dayScore,
  rankConcerns,
  searchWeights,
  totalScore,
  urgencies,
  waitScore,
  weightsOf,
} from "./rank-time";

const at = (text: string): Date => new Date(`2026-12-${text}:00Z`);
const span = (a: string, b: string): Interval => ({ from: at(a).getTime(), to: at(b).getTime() });
const base: FindTimesInput = {
  now: at("01T10:42"),
  from: at("02T00:00"),
  to: at("23T00:00"),
  durationMinutes: 30,
  cleanDownMinutes: 0,
  shortestSellableMinutes: 30,
  sites: [
    { id: "saltgate", name: "Saltgate", zone: "Europe/London" },
    { id: "tollhouse", name: "Tollhouse Lane", zone: "Europe/London" },
  ],
  therapists: [
    { id: "nia", name: "Nia Prosser" },
    { id: "ingrid", name: "Ingrid Solheim" },
  ],
  free: [
    {
      therapistId: "nia",
      siteId: "saltgate",
      intervals: [span("02T09:00", "02T09:45"), span("02T10:15", "02T10:45"), span("08T10:00", "08T10:30")],
    },
    {
      therapistId: "ingrid",
      siteId: "saltgate",
      intervals: [span("02T08:30", "02T09:00"), span("03T08:00", "03T09:30")],
    },
    { therapistId: "nia", siteId: "tollhouse", intervals: [span("04T14:00", "04T18:00")] },
  ],
  rooms: [
    { id: "reed", name: "Reed", siteId: "saltgate", free: [span("01T00:00", "31T00:00")] },
    { id: "bay", name: "Bay 2", siteId: "tollhouse", free: [span("01T00:00", "31T00:00")] },
  ],
  wishes: { weekdays: [2, 3], untilTime: "11:00", therapistIds: ["nia"] },
  seenBy: [
    { therapistId: "nia", visits: 6, isLast: true },
    { therapistId: "ingrid", visits: 1, isLast: false },
  ],
  weights: { wish: 40, wait: 30, knows: 20, day: 10 },
  limit: 7,
};
const starts = (input: FindTimesInput): string[] =>
  findTimes(input).times.map((t) => `${t.therapistId} ${t.startsAt.toISOString().slice(8, 16)}`);

describe("finding a time", () => {
  it("ranks a gap filled exactly by the known therapist first, and says why", () => {
    const found = findTimes(base);
    const [first, second] = found.times;
    expect(first).toMatchObject({
      therapistId: "nia",
      siteId: "saltgate",
      roomId: "reed",
      meetsEveryWish: true,
    });
    expect(first?.startsAt).toEqual(at("02T10:15"));
    expect(first?.reasons).toEqual([
      "Meets every wish",
      "Same therapist as last time, 6 visits so far",
      "Fills a gap exactly",
    ]);
    expect(first?.drawbacks).toEqual([]);
    expect(second?.startsAt).toEqual(at("02T09:00"));
    expect(second?.reasons).toContain("Earliest of all");
    expect(second?.drawbacks).toEqual(["Leaves 15 minutes after it, too short to sell"]);
    expect(found.none).toBeNull();
  });

  it("offers times that break one wish after, and says which", () => {
    const words = findTimes(base).times.flatMap((t) =>
      t.meetsEveryWish ? [] : [[t.therapistId, ...t.drawbacks].join("; ")],
    );
    expect(words).toEqual(["ingrid; With Ingrid Solheim, who was not asked for"]);
  });

  it("puts the wait first where the caller does", () => {
    const free: FindTimesInput["free"] = [
      { therapistId: "nia", siteId: "saltgate", intervals: [span("08T10:00", "08T10:30")] },
      { therapistId: "ingrid", siteId: "saltgate", intervals: [span("02T08:30", "02T09:00")] },
    ];
    const input = { ...base, free, wishes: {} };
    expect(starts({ ...input, order: ["wait", "wish", "knows", "day"] })).toEqual([
      "ingrid 02T08:30",
      "nia 08T10:00",
    ]);
    expect(starts({ ...input, order: ["knows", "day", "wish", "wait"] })).toEqual([
      "nia 08T10:00",
      "ingrid 02T08:30",
    ]);
  });

  it.each<[string, Partial<FindTimesInput>, string, string | null]>([
    ["nobody gives it", { free: [] }, "no-therapist", null],
    ["every gap is too short", { durationMinutes: 300 }, "no-free-time", null],
    ["no room is free", { rooms: [] }, "no-room", null],
    ["the day is wrong", { wishes: { weekdays: [1] } }, "wishes", "days"],
    ["the hour is wrong", { wishes: { fromTime: "19:00" } }, "wishes", "hours"],
    [
      "the therapist is away",
      { wishes: { therapistIds: ["owen"], untilTime: "11:00" } },
      "wishes",
      "therapist",
    ],
    ["the site is wrong", { wishes: { siteIds: ["wharf"] } }, "wishes", "site"],
    [
      "the date is too soon",
      { from: at("02T12:00"), wishes: { latestOn: "2026-12-02" } },
      "wishes",
      "latest",
    ],
    ["two wishes are wrong", { wishes: { weekdays: [1], siteIds: ["wharf"] } }, "wishes", null],
  ])("says why there is none when %s", (_name, change, kind, wish) => {
    const { none } = findTimes({ ...base, ...change });
    expect(none?.kind).toBe(kind);
    expect(none?.relax?.wish ?? null).toBe(wish);
  });

  it("names the wish that gives the most and the first time it would give", () => {
    const { none } = findTimes({ ...base, wishes: { weekdays: [1], untilTime: "11:00" } });
    expect(none?.relax?.message).toBe(
      "Any day of the week would give 10 times, the first on Wednesday 2 December 2026 at 8:30am.",
    );
  });

  it("keeps to five minutes, to the gap and to a free room, whatever the gaps", () => {
    const gaps = fc.array(fc.tuple(fc.integer({ min: 0, max: 2000 }), fc.integer({ min: 1, max: 60 })), {
      minLength: 1,
      maxLength: 8,
    });
    const toSet = (list: [number, number][]): Interval[] => {
      const out: Interval[] = [];
      let from = base.from.getTime();
      for (const [skip, length] of list) {
        out.push({ from: from + (skip + 1) * 60_000, to: from + (skip + 1 + length * 5) * 60_000 });
        from = out.at(-1)?.to ?? from;
      }
      return out;
    };
    fc.assert(
      fc.property(gaps, gaps, (free, room) => {
        const lane = { therapistId: "nia", siteId: "saltgate", intervals: toSet(free) };
        const reed = { id: "reed", name: "Reed", siteId: "saltgate", free: toSet(room) };
        const input = { ...base, free: [lane], rooms: [reed], wishes: {}, cleanDownMinutes: 5, limit: 50 };
        const found = findTimes(input);
        for (const t of found.times) {
          const [from, to] = [t.startsAt.getTime(), t.endsAt.getTime() + 5 * 60_000];
          expect(from % 300_000).toBe(0);
          for (const set of [lane.intervals, reed.free])
            expect(set.some((i) => i.from <= from && to <= i.to)).toBe(true);
        }
        const isPossible = (m: number): boolean =>
          [lane.intervals, reed.free].every((set) => set.some((i) => i.from <= m && m + 35 * 60_000 <= i.to));
        let possible = false;
        for (let m = base.from.getTime(); m < base.to.getTime() && !possible; m += 300_000)
          possible = isPossible(m);
        expect(found.times.length > 0).toBe(possible);
      }),
    );
  });
});

describe("what counts", () => {
  it("weighs the first of the order most and forgets none", () => {
    expect(weightsOf(["day"])).toEqual({ day: 0.4, wish: 0.3, wait: 0.2, knows: 0.1 });
  });
  it("adds up to one, and urgency only makes the wait count more", () => {
    const part = fc.integer({ min: 0, max: 100 });
    fc.assert(
      fc.property(fc.record({ wish: part, wait: part, knows: part, day: part }), (weights) => {
        const shares = urgencies.map((urgency) => searchWeights({ weights, urgency }));
        for (const share of shares)
          expect(rankConcerns.reduce((sum, c) => sum + share[c], 0)).toBeCloseTo(1, 9);
        expect(shares[1]?.wait).toBeGreaterThanOrEqual(shares[0]?.wait ?? 1);
        expect(shares[2]?.wait).toBeGreaterThanOrEqual(shares[1]?.wait ?? 1);
      }),
    );
  });
  it("knows the best that a later time can score", () => {
    const part = fc.double({ min: 0, max: 1, noNaN: true });
    const order = fc.shuffledSubarray(["wish", "wait", "knows", "day"] as const, { minLength: 0 });
    fc.assert(
      fc.property(
        part,
        part,
        part,
        fc.nat(80_000),
        fc.nat(80_000),
        order,
        (wish, knows, day, after, more, first) => {
          const score = totalScore({ wish, knows, day, wait: waitScore(after + more) }, weightsOf(first));
          expect(score).toBeLessThanOrEqual(bestScoreAfter(after, weightsOf(first)) + 1e-9);
        },
      ),
    );
  });
  it("always prefers the sooner of two", () => {
    fc.assert(
      fc.property(
        fc.nat(60_000),
        fc.integer({ min: 5, max: 600 }),
        (m, later) => waitScore(m) > waitScore(m + later),
      ),
    );
  });
  it.each([
    ["fills exactly", 0, 0, 1],
    ["touches one edge", 0, 60, 0.95],
    ["splits", 30, 30, 0.75],
    ["wastes 15", 15, 0, 0.5],
    ["wastes 15 twice", 15, 15, 0.3],
  ])("%s", (_name, before, after, score) => expect(dayScore({ before, after }, 30)).toBeCloseTo(score));
});
