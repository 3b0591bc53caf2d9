import { type EmailSender, type RenderedEmail, renderEmail } from "./email";

export interface LetterMessage {
  readonly sender: EmailSender;
  readonly recipientName: string;
  /** Printed on the letter, so that a call about it needs no name. */
  readonly reference: string;
  readonly url: string;
  /** "30 days". */
  readonly validFor: string;
}

/**
 * Tells that a letter waits behind a private link. It names no patient and nothing clinical: an e-mail may be read
 * on the way, or by whoever shares the mailbox.
 */
export function letterWaiting({
  sender,
  recipientName,
  reference,
  url,
  validFor,
}: LetterMessage): RenderedEmail {
  return renderEmail({
    subject: `A letter from ${sender.practice}, reference ${reference}`,
    greeting: `Dear ${recipientName}`,
    paragraphs: [
      "We have written to you about someone whom we share the care of. The letter is on a private page, which asks for that person's date of birth.",
    ],
    action: { label: "Read the letter", url },
    after: [
      `The page stays open for ${validFor}; please file the letter before then. If the link does not work, or you cannot tell whom it is about, ring us and give the reference ${reference}.`,
    ],
    from: sender,
  });
}
