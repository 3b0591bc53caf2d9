export interface CaughtMail {
  readonly id: string;
  readonly to: readonly string[];
  readonly subject: string;
  readonly text: string;
  readonly attachments: readonly {
    readonly filename: string | null;
    readonly contentType: string;
    readonly path: string;
  }[];
}

const address = process.env.WITHY_E2E_MAILBOX ?? "http://localhost:3100";

/** Waits for a message to this address whose subject fits: the worker sends a moment after the deed. */
export async function waitForMail(to: string, subject: RegExp, patience = 20_000): Promise<CaughtMail> {
  const until = Date.now() + patience;
  while (Date.now() < until) {
    const answer = await fetch(`${address}/mailbox.json?to=${encodeURIComponent(to)}`);
    const mails = (await answer.json()) as CaughtMail[];
    const found = mails.find((mail) => subject.test(mail.subject));
    if (found) return found;
    await new Promise((resolve) => setTimeout(resolve, 250));
  }
  throw new Error(`No message to ${to} with a subject like ${subject} within ${patience / 1000} seconds.`);
}

/** The text of an attachment, for example a calendar file. */
export async function readAttachment(path: string): Promise<string> {
  return (await fetch(`${address}${path}`)).text();
}
