import { type CoverPlanView, changeCoverPlanInput } from "@withy/contracts/diary";
import { refused } from "@withy/core/errors";
import { refusal } from "@withy/core/refusal";
import { absences, appointmentChanges, coverMoves } from "@withy/db/schema";
import { and, eq, inArray } from "drizzle-orm";
import { recordAudit } from "../../audit";
import type { Context } from "../../context";
import { once } from "../../once";
import { verb } from "../../verb";
import { recordChange } from "../record-change";
import { sendVisitMessage } from "../send-visit-message";
import {
  isPlaced,
  isWrittenTo,
  outcomeOf,
  type PlacedMove,
  type PlanRow,
  savePlan,
  takePlan,
} from "./cover-rows";
import { readPlanView } from "./cover-view";
import { moveVisits, takeVisits } from "./move-visits";
import { refuseNaming } from "./name-visits";
import { undoMinutes } from "./undo-minutes";

/** @throws refused `wrong-state` or `too-late` */
function refuseUnlessUndoable(ctx: Context, plan: PlanRow): Date {
  if (plan.state !== "applied" || plan.appliedAt === null)
    throw refused(refusal("wrong-state", "There is nothing to undo: this plan is not applied."));
  if (ctx.clock.now().getTime() >= plan.appliedAt.getTime() + undoMinutes * 60_000)
    throw refused(
      refusal(
        "too-late",
        `A cover can be undone for ${undoMinutes} minutes. Move the visits one by one, or plan again.`,
      ),
    );
  return plan.appliedAt;
}

/** Closes what applying wrote: its changes are taken back, the time may be booked again. */
async function takeBack(
  tx: Context,
  plan: PlanRow,
  moves: readonly PlacedMove[],
  appliedAt: Date,
): Promise<void> {
  const ids = moves.map((m) => m.appointmentId);
  if (ids.length > 0) {
    await tx.db
      .update(appointmentChanges)
      .set({ undoneAt: tx.clock.now() })
      .where(
        and(
          eq(appointmentChanges.practiceId, tx.practiceId),
          inArray(appointmentChanges.appointmentId, ids),
          eq(appointmentChanges.kind, "moved"),
          eq(appointmentChanges.changedAt, appliedAt),
        ),
      );
    await tx.db
      .update(coverMoves)
      .set({ isApplied: 0 })
      .where(and(eq(coverMoves.practiceId, tx.practiceId), eq(coverMoves.planId, plan.id)));
  }
  const absenceId = outcomeOf(plan)?.absenceId ?? null;
  if (absenceId !== null)
    await tx.db
      .delete(absences)
      .where(and(eq(absences.practiceId, tx.practiceId), eq(absences.id, absenceId)));
}

async function undo(
  tx: Context,
  plan: PlanRow,
  moves: readonly PlacedMove[],
  appliedAt: Date,
): Promise<void> {
  const rows = await takeVisits(tx, moves);
  const changed = moves.filter((m) => rows.get(m.appointmentId)?.version !== m.appointmentVersion + 1);
  if (changed.length > 0)
    throw await refuseNaming(
      tx,
      "depends",
      plan.id,
      changed,
      (which) =>
        `Since the cover was applied, somebody changed ${which}. Nothing was undone. Move visits one by one.`,
    );
  const targets = moves.flatMap((move) => {
    const before = rows.get(move.appointmentId);
    return before ? [{ move, before, to: move.before, state: move.before.state }] : [];
  });
  const lost = await moveVisits(tx, targets, async ({ move, before }, after) => {
    await recordChange(tx, "undone", before, after);
    if (isWrittenTo(move)) await sendVisitMessage(tx, "booking-moved", before.id, before.startsAt);
  });
  if (lost)
    throw await refuseNaming(
      tx,
      "places-taken",
      plan.id,
      [lost],
      (which) =>
        `Somebody else has been booked at the old time of ${which}. Nothing was undone. Move visits one by one.`,
    );
  await takeBack(tx, plan, moves, appliedAt);
}

/** Takes a whole cover back while it is fresh and nothing has come to rest on it. */
export const undoCoverPlan = verb(
  "diary.book",
  changeCoverPlanInput,
  async (ctx, input): Promise<CoverPlanView> => {
    await once(ctx, "cover.undo", async (tx) => {
      const { plan, moves } = await takePlan(tx, input);
      const appliedAt = refuseUnlessUndoable(tx, plan);
      const placed = moves.filter(isPlaced);
      await undo(tx, plan, placed, appliedAt);
      await savePlan(tx, plan, { state: "undone" });
      const detail = { movedBack: placed.length };
      await recordAudit(tx, {
        action: "cover.undone",
        subjectKind: "cover-plan",
        subjectId: plan.id,
        detail,
      });
      return { id: plan.id };
    });
    return readPlanView(ctx, input.coverPlanId);
  },
);
