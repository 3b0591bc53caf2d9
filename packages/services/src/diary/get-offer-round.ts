import { getOfferRoundInput, type OfferRoundView } from "@withy/contracts/diary";
import { notFound } from "@withy/core/errors";
import { requireReach } from "../reach";
import { verb } from "../verb";
import { readRounds } from "./read-rounds";

/** One round as it stands at this moment. */
export const getOfferRound = verb(
  "diary.read",
  getOfferRoundInput,
  async (ctx, { roundId }): Promise<OfferRoundView> => {
    const [round] = await readRounds(ctx, { roundId });
    if (!round) throw notFound("offer");
    requireReach(ctx, "diary.read", round.site.id, "offer");
    return round;
  },
);
