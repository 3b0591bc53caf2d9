import { type CoverPlanView, decideCoverMoveInput } from "@withy/contracts/diary";
import { refused } from "@withy/core/errors";
import { refusal } from "@withy/core/refusal";
import { dayOf, daysBetween } from "@withy/core/zoned-time";
import { coverMoves, rooms, sites, staffMembers } from "@withy/db/schema";
import { coverCost } from "@withy/diary/cover/cover-cost";
import { placeFits } from "@withy/diary/cover/cover-places";
import { dayClock } from "@withy/diary/day-clock";
import { and, eq } from "drizzle-orm";
import type { z } from "zod";
import { recordAudit } from "../../audit";
import type { Context } from "../../context";
import { loadRecord } from "../../load-record";
import { once } from "../../once";
import { requireReach } from "../../reach";
import { verb } from "../../verb";
import { startOf } from "../plan-visit";
import { moveOf, settingOfMove } from "./cover-places-of";
import { type MoveRow, type PlanRow, refuseUnlessReady, savePlan, takePlan } from "./cover-rows";
import { readPlanView } from "./cover-view";

type Place = NonNullable<z.output<typeof decideCoverMoveInput>["place"]>;
type MovePlace = NonNullable<MoveRow["place"]>;

/** The place asked for, priced, if the visit may go there. @throws not-found, refused */
async function placeFor(
  ctx: Context,
  plan: PlanRow,
  moves: readonly MoveRow[],
  move: MoveRow,
  wanted: Place,
): Promise<MovePlace> {
  const site = await loadRecord(ctx, sites, wanted.siteId, "site");
  requireReach(ctx, "diary.book", site.id, "site");
  await loadRecord(ctx, staffMembers, wanted.therapistId, "therapist");
  await loadRecord(ctx, rooms, wanted.roomId, "room");
  const startsAt = startOf(wanted.startsAt, site.zone);
  const { visit, problem } = await settingOfMove(ctx, plan, moves, move);
  const { therapistId, siteId, roomId } = wanted;
  if (!placeFits(problem, visit, { startsAt: startsAt.getTime(), therapistId, siteId, roomId }))
    throw refused(
      refusal("slot-taken", "That place is not free for this visit any more. Choose another.", "place"),
    );
  const ownZone = problem.sites.find((s) => s.id === visit.siteId)?.zone ?? site.zone;
  const own = new Date(visit.startsAt);
  const [ownDay, day] = [dayOf(own, ownZone), dayOf(startsAt, site.zone)];
  const days = Math.max(0, daysBetween(ownDay, day));
  const minutes =
    days === 0
      ? (startsAt.getTime() - visit.startsAt) / 60_000
      : dayClock(day, site.zone).wallOf(startsAt.getTime()) -
        dayClock(ownDay, ownZone).wallOf(visit.startsAt);
  return {
    ...{ startsAt: startsAt.toISOString(), therapistId, siteId, roomId },
    ...coverCost(visit, { therapistId, siteId, roomId, days, minutes }),
  };
}

async function saveMove(tx: Context, move: MoveRow, change: Partial<MoveRow>): Promise<void> {
  await tx.db
    .update(coverMoves)
    .set(change)
    .where(and(eq(coverMoves.practiceId, tx.practiceId), eq(coverMoves.id, move.id)));
}

/** Keeps a proposed place, takes another for it, or has the patient rung instead of written to. */
export const decideCoverMove = verb(
  "diary.book",
  decideCoverMoveInput,
  async (ctx, input): Promise<CoverPlanView> => {
    await once(ctx, "cover.decide", async (tx) => {
      const { plan, moves } = await takePlan(tx, input);
      const move = moveOf(moves, input.coverMoveId);
      refuseUnlessReady(plan);
      const { decision, place } = input;
      if (decision === "change") {
        if (place === null)
          throw refused(refusal("no-place", "Choose the place that the visit goes to.", "place"));
        await saveMove(tx, move, {
          decision,
          place: await placeFor(tx, plan, moves, move, place),
          problem: null,
        });
      } else await saveMove(tx, move, { decision });
      await savePlan(tx, plan, {});
      const detail = { decision, appointmentId: move.appointmentId };
      await recordAudit(tx, {
        action: "cover.decided",
        subjectKind: "cover-plan",
        subjectId: plan.id,
        detail,
      });
      return { id: plan.id };
    });
    return readPlanView(ctx, input.coverPlanId);
  },
);
