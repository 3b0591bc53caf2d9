import type { CourseProposal, ProposedVisit } from "@withy/contracts/diary";
import { isAppError } from "@withy/core/errors";
import { addMinutes, dayBounds, timeOf } from "@withy/core/zoned-time";
import { checkAuthorisation, visitsLeft } from "@withy/diary/check-authorisation";
import type { Interval } from "@withy/diary/interval";
import type { SeriesVisit } from "@withy/diary/series";
import type { Context } from "../context";
import { type BookingIds, type BookingSetting, loadBookingSetting } from "./booking-setting";
import { findHolder } from "./claim-slots";
import { readPayerLimit } from "./payer-limit";
import { planVisit } from "./plan-visit";
import { nextFree } from "./slot-taken";

type Verdict = Pick<ProposedVisit, "state" | "why" | "roomName">;

async function judge(ctx: Context, ids: BookingIds, startsAt: Date): Promise<Verdict> {
  const wish = { durationMinutes: null, cleanDownMinutes: null, overrideReason: null, movingId: null };
  try {
    const plan = await planVisit(ctx, ids, { ...wish, startsAt: startsAt.toISOString() });
    const until = addMinutes(plan.endsAt, plan.cleanDownMinutes);
    const claim = { appointmentId: "", therapistId: ids.therapistId, roomId: plan.room.id, startsAt, until };
    if (plan.isFree ?? (await findHolder(ctx, claim)) === null)
      return { state: "free", why: null, roomName: plan.room.name };
    return { state: "taken", why: "The therapist is already booked at that time.", roomName: null };
  } catch (error) {
    if (!isAppError(error) || error.code !== "refused") throw error;
    return { state: error.kind === "no-room" ? "taken" : "refused", why: error.message, roomName: null };
  }
}

/** The whole of a visit with its clean-down, as the claims would hold it. */
const stretch = (s: BookingSetting, startsAt: Date): Interval => ({
  from: startsAt.getTime(),
  to: startsAt.getTime() + (s.service.durationMinutes + s.service.cleanDownMinutes) * 60_000,
});

/** What would come of each visit now, and what to take instead where it cannot be booked. Nothing is written. */
export async function proposeVisits(
  ctx: Context,
  ids: BookingIds,
  series: (zone: string) => readonly SeriesVisit[],
  time: string,
): Promise<CourseProposal> {
  const setting = await loadBookingSetting(ctx, ids);
  const { site, service, therapist } = setting;
  const visits = series(site.zone);
  const meant = visits.flatMap((v) => ("startsAt" in v ? [stretch(setting, v.startsAt)] : []));
  const proposed: ProposedVisit[] = [];
  for (const [n, visit] of visits.entries()) {
    const isReal = "startsAt" in visit;
    const verdict: Verdict = isReal
      ? await judge(ctx, ids, visit.startsAt)
      : { state: "refused", why: visit.refusal.message, roomName: null };
    const startsAt = isReal ? visit.startsAt : dayBounds(visit.day, site.zone).from;
    const { durationMinutes, cleanDownMinutes, roomKind: kind, needsEquipment: equipment } = service;
    const wanted = {
      appointmentId: "",
      therapistId: therapist.id,
      roomId: "",
      startsAt,
      until: startsAt,
      site,
    };
    const sizes = { needs: { kind, equipment, isStepFree: false }, durationMinutes, cleanDownMinutes };
    const alternatives = verdict.state === "free" ? [] : await nextFree(ctx, { ...wanted, ...sizes }, meant);
    const startTime = isReal ? timeOf(visit.startsAt, site.zone) : time;
    proposed.push({ position: n + 1, day: visit.day, startTime, ...verdict, alternatives });
  }
  const limit = await readPayerLimit(ctx, ids.patientId);
  return {
    visits: proposed,
    limit: limit && { ...limit, left: visitsLeft(limit) },
    refusal: checkAuthorisation(limit, visits.length)?.message ?? null,
  };
}
