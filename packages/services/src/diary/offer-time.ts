import { offerTimeInput } from "@withy/contracts/diary";
import { notFound, refused } from "@withy/core/errors";
import { newId } from "@withy/core/ids";
import { refusal } from "@withy/core/refusal";
import { appointments, offerRounds, staffMembers, waitingEntries, waitingOffers } from "@withy/db/schema";
import { whyNoMatch } from "@withy/diary/waiting-match";
import type { z } from "zod";
import { recordAudit } from "../audit";
import type { Context } from "../context";
import { loadRecord } from "../load-record";
import { once } from "../once";
import { hashSecretToken, newSecretToken } from "../secret-token";
import { verb } from "../verb";
import { type OfferableTime, readFreedTime } from "./freed-time";
import { findOpenRound } from "./list-offer-matches";
import { type Candidate, readWaiting } from "./read-waiting";
import { sendOffers } from "./send-offer-message";

type Input = z.output<typeof offerTimeInput>;

/** Takes the chosen entries, in one order for everyone, and asks the rule again: the list may be minutes old. */
async function takeCandidates(
  tx: Context,
  time: OfferableTime,
  entryIds: readonly string[],
): Promise<Candidate[]> {
  for (const id of [...new Set(entryIds)].sort())
    await loadRecord(tx, waitingEntries, id, "waiting entry", { lock: true });
  const found = new Map((await readWaiting(tx, time, entryIds)).map((one) => [one.entryId, one]));
  return [...new Set(entryIds)].map((id) => {
    const one = found.get(id);
    const whyNot = one ? whyNoMatch(time, one, tx.clock.now()) : "No longer waits";
    if (!one || whyNot !== null)
      throw refused(
        refusal(
          "no-match",
          `${one?.patientName ?? "Someone chosen"} cannot be offered this: ${whyNot?.toLowerCase()}. Look at the list again.`,
          "entryIds",
        ),
      );
    if (one.email) return one;
    const message = `${one.patientName} has no e-mail address. Ring them, or leave them out.`;
    throw refused(refusal("no-address", message, "entryIds"));
  });
}

async function requireFreedBy(tx: Context, id: string | null): Promise<void> {
  if (id !== null) await loadRecord(tx, appointments, id, "appointment");
}

/** An answer is no use once the visit should have begun. */
function expiryOf(tx: Context, time: OfferableTime, minutes: number): Date {
  return new Date(Math.min(tx.clock.now().getTime() + minutes * 60_000, time.startsAt.getTime()));
}

async function writeRound(tx: Context, input: Input, time: OfferableTime) {
  const round = {
    ...{ practiceId: tx.practiceId, id: newId(), siteId: time.site.id, therapistId: time.therapist.id },
    ...{ roomId: null, startsAt: time.startsAt, endsAt: time.until, state: "open" as const, version: 1 },
    ...{ expiresAt: expiryOf(tx, time, input.minutes), freedById: input.freedById, appointmentId: null },
    ...{ createdAt: tx.clock.now(), createdBy: tx.staffMemberId },
  };
  await tx.db.insert(offerRounds).values(round);
  return round;
}

/** Offers a time to the chosen people at once, each behind a link of their own. */
export const offerTime = verb(
  "diary.book",
  offerTimeInput,
  async (ctx, input): Promise<{ roundId: string }> =>
    once(ctx, "offer.make", async (tx) => {
      const time = await readFreedTime(tx, input);
      // The therapist's row is held, so that two desks cannot put one time on offer twice.
      await loadRecord(tx, staffMembers, time.therapist.id, "therapist", { lock: true });
      const openRoundId = await findOpenRound(tx, time);
      if (openRoundId)
        throw refused(refusal("on-offer", "This time is on offer already. Look at who was asked."), {
          roundId: openRoundId,
        });
      await requireFreedBy(tx, input.freedById);
      const people = await takeCandidates(tx, time, input.entryIds);
      if (people.length === 0) throw notFound("waiting entry");
      const round = await writeRound(tx, input, time);
      const { practiceId } = tx;
      const made = people.map(({ entryId }, i) => {
        const offer = { practiceId, id: newId(), roundId: round.id, entryId, rank: i + 1 };
        return { ...offer, token: newSecretToken() };
      });
      const createdAt = tx.clock.now();
      await tx.db
        .insert(waitingOffers)
        .values(
          made.map(({ token, ...offer }) => ({ ...offer, tokenHash: hashSecretToken(token), createdAt })),
        );
      await sendOffers(tx, round, made);
      await recordAudit(tx, {
        action: "offer-round.made",
        subjectKind: "offer-round",
        subjectId: round.id,
        siteId: round.siteId,
        detail: { startsAt: round.startsAt.toISOString(), offers: made.map((o) => o.entryId) },
      });
      return { roundId: round.id };
    }),
);
