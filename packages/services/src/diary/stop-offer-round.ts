import { type OfferRoundView, stopOfferRoundInput } from "@withy/contracts/diary";
import { refused } from "@withy/core/errors";
import { refusal } from "@withy/core/refusal";
import { requireReach } from "../reach";
import { inTransaction } from "../transaction";
import { verb } from "../verb";
import { endRound, lockRound } from "./offer-round";
import { readRounds } from "./read-rounds";

const ended = {
  taken: "Someone has accepted this time, so it is booked. Cancel the visit if it must not be.",
  expired: "This offer is over already. Nobody took the time.",
  stopped: "This offer is stopped already.",
} as const;

/** Takes a time off offer. Whoever had not answered is told that it has gone; their links accept nothing more. */
export const stopOfferRound = verb(
  "diary.book",
  stopOfferRoundInput,
  async (ctx, input): Promise<OfferRoundView | null> => {
    await inTransaction(ctx, async (tx) => {
      const round = await lockRound(tx, input.roundId);
      requireReach(tx, "diary.book", round.siteId, "offer");
      // No version is compared: whatever has been answered meanwhile, the wish to stop stands.
      if (round.state !== "open") throw refused(refusal("wrong-state", ended[round.state]));
      await endRound(tx, round, { state: "stopped" });
    });
    const [view] = await readRounds(ctx, { roundId: input.roundId });
    return view ?? null;
  },
);
