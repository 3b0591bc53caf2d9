import { letterReaderInput } from "@withy/contracts/letters";
import { readDate } from "@withy/core/date-words";
import { AppError, refused } from "@withy/core/errors";
import { refusal } from "@withy/core/refusal";
import { dayOf } from "@withy/core/zoned-time";
import { recordAudit } from "../audit";
import type { SystemContext } from "../context";
import { forgetTries, spendTry, type TryLimit } from "../spend-try";
import { parse } from "../verb";
import type { LinkedLetter } from "./printed-letter";

/** A date of birth is soon guessed without it: some 30,000 days are likely. */
const tries: TryLimit = { name: "letter-link", tries: 5, minutes: 15, advice: "type the date again" };

/**
 * Asks a reader of a private link for the patient's date of birth. A date that cannot be read costs no try; a wrong
 * one costs one and nothing else.
 */
export async function checkReader(ctx: SystemContext, linked: LinkedLetter, typed: string): Promise<void> {
  const { delivery, letter, zone, bornOn } = linked;
  const { bornOn: text } = parse(letterReaderInput, { bornOn: typed });
  const date = readDate(text, dayOf(ctx.clock.now(), zone), { past: true });
  if (date === null) {
    const message = "That is not a date yet. Enter day, month and year, such as 27 3 1958.";
    throw new AppError("invalid", message, { fields: [{ field: "bornOn", message }] });
  }
  await spendTry(ctx, tries, delivery.id);
  if (date !== bornOn) {
    await recordAudit(
      { ...ctx, practiceId: delivery.practiceId },
      {
        action: "letter.refused",
        subjectKind: "letter",
        subjectId: letter.id,
        patientId: letter.patientId,
        detail: { deliveryId: delivery.id },
      },
    );
    throw refused(
      refusal(
        "wrong-date",
        "This letter is about someone born on another day. Check the date of birth and type it again.",
        "bornOn",
      ),
    );
  }
  await forgetTries(ctx, tries, delivery.id);
}
