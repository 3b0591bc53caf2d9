import { refused } from "@withy/core/errors";
import { refusal } from "@withy/core/refusal";
import { addMinutes, dayOf } from "@withy/core/zoned-time";
import { sites, staffMembers } from "@withy/db/schema";
import { overlaps } from "@withy/diary/interval";
import { type RoomNeeds, roomSuits } from "@withy/diary/room-suits";
import { isOnGrid } from "@withy/diary/slots";
import type { FreedTime } from "@withy/diary/waiting-match";
import type { Context } from "../context";
import { loadRecord } from "../load-record";
import { requireReach } from "../reach";
import { startOf } from "./plan-visit";
import { freeTime, readClaimed, readTherapistDays } from "./therapist-day";

/** An answer by e-mail takes a while to come; nearer times are filled by telephone. */
const leastMinutesAhead = 15;
/** A clean-down may run past working time; what lies later than this is no concern of the time on offer. */
const cleanDownMinutes = 60;

export interface TimeIds {
  readonly siteId: string;
  readonly therapistId: string;
  readonly startsAt: string;
}

/** A time of a therapist with what is free around it, rooms included. */
export interface OfferableTime extends FreedTime {
  /** Where the free time ends, by the sooner of work and whatever comes next. */
  readonly until: Date;
  readonly hasRoom: (needs: RoomNeeds, minutes: number) => boolean;
}

const no = (kind: string, message: string) => refused(refusal(kind, message, "startsAt"));

/**
 * The time that begins at `startsAt` and lasts until something is in the way.
 * @throws not-found; refused where it is past, off the grid, outside working hours or taken
 */
export async function readFreedTime(ctx: Context, ids: TimeIds): Promise<OfferableTime> {
  const site = await loadRecord(ctx, sites, ids.siteId, "site");
  requireReach(ctx, "diary.book", site.id, "site");
  const member = await loadRecord(ctx, staffMembers, ids.therapistId, "therapist");
  const startsAt = startOf(ids.startsAt, site.zone);
  if (!isOnGrid(startsAt)) throw no("off-grid", "Choose a start on five minutes, such as 10:05 or 10:10.");
  if (startsAt < addMinutes(ctx.clock.now(), leastMinutesAhead))
    throw no("too-soon", "That time is too near for a message. Ring someone from the waiting list instead.");
  const days = await readTherapistDays(ctx, member.id, site, dayOf(startsAt, site.zone));
  const at = startsAt.getTime();
  const work = days?.working.find((w) => w.from <= at && at < w.to);
  const name = `${member.givenName} ${member.familyName}`;
  if (!days || !work)
    throw no("outside-hours", `${name} does not work at ${site.name} at that time. Choose another time.`);
  const last = addMinutes(new Date(work.to), cleanDownMinutes);
  const roomIds = days.frame.rooms.map((room) => room.id);
  const claimed = await readClaimed(ctx, [member.id, ...roomIds], startsAt, last);
  const free = freeTime(days, claimed.get(member.id) ?? [], cleanDownMinutes);
  const run = free.find((f) => f.from <= at && at < f.to);
  if (!run) throw no("slot-taken", `${name} is no longer free at that time. Choose another time.`);
  const freeUntil = new Date(run.to);
  return {
    ...{ startsAt, freeUntil, workUntil: new Date(work.to), zone: site.zone },
    until: new Date(Math.min(freeUntil.getTime(), work.to)),
    site: { id: site.id, name: site.name },
    therapist: { id: member.id, name },
    hasRoom: (needs, minutes) => {
      const visit = { from: at, to: at + minutes * 60_000 };
      const isFree = (id: string): boolean =>
        ![...(claimed.get(id) ?? []), ...days.frame.absences.filter((a) => a.roomId === id)].some((c) =>
          overlaps(c, visit),
        );
      return days.frame.rooms.some((room) => roomSuits(room, needs) && isFree(room.id));
    },
  };
}
