import { refused } from "@withy/core/errors";
import { refusal } from "@withy/core/refusal";
import { equipmentWords } from "@withy/diary/equipment";
import { overlaps } from "@withy/diary/interval";
import { type RoomNeeds, roomSuits } from "@withy/diary/room-suits";
import type { Context } from "../context";
import { readClaimed, type TherapistDays } from "./therapist-day";

export interface ChosenRoom {
  readonly id: string;
  readonly name: string;
  readonly siteId: string;
  readonly kind: string;
  readonly equipment: readonly string[];
  readonly isStepFree: boolean;
}

/** A visit and its clean-down, in search of a room. */
export interface RoomWish {
  readonly therapistId: string;
  readonly needs: RoomNeeds;
  readonly startsAt: Date;
  readonly until: Date;
  readonly movingId: string | null;
}

function noneSuits(site: string, needs: RoomNeeds): string {
  const equipped = needs.equipment.length > 0 ? ` with ${equipmentWords(needs.equipment)}` : "";
  const reached = needs.isStepFree ? " that is reached without a step" : "";
  return `${site} has no room of the kind that this service needs${equipped}${reached}. Choose another site.`;
}

/**
 * The first room that suits, in the site's own order, that is free for the whole of a visit and its clean-down; and
 * whether the therapist is, which the same look at the claims tells.
 * @throws refused `no-room` where none is
 */
export async function chooseRoom(
  ctx: Context,
  days: TherapistDays,
  wish: RoomWish,
): Promise<{ room: ChosenRoom; isTherapistFree: boolean }> {
  const { therapistId, needs, startsAt, until, movingId } = wish;
  const rooms = days.frame.rooms.filter((r) => roomSuits(r, needs));
  const claimed = await readClaimed(ctx, [therapistId, ...rooms.map((r) => r.id)], startsAt, until, movingId);
  const visit = { from: startsAt.getTime(), to: until.getTime() };
  const blocked = (id: string): boolean =>
    days.frame.absences.some((a) => a.roomId === id && overlaps(a, visit));
  const isUnclaimed = (id: string): boolean => (claimed.get(id) ?? []).length === 0;
  const room = rooms.find((r) => isUnclaimed(r.id) && !blocked(r.id));
  if (room) return { room, isTherapistFree: isUnclaimed(therapistId) };
  const message =
    rooms.length === 0
      ? noneSuits(days.site.name, needs)
      : `No room at ${days.site.name} is free at that time. Choose another time or site.`;
  throw refused(refusal("no-room", message, "roomId"));
}
