import { coverPlaces } from "@withy/diary/cover/cover-places";
import type { CoverProblem, CoverVisit } from "@withy/diary/cover/cover-problem";
import { chosenPlaces, coverProgramme } from "@withy/diary/cover/cover-programme";
import type { Interval } from "@withy/diary/interval";
import { solveProgramme } from "@withy/services/diary/cover/solve-programme";
import { percentile } from "./timing";

const minute = 60_000;
const monday = Date.parse("2026-12-07T08:00:00Z");
const days = 10;
const rounds = 5;
const ms = (n: number): string => `${Math.round(n)} ms`;

/** Mulberry32: the same diary on every run. */
function randomOf(seed: number): (below: number) => number {
  let state = seed;
  return (below) => {
    state = (state + 0x6d2b79f5) | 0;
    let t = Math.imul(state ^ (state >>> 15), 1 | state);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) % below;
  };
}

const dayAt = (n: number): number => monday + n * 1440 * minute;
const therapists = Array.from({ length: 30 }, (_, n) => `t${n}`);
const sites = ["a", "b", "c"].map((id) => ({ id, zone: "Europe/London" }));
const siteOf = (n: number): string => sites[n % sites.length]?.id ?? "a";

/** Two weeks of 30 therapists at three sites, three quarters full, and 100 visits of five who are away for four days. */
function bigCase(seed: number): CoverProblem {
  const random = randomOf(seed);
  const working = Array.from({ length: days }, (_, d) => ({ from: dayAt(d), to: dayAt(d) + 600 * minute }));
  const lanes = therapists.map((therapistId, n) => {
    const taken: Interval[] = [];
    if (n < 5) taken.push({ from: dayAt(0), to: dayAt(4) });
    for (let d = n < 5 ? 4 : 0; d < days; d += 1)
      for (let slot = 0; slot < 17; slot += 1) {
        const from = dayAt(d) + slot * 35 * minute;
        if (random(4) > 0) taken.push({ from, to: from + 35 * minute });
      }
    return { therapistId, siteId: siteOf(n), working, taken };
  });
  const visits = Array.from({ length: 100 }, (_, n): CoverVisit => {
    const whose = n % 5;
    return {
      id: `v${n}`,
      patientIds: [`p${n}`],
      startsAt: dayAt(Math.floor(n / 25)) + (Math.floor(n / 5) % 5) * 105 * minute,
      durationMinutes: random(4) === 0 ? 45 : 30,
      cleanDownMinutes: 5,
      siteId: siteOf(whose),
      therapistId: `t${whose}`,
      roomId: `r${whose}`,
      therapistIds: therapists.filter(() => random(3) > 0),
      roomKind: "treatment",
      needsEquipment: [],
      seenBy: [therapists[random(30)] ?? ""],
      isInCourse: random(2) === 0,
    };
  });
  const rooms = Array.from({ length: 30 }, (_, n) => ({
    ...{ id: `r${n}`, siteId: siteOf(n), kind: "treatment", equipment: [] },
    free: [{ from: dayAt(-1), to: dayAt(days + 8) }],
  }));
  const now = dayAt(0) - 120 * minute;
  return { now, noticeMinutes: 60, daysAfter: 7, visits, sites, lanes, rooms, patientBusy: new Map() };
}

const placesEach = 80;
const [solving, using]: [number[], number[]] = [[], []];
for (let seed = 1; seed <= rounds; seed += 1) {
  const problem = bigCase(seed);
  const from = performance.now();
  const places = problem.visits.map((v) => coverPlaces(problem, v, placesEach).places);
  const programme = coverProgramme(problem.visits, places);
  const searchMs = performance.now() - from;
  const before = process.cpuUsage();
  const { chosen, cost, isProved, solveMs } = await solveProgramme(programme);
  const { user, system } = process.cpuUsage(before);
  const placed = chosenPlaces(programme, problem.visits.length, chosen).filter(Boolean).length;
  solving.push(solveMs);
  using.push((user + system) / 1000);
  console.log(
    `case ${seed}: ${placed} of ${problem.visits.length} placed, ${programme.columns.length} binaries, ${programme.rows.length} rows, cost ${cost}, ${isProved ? "proved" : "not proved"}; places in ${ms(searchMs)}, solved in ${ms(solveMs)}, ${ms((user + system) / 1000)} of processor`,
  );
}
console.log(
  `100 visits x 30 therapists: solving p50 ${ms(percentile(solving, 0.5))}, worst ${ms(percentile(solving, 1))}; processor p50 ${ms(percentile(using, 0.5))}, worst ${ms(percentile(using, 1))}`,
);
