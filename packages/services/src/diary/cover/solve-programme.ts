import { type Programme, programmeText } from "@withy/diary/cover/cover-programme";
import loadHighs from "highs";

export interface ProgrammeSolution {
  readonly chosen: readonly boolean[];
  readonly cost: number;
  /** False where the time ran out before the solver had shown that nothing is cheaper. */
  readonly isProved: boolean;
  readonly solveMs: number;
}

/** A person waits, and the worker does nothing else meanwhile. */
const timeLimitSeconds = 20;

let solver: ReturnType<typeof loadHighs> | null = null;

/**
 * The one place that calls the solver. Costs are whole, so a gap below one is no gap. The calculation runs in this
 * thread until it is done: only the worker loads this file.
 */
export async function solveProgramme(programme: Programme): Promise<ProgrammeSolution> {
  if (programme.costs.length === 0) return { chosen: [], cost: 0, isProved: true, solveMs: 0 };
  solver ??= loadHighs();
  const { solve } = await solver;
  const text = programmeText(programme);
  const from = performance.now();
  const solution = solve(text, {
    mip_rel_gap: 0,
    mip_abs_gap: 0.5,
    time_limit: timeLimitSeconds,
    output_flag: false,
  });
  const solveMs = Math.round(performance.now() - from);
  const isProved = solution.Status === "Optimal";
  const chosen = programme.costs.map((_, n) => {
    const column = solution.Columns[`x${n}`];
    return column !== undefined && "Primal" in column && Math.round(Number(column.Primal)) === 1;
  });
  if (!isProved && !chosen.includes(true)) throw new Error(`The solver ended with ${solution.Status}.`);
  const cost = programme.costs.reduce((sum, each, n) => (chosen[n] ? sum + each : sum), 0);
  return { chosen, cost, isProved, solveMs };
}
