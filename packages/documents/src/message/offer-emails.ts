import { proseTime } from "@withy/core/date-words";
import { timeOf } from "@withy/core/zoned-time";
import { whenWords } from "./appointment-emails";
import { type EmailSender, type RenderedEmail, renderEmail } from "./email";

export interface OfferMessage {
  readonly sender: EmailSender;
  readonly greetingName: string;
  readonly startsAt: Date;
  readonly endsAt: Date;
  readonly expiresAt: Date;
  readonly zone: string;
  readonly place: string;
  readonly phone: string;
  /** "with Nia Prosser". */
  readonly withWhom: string;
}

/** Offers a time behind a private link. It says when, where and with whom; never what for. */
export function offerMade(message: OfferMessage, url: string): RenderedEmail {
  const { startsAt, endsAt, expiresAt, zone, place, phone, withWhom } = message;
  return renderEmail({
    subject: `A time has come free: ${whenWords(startsAt, zone)}`,
    greeting: `Dear ${message.greetingName}`,
    paragraphs: [
      "You asked us to tell you of another time. One has come free. We have told a few people, and the first to accept has it.",
    ],
    facts: [
      { label: "When", value: whenWords(startsAt, zone) },
      { label: "Until", value: proseTime(timeOf(endsAt, zone)) },
      { label: "Where", value: place },
      { label: "With", value: withWhom.replace(/^with /i, "") },
    ],
    action: { label: "See the time and answer", url },
    after: [
      `Please answer by ${whenWords(expiresAt, zone)}. If it does not suit, you need not do anything: you stay on our list.`,
      `If the link does not work, ring ${phone}.`,
    ],
    from: message.sender,
  });
}

/** Tells someone who was offered a time that it has gone, so that nobody sets out for nothing. */
export function offerGone(message: OfferMessage): RenderedEmail {
  const { startsAt, zone, phone, withWhom } = message;
  return renderEmail({
    subject: `The time on ${whenWords(startsAt, zone)} has gone`,
    greeting: `Dear ${message.greetingName}`,
    paragraphs: [
      `The time that we offered you, ${whenWords(startsAt, zone)} ${withWhom}, has gone. We are sorry that it did not work out this time.`,
      "You stay on our list, in the same place, and we will write when another time comes free.",
    ],
    after: [`Your other appointments are as they were. If you have a question, ring ${phone}.`],
    from: message.sender,
  });
}
