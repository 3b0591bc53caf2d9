import { offerMessagePayload } from "@withy/contracts/messaging";
import { offerRounds, waitingOffers } from "@withy/db/schema";
import { offerGone, offerMade } from "@withy/documents/message/offer-emails";
import { findRecord } from "../load-record";
import { linkTo, type Renderer } from "./message-renderer";
import { loadSender } from "./message-sender";

/** An offer goes out only while it can be taken, and the note that it has gone only to whoever did not get it. */
export const renderOfferMessage: Renderer = async (ctx, row, office) => {
  const { path, startsAt, endsAt, expiresAt, ...payload } = offerMessagePayload.parse(row.payload);
  const inside = { db: ctx.db, practiceId: row.practiceId };
  const offer = await findRecord(inside, waitingOffers, payload.offerId);
  const round = offer && (await findRecord(inside, offerRounds, offer.roundId));
  if (!round || !offer) return null;
  const message = {
    ...payload,
    ...{ startsAt: new Date(startsAt), endsAt: new Date(endsAt), expiresAt: new Date(expiresAt) },
    sender: await loadSender(ctx, row.practiceId),
  };
  const now = ctx.clock.now();
  if (row.template === "offer-made") {
    const isOpen = offer.state === "open" && round.state === "open" && round.expiresAt > now;
    return isOpen && path !== null ? offerMade(message, linkTo(office, path)) : null;
  }
  const isGone = (offer.state === "lost" || offer.state === "stopped") && round.startsAt > now;
  return isGone ? offerGone(message) : null;
};
