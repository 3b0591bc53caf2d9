import { type LetterView, sendLetterInput } from "@withy/contracts/letters";
import { refuseIf } from "@withy/core/errors";
import { newId } from "@withy/core/ids";
import { dayOf } from "@withy/core/zoned-time";
import { letterDeliveries, patients } from "@withy/db/schema";
import { checkSend } from "@withy/documents/letter/check-letter";
import { loadSite } from "../clinical/episode-records";
import type { Context } from "../context";
import { loadRecord } from "../load-record";
import { enqueueMessage } from "../messaging";
import { once } from "../once";
import { isConsentWithdrawn } from "../patients/is-consent-withdrawn";
import { newSecretToken } from "../secret-token";
import { verb } from "../verb";
import { auditLetter } from "./letter-audit";
import { type LetterAtHand, loadLetter, recipientOf } from "./letter-records";
import { hashLetterToken, linkDays } from "./letter-token";
import { letterView } from "./letter-view";

type Reader = {
  name: string;
  email: string | null;
  address: string;
  whose: string;
  consent: "letter-to-gp" | "email";
};

async function readerOf(
  ctx: Context,
  { letter }: LetterAtHand,
  to: "recipient" | "patient",
): Promise<Reader> {
  if (to === "recipient") {
    const { name, email, addressLines } = recipientOf(letter);
    return { name, email, address: addressLines.join(", "), whose: name, consent: "letter-to-gp" };
  }
  const patient = await loadRecord(ctx, patients, letter.patientId, "patient");
  const address = [...patient.addressLines, patient.postcode ?? ""].filter((line) => line !== "").join(", ");
  const name = `${patient.givenName} ${patient.familyName}`;
  return { name, email: patient.email, address, whose: "the patient", consent: "email" };
}

async function sendByEmail(
  ctx: Context,
  at: LetterAtHand,
  reader: Reader & { email: string },
  deliveryId: string,
) {
  const token = newSecretToken();
  const outboxMessageId = await enqueueMessage(ctx, {
    template: "letter-waiting",
    toAddress: reader.email,
    payload: {
      deliveryId,
      recipientName: reader.name,
      reference: at.letter.reference,
      path: `/link/${token}/letter`,
      validFor: `${linkDays} days`,
    },
    aboutKind: "letter",
    aboutId: at.letter.id,
    patientId: at.letter.patientId,
    dedupeKey: `letter:${deliveryId}`,
  });
  const expiresAt = new Date(ctx.clock.now().getTime() + linkDays * 24 * 60 * 60_000);
  return { outboxMessageId, tokenHash: hashLetterToken(token), expiresAt, toAddress: reader.email };
}

/**
 * Sends a signed letter. By e-mail goes a private link and never the letter itself, so that nothing clinical lies in
 * a mailbox or on the way; "print" notes that it was printed and posted.
 */
export const sendLetter = verb(
  "letters.send",
  sendLetterInput,
  async (ctx, input): Promise<LetterView> =>
    once(ctx, "letter.send", async (tx) => {
      const at = await loadLetter(tx, "letters.send", input.letterId);
      const { letter, episode } = at;
      const reader = await readerOf(tx, at, input.to);
      // Post and hand are always open to the patient: it is their letter.
      const asksConsent = input.to === "recipient" || input.channel === "email";
      const isRefusedByPatient =
        asksConsent && (await isConsentWithdrawn(tx, letter.patientId, reader.consent));
      const email = input.email ?? reader.email;
      refuseIf(
        checkSend({
          state: letter.state,
          channel: input.channel,
          address: email,
          whose: reader.whose,
          isRefusedByPatient,
        }),
      );
      const { zone } = await loadSite(tx, episode.siteId);
      const id = newId();
      const way =
        input.channel === "email" && email !== null
          ? await sendByEmail(tx, at, { ...reader, email }, id)
          : { toAddress: reader.address.slice(0, 254), postedOn: dayOf(tx.clock.now(), zone) };
      await tx.db.insert(letterDeliveries).values({
        practiceId: tx.practiceId,
        id,
        letterId: letter.id,
        channel: input.channel,
        toName: reader.name,
        requestedBy: tx.staffMemberId,
        requestedAt: tx.clock.now(),
        ...way,
      });
      await auditLetter(tx, "sent", at, { channel: input.channel, to: input.to, deliveryId: id });
      return letterView(tx, at);
    }),
);
