import type { CoverMoveView, CoverPlaceView, CoverPlanState } from "@withy/contracts/diary";
import { weekdayDate } from "@withy/core/date-words";

export const counted = (count: number, one: string): string => `${count} ${one}${count === 1 ? "" : "s"}`;

export const planStateWords: Record<CoverPlanState, string> = {
  solving: "being worked out",
  ready: "to be decided",
  applied: "applied",
  undone: "undone",
  dropped: "closed",
};

/** "Tue 1 Dec, 10:15, Nia Prosser, Room 2, Saltgate": the site only where it is another one. */
export function placeWords(place: CoverPlaceView, fromSiteId: string): string {
  const at = `${weekdayDate(place.day)}, ${place.startTime}`;
  const site = place.site.id === fromSiteId ? "" : `, ${place.site.name}`;
  return `${at}, ${place.therapist.name}, ${place.room.name}${site}`;
}

export interface CoverTotals {
  readonly moving: readonly CoverMoveView[];
  readonly left: readonly CoverMoveView[];
  readonly told: number;
  readonly ring: readonly CoverMoveView[];
  readonly points: number;
}

export function totalsOf(moves: readonly CoverMoveView[]): CoverTotals {
  const moving = moves.filter((m) => m.place !== null);
  return {
    moving,
    left: moves.filter((m) => m.place === null),
    told: moves.filter((m) => m.tells === "message").length,
    ring: moves.filter((m) => m.tells === "ring"),
    points: moving.reduce((sum, m) => sum + (m.place?.cost ?? 0), 0),
  };
}
