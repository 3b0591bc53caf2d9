import { type CoverPlanView, changeCoverPlanInput } from "@withy/contracts/diary";
import { newId } from "@withy/core/ids";
import { absences, coverMoves } from "@withy/db/schema";
import { canBeMoved } from "@withy/diary/check-mark";
import { placeFits } from "@withy/diary/cover/cover-places";
import { and, eq, gte, inArray, lte } from "drizzle-orm";
import { recordAudit } from "../../audit";
import type { Context } from "../../context";
import { once } from "../../once";
import { verb } from "../../verb";
import type { AppointmentRow } from "../change-appointment";
import { recordChange } from "../record-change";
import { sendVisitMessage } from "../send-visit-message";
import {
  causeOf,
  isPlaced,
  isWrittenTo,
  outcomeOf,
  type PlacedMove,
  type PlanRow,
  refuseUnlessReady,
  savePlan,
  takePlan,
} from "./cover-rows";
import { readCoverProblem } from "./cover-setting";
import { readPlanView } from "./cover-view";
import { readVisitsById } from "./cover-visits";
import { moveVisits, type Target, takeVisits } from "./move-visits";
import { refuseNaming } from "./name-visits";

const planAgain = "Nothing was moved. Make the plan again.";
const changed = (which: string): string => `Since the plan was made, somebody changed ${which}. ${planAgain}`;
const gone = (which: string): string =>
  `The new place for ${which} is no longer free. Nothing was moved. Choose another place, or make the plan again.`;

/** @throws refused `visits-changed` with every visit that is no longer what the plan was made for */
async function refuseChanged(
  tx: Context,
  plan: PlanRow,
  moves: readonly PlacedMove[],
  rows: ReadonlyMap<string, AppointmentRow>,
): Promise<void> {
  const wrong = moves.filter((m) => {
    const row = rows.get(m.appointmentId);
    return !row || row.version !== m.appointmentVersion || !canBeMoved(row.state);
  });
  if (wrong.length > 0) throw await refuseNaming(tx, "visits-changed", plan.id, wrong, changed);
}

/** @throws refused `places-taken` with every visit whose new place the diary would not give any more */
async function refuseTaken(tx: Context, plan: PlanRow, moves: readonly PlacedMove[]): Promise<void> {
  const movingIds = moves.map((m) => m.appointmentId);
  const visits = await readVisitsById(tx, movingIds);
  const problem = await readCoverProblem(tx, { cause: causeOf(plan), visits, movingIds });
  const wrong = moves.filter((m) => {
    const visit = visits.find((v) => v.id === m.appointmentId);
    return !visit || !placeFits(problem, visit, { ...m.place, startsAt: Date.parse(m.place.startsAt) });
  });
  if (wrong.length > 0) throw await refuseNaming(tx, "places-taken", plan.id, wrong, gone);
}

/** Keeps the time from being booked. @returns the absence, or null where one covers it already */
async function writeAbsence(tx: Context, plan: PlanRow): Promise<string | null> {
  const { practiceId, therapistId, roomId, startsAt, endsAt, reason } = plan;
  const whose =
    therapistId === null ? eq(absences.roomId, roomId ?? "") : eq(absences.staffMemberId, therapistId);
  const [standing] = await tx.db
    .select({ id: absences.id })
    .from(absences)
    .where(
      and(
        eq(absences.practiceId, practiceId),
        whose,
        lte(absences.startsAt, startsAt),
        gte(absences.endsAt, endsAt),
      ),
    )
    .limit(1);
  if (standing) return null;
  const id = newId();
  const kind = therapistId === null ? "blocked" : "leave";
  await tx.db.insert(absences).values({
    ...{ practiceId, id, staffMemberId: therapistId, roomId, kind, reason, startsAt, endsAt },
    createdBy: tx.staffMemberId,
  });
  return id;
}

async function tell(tx: Context, { move, before }: Target, after: AppointmentRow): Promise<void> {
  await recordChange(tx, "moved", before, after);
  if (isWrittenTo(move)) await sendVisitMessage(tx, "booking-moved", before.id, before.startsAt);
}

const targetOf = (move: PlacedMove, before: AppointmentRow): Target => ({
  move,
  before,
  to: move.place,
  // Whoever confirmed, confirmed the old time.
  state: Date.parse(move.place.startsAt) === before.startsAt.getTime() ? before.state : "booked",
});

async function apply(tx: Context, plan: PlanRow, moves: readonly PlacedMove[]): Promise<void> {
  const rows = await takeVisits(tx, moves);
  await refuseChanged(tx, plan, moves, rows);
  await refuseTaken(tx, plan, moves);
  const targets = moves.flatMap((m) => {
    const row = rows.get(m.appointmentId);
    return row ? [targetOf(m, row)] : [];
  });
  const lost = await moveVisits(tx, targets, (target, after) => tell(tx, target, after));
  if (lost) throw await refuseNaming(tx, "places-taken", plan.id, [lost], gone);
  const absenceId = await writeAbsence(tx, plan);
  if (moves.length > 0)
    await tx.db
      .update(coverMoves)
      .set({ isApplied: 1 })
      .where(
        and(
          eq(coverMoves.practiceId, tx.practiceId),
          inArray(
            coverMoves.id,
            moves.map((m) => m.id),
          ),
        ),
      );
  const outcome = { ...outcomeOf(plan), absenceId };
  await savePlan(tx, plan, { state: "applied", appliedAt: tx.clock.now(), outcome });
  const detail = { moved: moves.length };
  await recordAudit(tx, { action: "cover.applied", subjectKind: "cover-plan", subjectId: plan.id, detail });
}

/** Moves every visit of the plan to its new place in one transaction, or none; and blocks the absence. */
export const applyCoverPlan = verb(
  "diary.book",
  changeCoverPlanInput,
  async (ctx, input): Promise<CoverPlanView> => {
    await once(ctx, "cover.apply", async (tx) => {
      const { plan, moves } = await takePlan(tx, input);
      refuseUnlessReady(plan);
      await apply(tx, plan, moves.filter(isPlaced));
      return { id: plan.id };
    });
    return readPlanView(ctx, input.coverPlanId);
  },
);
