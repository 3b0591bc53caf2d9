import { type CoverPlaceView, coverMoveInput } from "@withy/contracts/diary";
import { coverPlaces } from "@withy/diary/cover/cover-places";
import { verb } from "../../verb";
import { moveOf, settingOfMove } from "./cover-places-of";
import { loadPlan } from "./cover-rows";
import { placeView, readPlaceNames } from "./cover-view";

const looked = 120;
const most = 12;

/** Other places for one visit of a plan, cheapest first; one room for each time and therapist. */
export const listCoverPlaces = verb(
  "diary.book",
  coverMoveInput,
  async (ctx, { coverPlanId, coverMoveId }): Promise<readonly CoverPlaceView[]> => {
    const { plan, moves } = await loadPlan(ctx, coverPlanId);
    const { visit, problem } = await settingOfMove(ctx, plan, moves, moveOf(moves, coverMoveId));
    const names = await readPlaceNames(ctx);
    const seen = new Set<string>();
    const places = coverPlaces(problem, visit, looked).places.filter((p) => {
      const key = `${p.startsAt} ${p.therapistId}`;
      return seen.has(key) ? false : seen.add(key);
    });
    return places
      .slice(0, most)
      .map((place) => placeView(ctx, names, { ...place, startsAt: new Date(place.startsAt) }));
  },
);
