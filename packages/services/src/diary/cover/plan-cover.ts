import { type CoverPlanView, planCoverInput } from "@withy/contracts/diary";
import { can } from "@withy/core/access/can";
import { notFound, refused } from "@withy/core/errors";
import { newId } from "@withy/core/ids";
import { refusal } from "@withy/core/refusal";
import { coverPlans, rooms, sites, staffMembers } from "@withy/db/schema";
import { and, eq, inArray, ne } from "drizzle-orm";
import type { z } from "zod";
import { recordAudit } from "../../audit";
import type { Context } from "../../context";
import { loadRecord } from "../../load-record";
import { findLiveJob, startJob } from "../../messaging/start-job";
import { once } from "../../once";
import { requireReach } from "../../reach";
import { verb } from "../../verb";
import { startOf } from "../plan-visit";
import { coverKind } from "./cover-kind";
import { readPlanView } from "./cover-view";
import { type CoverCause, readAffected } from "./cover-visits";

type Input = z.output<typeof planCoverInput>;

const longestDays = 31;
const mostVisits = 300;

/** The site by whose clock the absence is meant. @throws not-found, refused */
async function loadHome(ctx: Context, input: Input): Promise<typeof sites.$inferSelect> {
  const person =
    input.therapistId === null ? null : await loadRecord(ctx, staffMembers, input.therapistId, "therapist");
  const room = input.roomId === null ? null : await loadRecord(ctx, rooms, input.roomId, "room");
  if (room) requireReach(ctx, "diary.book", room.siteId, "room");
  if (person && !person.isTherapist) throw notFound("therapist");
  if ((person === null) === (room === null))
    throw refused(refusal("one-cause", "Choose a therapist or a room, one of the two.", "therapistId"));
  return loadRecord(ctx, sites, room?.siteId ?? person?.homeSiteId ?? "", "site");
}

/** @throws refused for times that are reversed, over or too long */
function causeFrom(ctx: Context, input: Input, zone: string): CoverCause {
  const [from, to] = [startOf(input.startsAt, zone), startOf(input.endsAt, zone)];
  if (to <= from)
    throw refused(refusal("dates-reversed", "The end is before the start. Change one of them.", "endsAt"));
  if (to <= ctx.clock.now())
    throw refused(refusal("in-the-past", "That time has passed. Choose a later end.", "endsAt"));
  if (to.getTime() - from.getTime() > longestDays * 86_400_000)
    throw refused(
      refusal("too-long", `Choose ${longestDays} days or fewer, and plan the rest later.`, "endsAt"),
    );
  return { therapistId: input.therapistId, roomId: input.roomId, from, to };
}

/** @throws not-found where none of it is within reach, refused where there is nothing to move or too much */
async function requireVisits(ctx: Context, cause: CoverCause, homeId: string): Promise<void> {
  const affected = await readAffected(ctx, cause);
  const within = affected.filter((v) => can(ctx.roles, "diary.book", v.siteId));
  if (within.length === 0 && !can(ctx.roles, "diary.book", homeId)) throw notFound("therapist");
  if (within.length === 0)
    throw refused(
      refusal("nothing-to-move", "Nobody is booked there in that time, so no visit has to move.", "startsAt"),
    );
  if (within.length > mostVisits)
    throw refused(
      refusal(
        "too-many",
        `More than ${mostVisits} visits fall in that time. Plan a shorter time first.`,
        "endsAt",
      ),
    );
}

const liveKeyOf = (cause: CoverCause): string => cause.therapistId ?? cause.roomId ?? "";

/** Only the latest plan for a therapist or a room can be applied: the ones before it did not know of it. */
async function dropEarlier(tx: Context, cause: CoverCause, keepId: string): Promise<void> {
  const whose =
    cause.therapistId === null
      ? eq(coverPlans.roomId, cause.roomId ?? "")
      : eq(coverPlans.therapistId, cause.therapistId);
  await tx.db
    .update(coverPlans)
    .set({ state: "dropped" })
    .where(
      and(
        eq(coverPlans.practiceId, tx.practiceId),
        whose,
        inArray(coverPlans.state, ["solving", "ready"]),
        ne(coverPlans.id, keepId),
      ),
    );
}

async function startPlan(tx: Context, input: Input, cause: CoverCause): Promise<string> {
  const live = await findLiveJob(tx, coverKind, liveKeyOf(cause));
  if (live) return (live.input as { coverPlanId: string }).coverPlanId;
  const id = newId();
  const { therapistId, roomId, from, to } = cause;
  const { practiceId, staffMemberId } = tx;
  await tx.db.insert(coverPlans).values({
    ...{ practiceId, id, therapistId, roomId, startsAt: from, endsAt: to, reason: input.reason },
    createdAt: tx.clock.now(),
    createdBy: staffMemberId,
  });
  const { row, isNew } = await startJob(tx, {
    kind: coverKind,
    input: { coverPlanId: id },
    liveKey: liveKeyOf(cause),
  });
  const kept = isNew ? id : (row.input as { coverPlanId: string }).coverPlanId;
  await dropEarlier(tx, cause, kept);
  if (!isNew) return kept;
  await tx.db
    .update(coverPlans)
    .set({ jobId: row.id })
    .where(and(eq(coverPlans.practiceId, practiceId), eq(coverPlans.id, id)));
  const detail = {
    kind: therapistId === null ? "room" : "therapist",
    from: from.toISOString(),
    to: to.toISOString(),
  };
  await recordAudit(tx, { action: "cover.planned", subjectKind: "cover-plan", subjectId: id, detail });
  return id;
}

/** Starts working out where the visits of an absent therapist or a shut room go; the worker does it. */
export const planCover = verb("diary.book", planCoverInput, async (ctx, input): Promise<CoverPlanView> => {
  const { id } = await once(ctx, "cover.plan", async (tx) => {
    const home = await loadHome(tx, input);
    const cause = causeFrom(tx, input, home.zone);
    await requireVisits(tx, cause, home.id);
    return { id: await startPlan(tx, input, cause) };
  });
  return readPlanView(ctx, id);
});
