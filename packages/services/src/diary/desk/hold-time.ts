import { holdTimeInput } from "@withy/contracts/diary";
import { notFound } from "@withy/core/errors";
import { newId } from "@withy/core/ids";
import { addMinutes } from "@withy/core/zoned-time";
import { diaryHolds, sites, staffMembers } from "@withy/db/schema";
import { loadRecord } from "../../load-record";
import { requireReach } from "../../reach";
import { verb } from "../../verb";
import { holdMinutes } from "../live/live-limits";
import { startOf } from "../plan-visit";

/**
 * Says that one is booking this time, so that others see it hatched for a few minutes. A courtesy and no lock: only
 * the claims decide who gets a time. There is one for each person, so that nobody can hatch a whole day. It leaves no
 * trace in the audit, which tells what became of the diary.
 */
export const holdTime = verb("diary.book", holdTimeInput, async (ctx, input) => {
  const site = await loadRecord(ctx, sites, input.siteId, "site");
  requireReach(ctx, "diary.book", site.id, "site");
  const therapist = await loadRecord(ctx, staffMembers, input.therapistId, "therapist");
  if (!therapist.isTherapist) throw notFound("therapist");
  const startsAt = startOf(input.startsAt, site.zone);
  const now = ctx.clock.now();
  const place = {
    siteId: site.id,
    therapistId: therapist.id,
    startsAt,
    endsAt: addMinutes(startsAt, input.durationMinutes),
    expiresAt: addMinutes(now, holdMinutes),
  };
  await ctx.db
    .insert(diaryHolds)
    .values({ practiceId: ctx.practiceId, id: newId(), heldBy: ctx.staffMemberId, ...place })
    .onDuplicateKeyUpdate({ set: place });
  return { heldUntil: place.expiresAt.toISOString() };
});
