import { listOfferMatchesInput, type OfferMatch, type OfferMatchesView } from "@withy/contracts/diary";
import { dayOf, minutesBetween, timeOf } from "@withy/core/zoned-time";
import { offerRounds } from "@withy/db/schema";
import { rankWaiting, whyNoMatch } from "@withy/diary/waiting-match";
import { and, eq } from "drizzle-orm";
import type { Context } from "../context";
import { verb } from "../verb";
import { type OfferableTime, readFreedTime } from "./freed-time";
import { readOfferSettings } from "./offer-settings";
import { type Candidate, readWaiting } from "./read-waiting";

/** More than these are not read by anyone. */
const othersShown = 50;

const wantsOther: Record<Candidate["preferredChannel"], string | null> = {
  email: null,
  text: "Would rather have a text. No text service is set up, so the offer goes by e-mail.",
  phone: "Would rather be rung. The offer goes by e-mail.",
  post: "Would rather have post. The offer goes by e-mail.",
};

function matchOf(candidate: Candidate, reasons: readonly string[]): OfferMatch {
  const { entryId, patientId, patientName, phone, email, serviceId, service, deskNote } = candidate;
  const canReceive = email !== null && email !== "";
  const caveat = canReceive
    ? wantsOther[candidate.preferredChannel]
    : "No e-mail address, so ring them to offer it.";
  const { name: serviceName, durationMinutes } = service;
  return {
    entryId,
    patientId,
    patientName,
    phone,
    serviceId,
    serviceName,
    durationMinutes,
    reasons,
    deskNote,
    canReceive,
    caveat,
  };
}

/** The round in which this very time is on offer. */
export async function findOpenRound(ctx: Context, time: OfferableTime): Promise<string | null> {
  const [row] = await ctx.db
    .select({ id: offerRounds.id })
    .from(offerRounds)
    .where(
      and(
        eq(offerRounds.practiceId, ctx.practiceId),
        eq(offerRounds.state, "open"),
        eq(offerRounds.therapistId, time.therapist.id),
        eq(offerRounds.startsAt, time.startsAt),
      ),
    )
    .limit(1);
  return row?.id ?? null;
}

/** Whom a freed time suits, best first with the reasons; and why it does not suit the others. */
export const listOfferMatches = verb(
  "diary.book",
  listOfferMatchesInput,
  async (ctx, input): Promise<OfferMatchesView> => {
    const time = await readFreedTime(ctx, input);
    const now = ctx.clock.now();
    const people = await readWaiting(ctx, time);
    const known = new Map(people.map((one) => [one.entryId, one]));
    const matches = rankWaiting(time, people, now).flatMap(({ entryId, reasons }) => {
      const one = known.get(entryId);
      return one ? [matchOf(one, reasons)] : [];
    });
    const others = people.flatMap((one) => {
      const whyNot = whyNoMatch(time, one, now);
      return whyNot === null ? [] : [{ entryId: one.entryId, patientName: one.patientName, whyNot }];
    });
    return {
      siteId: time.site.id,
      siteName: time.site.name,
      therapistId: time.therapist.id,
      therapistName: time.therapist.name,
      startsAt: time.startsAt.toISOString(),
      day: dayOf(time.startsAt, time.zone),
      startTime: timeOf(time.startsAt, time.zone),
      freeUntilTime: timeOf(time.until, time.zone),
      freeMinutes: minutesBetween(time.startsAt, time.until),
      ...(await readOfferSettings(ctx)),
      openRoundId: await findOpenRound(ctx, time),
      matches,
      others: others.slice(0, othersShown),
    };
  },
);
