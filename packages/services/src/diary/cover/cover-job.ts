import { newId } from "@withy/core/ids";
import { coverMoves, coverPlans } from "@withy/db/schema";
import { coverPlaces, type FoundPlaces } from "@withy/diary/cover/cover-places";
import type { CandidatePlace, CoverProblem } from "@withy/diary/cover/cover-problem";
import { chosenPlaces, coverProgramme } from "@withy/diary/cover/cover-programme";
import { z } from "zod";
import type { Context } from "../../context";
import { loadRecord } from "../../load-record";
import { actForRequester } from "../../messaging/act-for-requester";
import type { JobHandler, JobRun } from "../../messaging/job-run";
import { inTransaction } from "../../transaction";
import { reachableSites } from "../site-reach";
import { causeOf, type KeptOutcome, type PlanRow, savePlan } from "./cover-rows";
import { readCoverProblem } from "./cover-setting";
import { type AffectedVisit, countClasses, readAffected } from "./cover-visits";
import { type ProgrammeSolution, solveProgramme } from "./solve-programme";

const storedInput = z.strictObject({ coverPlanId: z.uuid() });

/** Candidate places of each visit, the cheapest; and how many where those left somebody without one. */
const placesEach = 80;
const placesEachWider = 400;
const partSize = 10;

export interface SolvedCover {
  readonly found: readonly FoundPlaces[];
  readonly places: readonly (CandidatePlace | null)[];
  readonly solution: ProgrammeSolution;
}

async function solveWith(
  problem: CoverProblem,
  most: number,
  part: (done: number) => Promise<void>,
): Promise<SolvedCover> {
  const found: FoundPlaces[] = [];
  for (const visit of problem.visits) {
    if (found.length % partSize === 0) await part(found.length);
    found.push(coverPlaces(problem, visit, most));
  }
  await part(found.length);
  const programme = coverProgramme(
    problem.visits,
    found.map((f) => f.places),
  );
  const solution = await solveProgramme(programme);
  return { found, solution, places: chosenPlaces(programme, problem.visits.length, solution.chosen) };
}

/** The least disturbance over the cheapest places; over more of them where a visit came away with none. */
export async function solveCover(
  problem: CoverProblem,
  part: (done: number) => Promise<void> = async () => {},
): Promise<SolvedCover> {
  const first = await solveWith(problem, placesEach, part);
  const isShort = first.places.some((place, n) => place === null && first.found[n]?.isCut);
  return isShort ? solveWith(problem, placesEachWider, part) : first;
}

const placeOf = (place: CandidatePlace) => ({ ...place, startsAt: new Date(place.startsAt).toISOString() });

const lostToOthers =
  "Every place that would do is needed for another visit of this plan. Ring the patient, or find a later time by hand.";

function moveRow(plan: PlanRow, visit: AffectedVisit, place: CandidatePlace | null, found?: FoundPlaces) {
  const { startsAt, siteId, therapistId, roomId, state } = visit;
  const before = { startsAt, siteId, therapistId, roomId, cost: 0, reasons: [] };
  return {
    practiceId: plan.practiceId,
    id: newId(),
    planId: plan.id,
    appointmentId: visit.id,
    appointmentVersion: visit.version,
    before: { ...placeOf(before), state },
    place: place && placeOf(place),
    problem: place ? null : (found?.problem ?? lostToOthers),
  };
}

async function writePlan(
  ctx: Context,
  run: JobRun,
  plan: PlanRow,
  visits: readonly AffectedVisit[],
  solved: SolvedCover,
  outOfReach: number,
): Promise<void> {
  const outcome: KeptOutcome = {
    visits: visits.length,
    placed: solved.places.filter(Boolean).length,
    candidates: solved.found.reduce((sum, f) => sum + f.places.length, 0),
    points: solved.places.reduce((sum, place) => sum + (place?.cost ?? 0), 0),
    solveMs: solved.solution.solveMs,
    isProved: solved.solution.isProved,
    outOfReach,
    classes: await countClasses(ctx, causeOf(plan)),
  };
  await inTransaction(ctx, async (tx) => {
    await savePlan(tx, plan, { state: "ready", outcome: { ...outcome } });
    const rows = visits.map((v, n) => moveRow(plan, v, solved.places[n] ?? null, solved.found[n]));
    if (rows.length > 0) await tx.db.insert(coverMoves).values(rows);
    await run.progress(visits.length + 1, visits.length + 1, { within: tx });
  });
}

/** Works a plan out: reads, looks for places, solves, and writes all moves at once. A second run finds it done. */
export const coverJob: JobHandler = async (system, run) => {
  const ctx = await actForRequester(system, run.row, "diary.book");
  const { coverPlanId } = storedInput.parse(run.row.input);
  const plan = await loadRecord(ctx, coverPlans, coverPlanId, "cover plan");
  if (plan.state !== "solving") return;
  const cause = causeOf(plan);
  const affected = await readAffected(ctx, cause);
  const reach = new Set(await reachableSites(ctx, "diary.book"));
  const visits = affected.filter((v) => reach.has(v.siteId));
  const total = visits.length + 1;
  await run.progress(0, total);
  const movingIds = visits.map((v) => v.id);
  const problem = await readCoverProblem(ctx, { cause, visits, movingIds });
  const solved = await solveCover(problem, async (done) => {
    run.pauseIfAsked();
    await run.progress(done, total);
  });
  await writePlan(ctx, run, plan, visits, solved, affected.length - visits.length);
};
