import { type DiaryPulseView, getDiaryPulseInput } from "@withy/contracts/diary";
import { verb } from "../verb";
import { laterChange, latestChangesSql } from "./latest-changes";
import { rowsOf } from "./raw-rows";
import { readableSites } from "./site-reach";

/** Whether anything in the diary changed, for screens that ask every two seconds. */
export const getDiaryPulse = verb(
  "diary.read",
  getDiaryPulseInput,
  async (ctx, input): Promise<DiaryPulseView> => {
    const siteIds = await readableSites(ctx, input.siteIds);
    if (siteIds.length === 0) return { pulse: null };
    const rows = await rowsOf<{ id: string }>(ctx.db, latestChangesSql(ctx.practiceId, siteIds));
    return { pulse: rows.reduce<string | null>((last, { id }) => laterChange(last, id), null) };
  },
);
