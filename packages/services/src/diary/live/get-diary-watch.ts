import { type DiaryWatchView, getDiaryWatchInput } from "@withy/contracts/diary";
import { verb } from "../../verb";
import { readableSites } from "../site-reach";
import { replayMs } from "./live-limits";

/** Which sites a live stream may tell of, and where it goes on after a reconnection. */
export const getDiaryWatch = verb(
  "diary.read",
  getDiaryWatchInput,
  async (ctx, input): Promise<DiaryWatchView> => {
    const siteIds = await readableSites(ctx, input.siteIds);
    if (!input.after) return { siteIds, since: null, mustReload: false };
    const since = Number(input.after);
    // The ids of the events are of this machine's clock, as those of the changes are.
    const age = Date.now() - since;
    const isKnown = Number.isSafeInteger(since) && age < replayMs && age > -replayMs;
    return { siteIds, since: isKnown ? since : null, mustReload: !isKnown };
  },
);
