import { type EmailSender, type RenderedEmail, renderEmail } from "./email";

export interface AccountMessage {
  readonly sender: EmailSender;
  readonly greetingName: string;
  readonly url: string;
  /** How long the link works, in words: "one hour". */
  readonly validFor: string;
}

export function passwordReset({ sender, greetingName, url, validFor }: AccountMessage): RenderedEmail {
  return renderEmail({
    subject: "Choose a new password",
    greeting: `Dear ${greetingName}`,
    paragraphs: [
      `Someone asked for a new password for your account at ${sender.practice}. If it was you, choose one here.`,
    ],
    action: { label: "Choose a new password", url },
    after: [
      `The link works once, for ${validFor}. If you did not ask, do nothing: your password stays as it is.`,
    ],
    from: sender,
  });
}

/** @param invitedBy the colleague who sent it, by name */
export function staffInvitation(message: AccountMessage, invitedBy: string): RenderedEmail {
  const { sender, greetingName, url, validFor } = message;
  return renderEmail({
    subject: `Your account at ${sender.practice}`,
    greeting: `Dear ${greetingName}`,
    paragraphs: [
      `${invitedBy} has made an account for you at ${sender.practice}. Choose a password to start.`,
    ],
    action: { label: "Choose a password", url },
    after: [`The link works once, for ${validFor}. If you were not expecting this, ring the practice.`],
    from: sender,
  });
}
