import { notFound, refused } from "@withy/core/errors";
import { refusal } from "@withy/core/refusal";
import type { CoverProblem } from "@withy/diary/cover/cover-problem";
import type { Context } from "../../context";
import { causeOf, type MoveRow, type PlanRow } from "./cover-rows";
import { type Promised, readCoverProblem } from "./cover-setting";
import { type AffectedVisit, readVisitsById } from "./cover-visits";

/** @throws not-found for a move of another plan */
export function moveOf(moves: readonly MoveRow[], moveId: string): MoveRow {
  const move = moves.find((m) => m.id === moveId);
  if (!move) throw notFound("visit of the plan");
  return move;
}

/** Where the other visits of the plan go, or stay: not to be had for this one. */
function promisedBy(others: readonly MoveRow[], visits: readonly AffectedVisit[]): Promised[] {
  return others.flatMap((move) => {
    const visit = visits.find((v) => v.id === move.appointmentId);
    if (!visit) return [];
    const { therapistId, roomId, siteId, startsAt } = move.place ?? move.before;
    const from = Date.parse(startsAt);
    const to = from + (visit.durationMinutes + visit.cleanDownMinutes) * 60_000;
    return [{ from, to, therapistId, roomId, siteId, patientId: visit.patientId }];
  });
}

/**
 * One visit of a plan and what is open to it beside the places of the others.
 * @throws refused `visits-changed` where the visit is no longer what the plan was made for
 */
export async function settingOfMove(
  ctx: Context,
  plan: PlanRow,
  moves: readonly MoveRow[],
  move: MoveRow,
): Promise<{ visit: AffectedVisit; problem: CoverProblem }> {
  const movingIds = moves.map((m) => m.appointmentId);
  const visits = await readVisitsById(ctx, movingIds);
  const visit = visits.find((v) => v.id === move.appointmentId);
  if (!visit || visit.version !== move.appointmentVersion)
    throw refused(
      refusal("visits-changed", "This visit changed since the plan was made. Make the plan again."),
    );
  const promised = promisedBy(
    moves.filter((m) => m.id !== move.id),
    visits,
  );
  const problem = await readCoverProblem(ctx, { cause: causeOf(plan), visits: [visit], movingIds, promised });
  return { visit, problem };
}
