import { coverPlaces } from "@withy/diary/cover/cover-places";
import type { CandidatePlace, CoverProblem, CoverVisit } from "@withy/diary/cover/cover-problem";
import { chosenPlaces, coverProgramme } from "@withy/diary/cover/cover-programme";
import { type Interval, overlaps } from "@withy/diary/interval";
import { describe, expect, test } from "vitest";
import { solveProgramme } from "./solve-programme";

const minute = 60_000;
const morning = Date.parse("2026-12-08T09:00:00Z");

/** Mulberry32: the same cases on every run. */
function randomOf(seed: number): (below: number) => number {
  let state = seed;
  return (below) => {
    state = (state + 0x6d2b79f5) | 0;
    let t = Math.imul(state ^ (state >>> 15), 1 | state);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) % below;
  };
}

/** Two to five visits of a therapist who is away, two who may cover in half-empty short days, two rooms. */
function smallCase(seed: number): CoverProblem {
  const random = randomOf(seed);
  const gap = (): Interval => {
    const from = morning + random(12) * 15 * minute;
    return { from, to: from + (2 + random(5)) * 15 * minute };
  };
  const visits = Array.from({ length: 2 + random(4) }, (_, n): CoverVisit => {
    const durationMinutes = [20, 30, 45][random(3)] ?? 30;
    return {
      id: `v${n}`,
      patientIds: [`p${random(3)}`, ...(random(6) === 0 ? [`q${n}`] : [])],
      startsAt: morning + n * 50 * minute,
      durationMinutes,
      cleanDownMinutes: 5,
      siteId: "a",
      therapistId: "away",
      roomId: "r0",
      therapistIds: random(5) === 0 ? ["one"] : ["one", "two"],
      roomKind: "treatment",
      needsEquipment: [],
      seenBy: random(2) === 0 ? ["one"] : [],
      isInCourse: random(3) === 0,
    };
  });
  return {
    now: morning - 3 * 60 * minute,
    noticeMinutes: 60,
    daysAfter: 0,
    visits,
    sites: [
      { id: "a", zone: "UTC" },
      { id: "b", zone: "UTC" },
    ],
    lanes: ["one", "two"].map((therapistId, n) => ({
      therapistId,
      siteId: n === 1 && random(2) === 0 ? "b" : "a",
      working: [{ from: morning, to: morning + 4 * 60 * minute }],
      taken: [gap(), gap()],
    })),
    rooms: [
      { id: "r0", siteId: "a", kind: "treatment", equipment: [], free: [{ from: 0, to: morning * 2 }] },
      { id: "r1", siteId: random(2) === 0 ? "a" : "b", kind: "treatment", equipment: [], free: [gap()] },
    ],
    patientBusy: new Map(),
  };
}

interface Held {
  readonly visit: CoverVisit;
  readonly place: Pick<CandidatePlace, "startsAt" | "therapistId" | "roomId">;
}

/** Whether two visits get in each other's way, by their times alone. */
function clash(a: Held, b: Held): boolean {
  const time = ({ visit, place }: Held): Interval => ({
    from: place.startsAt,
    to: place.startsAt + (visit.durationMinutes + visit.cleanDownMinutes) * minute,
  });
  const shares =
    a.place.therapistId === b.place.therapistId ||
    a.place.roomId === b.place.roomId ||
    a.visit.patientIds.some((id) => b.visit.patientIds.includes(id));
  return shares && overlaps(time(a), time(b));
}

interface Best {
  left: number;
  cost: number;
}

/** Every way to place the visits, one by one; the fewest people left first, then the cheapest. */
function byExhaustion(visits: readonly CoverVisit[], places: readonly (readonly CandidatePlace[])[]): Best {
  let best: Best = { left: Number.POSITIVE_INFINITY, cost: Number.POSITIVE_INFINITY };
  const walk = (n: number, held: readonly Held[], left: number, cost: number): void => {
    if (left > best.left || (left === best.left && cost >= best.cost)) return;
    const visit = visits[n];
    if (!visit) {
      best = { left, cost };
      return;
    }
    for (const place of [...(places[n] ?? []), null]) {
      const own: Held = { visit, place: place ?? visit };
      if (held.some((other) => clash(other, own))) continue;
      walk(n + 1, [...held, own], left + (place ? 0 : visit.patientIds.length), cost + (place?.cost ?? 0));
    }
  };
  walk(0, [], 0, 0);
  return best;
}

describe("a small cover", () => {
  test("is solved to the same cost as by trying everything, 200 times", async () => {
    let placed = 0;
    let left = 0;
    for (let seed = 1; seed <= 200; seed += 1) {
      const problem = smallCase(seed);
      const { visits } = problem;
      const places = visits.map((v) => coverPlaces(problem, v, 16).places);
      const programme = coverProgramme(visits, places);
      const solution = await solveProgramme(programme);
      expect(solution.isProved).toBe(true);
      const got = chosenPlaces(programme, visits.length, solution.chosen);
      const held = visits.map((visit, n): Held => ({ visit, place: got[n] ?? visit }));
      for (const [n, a] of held.entries())
        for (const b of held.slice(n + 1)) expect(clash(a, b), `case ${seed}`).toBe(false);
      const people = visits.reduce((sum, v, n) => (got[n] ? sum : sum + v.patientIds.length), 0);
      const cost = got.reduce((sum, place) => sum + (place?.cost ?? 0), 0);
      expect({ left: people, cost }, `case ${seed}`).toEqual(byExhaustion(visits, places));
      placed += got.filter(Boolean).length;
      left += got.filter((p) => p === null).length;
    }
    // The cases would prove little if everything had room, or nothing.
    expect(placed).toBeGreaterThan(200);
    expect(left).toBeGreaterThan(20);
  });

  test("of nothing costs nothing", async () => {
    expect(await solveProgramme(coverProgramme([], []))).toMatchObject({ chosen: [], cost: 0 });
  });
});
