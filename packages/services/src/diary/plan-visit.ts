import { type AppError, notFound, refused, refuseIf } from "@withy/core/errors";
import { addMinutes, dayOf, minutesBetween } from "@withy/core/zoned-time";
import { checkBooking, readStart } from "@withy/diary/check-booking";
import type { AwayVisit } from "@withy/diary/check-way";
import type { RoomFacts, RoomNeeds } from "@withy/diary/room-suits";
import type { Context } from "../context";
import { type BookingIds, type BookingSetting, loadBookingSetting } from "./booking-setting";
import { type ChosenRoom, chooseRoom } from "./choose-room";
import { type Claim, claimSlots, findHolder } from "./claim-slots";
import { slotTaken } from "./slot-taken";
import { readTherapistDays, type TherapistDays } from "./therapist-day";

/** A visit may be written down this long after it began: the desk is busy when someone walks in. */
const graceMinutes = 60;

export interface PlanWish {
  /** As the contract's `startField` takes it. */
  readonly startsAt: string;
  /** Null: the service's own. */
  readonly durationMinutes: number | null;
  readonly cleanDownMinutes: number | null;
  readonly overrideReason: string | null;
  readonly movingId: string | null;
  /** Whether the patient has to reach the room without a step. */
  readonly needsStepFree?: boolean;
}

/** A visit that every rule allows, with its room; only the claims can still say no. */
export interface VisitPlan {
  readonly setting: BookingSetting;
  readonly room: ChosenRoom;
  readonly startsAt: Date;
  readonly endsAt: Date;
  readonly cleanDownMinutes: number;
  readonly needs: RoomNeeds;
  /** What a look at the claims said of the whole of it; null where nobody looked yet. */
  readonly isFree: boolean | null;
}

/**
 * The instant behind what was typed: an instant as it is, or a clock time at the site.
 * @throws refused `clock-gap` for a time that the clocks jump over
 */
export function startOf(text: string, zone: string): Date {
  if (/(?:Z|[+-]\d{2}:\d{2})$/i.test(text.slice(16))) return new Date(text);
  const start = readStart(text.slice(0, 10), text.slice(11, 16), zone);
  if (start instanceof Date) return start;
  throw refused(start);
}

function awayVisits({ frame, site }: TherapistDays): AwayVisit[] {
  return frame.away.map(({ from, to, siteId, siteName }) => ({
    ...{ from, to, siteName },
    minutesThere: frame.travel(site.id, siteId),
    minutesBack: frame.travel(siteId, site.id),
  }));
}

/** Asks every rule about a visit and settles its room. @throws not-found, or refused with the first thing in the way */
export async function planVisit(ctx: Context, ids: BookingIds, wish: PlanWish): Promise<VisitPlan> {
  const setting = await loadBookingSetting(ctx, ids);
  const { site, service, therapist } = setting;
  const startsAt = startOf(wish.startsAt, site.zone);
  const durationMinutes = wish.durationMinutes ?? service.durationMinutes;
  const cleanDownMinutes = wish.cleanDownMinutes ?? service.cleanDownMinutes;
  const days = await readTherapistDays(ctx, therapist.id, site, dayOf(startsAt, site.zone), 1, wish.movingId);
  if (!days) throw notFound("site");
  const needsStepFree = wish.needsStepFree ?? false;
  const needs = { kind: service.roomKind, equipment: service.needsEquipment, isStepFree: needsStepFree };
  const check = (room: RoomFacts & { id?: string; name: string; siteId: string }): void =>
    refuseIf(
      checkBooking({
        ...{ startsAt, durationMinutes, cleanDownMinutes, now: ctx.clock.now(), graceMinutes },
        ...{ site, room, service, therapist, working: days.working, needsStepFree, away: awayVisits(days) },
        blocked: days.frame.absences.filter((a) => a.staffMemberId === therapist.id || a.roomId === room.id),
        closedReason: days.site.closed.get(dayOf(startsAt, site.zone)),
        overrideReason: wish.overrideReason ?? undefined,
      }),
    );
  const endsAt = addMinutes(startsAt, durationMinutes);
  if (setting.room) {
    check(setting.room);
    return { setting, room: setting.room, startsAt, endsAt, cleanDownMinutes, needs, isFree: null };
  }
  check({ name: "any room", siteId: site.id, ...needs });
  const until = addMinutes(endsAt, cleanDownMinutes);
  const roomWish = { therapistId: therapist.id, needs, startsAt, until };
  const found = await chooseRoom(ctx, days, { ...roomWish, movingId: wish.movingId });
  const { room, isTherapistFree } = found;
  return { setting, room, startsAt, endsAt, cleanDownMinutes, needs, isFree: isTherapistFree };
}

/** Takes the plan's time for the visit. @throws refused `slot-taken` where someone else has any of it */
export async function claimPlan(ctx: Context, appointmentId: string, plan: VisitPlan): Promise<void> {
  const claim = claimOf(plan, appointmentId);
  // The look beforehand only spares a plain "taken" the locks of a failed insert.
  const isFree = plan.isFree ?? (await findHolder(ctx, claim)) === null;
  if (isFree && (await claimSlots(ctx, claim))) return;
  throw await planTaken(ctx, appointmentId, plan);
}

export function claimOf(plan: VisitPlan, appointmentId: string): Claim {
  const { setting, room, startsAt, endsAt, cleanDownMinutes } = plan;
  const until = addMinutes(endsAt, cleanDownMinutes);
  return { appointmentId, therapistId: setting.therapist.id, roomId: room.id, startsAt, until };
}

/** The refusal of a plan whose time someone else has. */
export function planTaken(ctx: Context, appointmentId: string, plan: VisitPlan): Promise<AppError> {
  const { site } = plan.setting;
  const { cleanDownMinutes, needs } = plan;
  const durationMinutes = minutesBetween(plan.startsAt, plan.endsAt);
  const length = { needs, durationMinutes, cleanDownMinutes };
  return slotTaken(ctx, { ...claimOf(plan, appointmentId), site, ...length });
}
