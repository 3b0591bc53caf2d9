import { refused } from "@withy/core/errors";
import { refusal } from "@withy/core/refusal";
import { overlaps } from "@withy/diary/interval";
import type { Context } from "../context";
import { readClaimed, type TherapistDays } from "./therapist-day";

export interface ChosenRoom {
  readonly id: string;
  readonly name: string;
  readonly siteId: string;
  readonly kind: string;
}

/** A visit and its clean-down, in search of a room. */
export interface RoomWish {
  readonly therapistId: string;
  readonly kind: string;
  readonly startsAt: Date;
  readonly until: Date;
  readonly movingId: string | null;
}

/**
 * The first room of the kind, in the site's own order, that is free for the whole of a visit and its clean-down; and
 * whether the therapist is, which the same look at the claims tells.
 * @throws refused `no-room` where none is
 */
export async function chooseRoom(
  ctx: Context,
  days: TherapistDays,
  wish: RoomWish,
): Promise<{ room: ChosenRoom; isTherapistFree: boolean }> {
  const { therapistId, kind, startsAt, until, movingId } = wish;
  const rooms = days.frame.rooms.filter((r) => r.kind === kind);
  const claimed = await readClaimed(ctx, [therapistId, ...rooms.map((r) => r.id)], startsAt, until, movingId);
  const visit = { from: startsAt.getTime(), to: until.getTime() };
  const blocked = (id: string): boolean =>
    days.frame.absences.some((a) => a.roomId === id && overlaps(a, visit));
  const isUnclaimed = (id: string): boolean => (claimed.get(id) ?? []).length === 0;
  const room = rooms.find((r) => isUnclaimed(r.id) && !blocked(r.id));
  if (room) return { room, isTherapistFree: isUnclaimed(therapistId) };
  const message =
    rooms.length === 0
      ? `${days.site.name} has no room of the kind that this service needs. Choose another site.`
      : `No room at ${days.site.name} is free at that time. Choose another time or site.`;
  throw refused(refusal("no-room", message, "roomId"));
}
