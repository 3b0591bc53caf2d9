import { listOfferRoundsInput, type OfferRoundView } from "@withy/contracts/diary";
import { verb } from "../verb";
import { readRounds } from "./read-rounds";
import { reachableSites, readableSites } from "./site-reach";

/** What is on offer at these sites, or everywhere within reach, and what became of it lately. */
export const listOfferRounds = verb(
  "diary.read",
  listOfferRoundsInput,
  async (ctx, { siteIds }): Promise<OfferRoundView[]> => {
    const sites =
      siteIds.length > 0 ? await readableSites(ctx, siteIds) : await reachableSites(ctx, "diary.read");
    return readRounds(ctx, { siteIds: sites });
  },
);
