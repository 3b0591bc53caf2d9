import { type OfferAnswer, type OfferLinkView, offerTokenField } from "@withy/contracts/diary";
import { longDate, proseTime } from "@withy/core/date-words";
import { isAppError, notFound, refuseIf } from "@withy/core/errors";
import { formatPhone } from "@withy/core/identifiers/phone";
import { dayOf, timeOf } from "@withy/core/zoned-time";
import { checkAnswer } from "@withy/diary/offer-standing";
import type { SystemContext } from "../context";
import { hashSecretToken } from "../secret-token";
import { spendTry, type TryLimit } from "../spend-try";
import { inTransaction } from "../transaction";
import { acceptOffer, declineOffer } from "./answer-offer";
import { findLinkedOffer, givenUpBy, type LinkedOffer, standingOf } from "./offer-facts";
import { lockRound } from "./offer-round";
import { utc } from "./raw-rows";
import { placeOf } from "./send-offer-message";

/** Nobody answers this often by hand. */
const tries: TryLimit = { name: "offer-link", tries: 20, minutes: 15, advice: "answer again" };

async function findByToken(ctx: SystemContext, token: string): Promise<LinkedOffer> {
  const offer = offerTokenField.safeParse(token).success
    ? await findLinkedOffer(ctx, hashSecretToken(token))
    : null;
  if (!offer) throw notFound("offer");
  return offer;
}

const whenWords = (at: Date, zone: string): string =>
  `${longDate(dayOf(at, zone))} at ${proseTime(timeOf(at, zone))}`;

/** What the private page of an offer says. It writes nothing: mail scanners open links too. @throws not-found */
export async function getOfferLink(ctx: SystemContext, token: string): Promise<OfferLinkView> {
  const offer = await findByToken(ctx, token);
  const { zone } = offer;
  const startsAt = new Date(utc(offer.starts_at));
  const endsAt = new Date(startsAt.getTime() + offer.duration_minutes * 60_000);
  const givesUp = givenUpBy(offer, ctx.clock.now()) !== null && offer.instead_of_at !== null;
  return {
    standing: await standingOf(ctx, offer),
    practice: offer.practice,
    phone: formatPhone(offer.phone),
    greetingName: offer.greeting,
    dayWords: longDate(dayOf(startsAt, zone)),
    startWords: proseTime(timeOf(startsAt, zone)),
    endWords: proseTime(timeOf(endsAt, zone)),
    place: placeOf(offer),
    therapistName: offer.therapist,
    expiresWords: whenWords(new Date(utc(offer.expires_at)), zone),
    insteadOfWords: givesUp ? whenWords(new Date(utc(offer.instead_of_at ?? "")), zone) : null,
  };
}

/**
 * Answers an offer, once. Everything is looked at again once the round is held, so that of many acceptances at the
 * same moment the first one has the time and each of the others is told.
 * @throws not-found; refused `offer-…` with nothing changed
 */
export async function answerOffer(ctx: SystemContext, token: string, answer: OfferAnswer): Promise<void> {
  const { id, practice_id: practiceId, round_id: roundId } = await findByToken(ctx, token);
  await spendTry(ctx, tries, id);
  try {
    await inTransaction({ ...ctx, practiceId }, async (tx) => {
      const round = await lockRound(tx, roundId);
      const offer = await findByToken(tx, token);
      refuseIf(checkAnswer(await standingOf(tx, offer)));
      if (answer === "accept") await acceptOffer(tx, round, offer);
      else await declineOffer(tx, round, offer);
    });
  } catch (error) {
    // Whatever rule or claim stood in the way, for the patient the time has gone.
    const isTaken = isAppError(error) && !error.kind.startsWith("offer-") && error.code !== "not-found";
    if (isTaken) refuseIf(checkAnswer("gone"));
    throw error;
  }
}
