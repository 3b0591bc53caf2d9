import type { CoverOutcome } from "@withy/contracts/diary";
import { can } from "@withy/core/access/can";
import { notFound, refused, stale } from "@withy/core/errors";
import { refusal } from "@withy/core/refusal";
import { coverMoves, coverPlans, rooms } from "@withy/db/schema";
import { and, asc, eq } from "drizzle-orm";
import type { Context } from "../../context";
import { findRecord, loadRecord } from "../../load-record";
import type { CoverCause } from "./cover-visits";

export type PlanRow = typeof coverPlans.$inferSelect;
export type MoveRow = typeof coverMoves.$inferSelect;
export type PlacedMove = MoveRow & { readonly place: NonNullable<MoveRow["place"]> };

/** What is kept of a plan beside its moves. */
export interface KeptOutcome extends CoverOutcome {
  /** The absence that applying the plan wrote; null where one stood already. */
  readonly absenceId?: string | null;
}

export const outcomeOf = (plan: PlanRow): KeptOutcome | null => plan.outcome as KeptOutcome | null;

export const isPlaced = (move: MoveRow): move is PlacedMove => move.place !== null;

export const causeOf = (plan: PlanRow): CoverCause => ({
  therapistId: plan.therapistId,
  roomId: plan.roomId,
  from: plan.startsAt,
  to: plan.endsAt,
});

export function readMoves(ctx: Context, planId: string): Promise<MoveRow[]> {
  return ctx.db
    .select()
    .from(coverMoves)
    .where(and(eq(coverMoves.practiceId, ctx.practiceId), eq(coverMoves.planId, planId)))
    .orderBy(asc(coverMoves.id));
}

/**
 * A plan with its moves, for who may book at every site that it touches.
 * @throws not-found
 */
export async function loadPlan(
  ctx: Context,
  planId: string,
  options: { lock?: boolean } = {},
): Promise<{ plan: PlanRow; moves: MoveRow[] }> {
  const plan = await loadRecord(ctx, coverPlans, planId, "cover plan", options);
  const moves = await readMoves(ctx, planId);
  const room = plan.roomId === null ? null : await findRecord(ctx, rooms, plan.roomId);
  const touched = moves.flatMap((m) => [m.before.siteId, ...(m.place ? [m.place.siteId] : [])]);
  const siteIds = new Set([...touched, ...(room ? [room.siteId] : [])]);
  if (![...siteIds].every((id) => can(ctx.roles, "diary.book", id))) throw notFound("cover plan");
  return { plan, moves };
}

/** The plan for this transaction, as the screen saw it. @throws not-found, stale */
export async function takePlan(
  ctx: Context,
  input: { coverPlanId: string; version: number },
): Promise<{ plan: PlanRow; moves: MoveRow[] }> {
  const taken = await loadPlan(ctx, input.coverPlanId, { lock: true });
  if (taken.plan.version !== input.version) throw stale("cover plan");
  return taken;
}

/** @throws refused `wrong-state` */
export function refuseUnlessReady(plan: PlanRow): void {
  if (plan.state === "ready") return;
  const message =
    plan.state === "solving"
      ? "The plan is still being made. Wait until it is there."
      : "This plan is closed. Make a new one to change anything.";
  throw refused(refusal("wrong-state", message));
}

/** Writes the changed columns with the next version. */
export async function savePlan(ctx: Context, plan: PlanRow, change: Partial<PlanRow>): Promise<void> {
  const [written] = await ctx.db
    .update(coverPlans)
    .set({ ...change, version: plan.version + 1 })
    .where(
      and(
        eq(coverPlans.practiceId, plan.practiceId),
        eq(coverPlans.id, plan.id),
        eq(coverPlans.version, plan.version),
      ),
    );
  if (written.affectedRows !== 1) throw stale("cover plan");
}

/** Whether the patient has to hear of the move: another room at the same time is the desk's business. */
export const changesForPatient = ({ before, place }: PlacedMove): boolean =>
  before.startsAt !== place.startsAt ||
  before.siteId !== place.siteId ||
  before.therapistId !== place.therapistId;

/** Whether a message tells the patient, if there is an address to send it to. */
export const isWrittenTo = (move: PlacedMove): boolean =>
  move.decision !== "phone" && changesForPatient(move);
