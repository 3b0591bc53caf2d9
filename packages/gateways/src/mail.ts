import { createTransport } from "nodemailer";

export interface OutgoingMail {
  /** The outbox row's id: the same row sent twice carries the same Message-ID, which a receiver may drop. */
  readonly id: string;
  readonly from: { readonly name: string; readonly address: string };
  readonly replyTo: string | null;
  readonly to: string;
  readonly subject: string;
  readonly text: string;
  readonly html: string;
  readonly attachments: readonly { filename: string; contentType: string; content: string | Buffer }[];
  readonly calendar?: {
    readonly method: "REQUEST" | "CANCEL";
    readonly filename: string;
    readonly content: string;
  };
}

/** `reason` is a code without names or addresses, fit for the outbox row and the log. */
export type MailResult =
  | { readonly outcome: "sent"; readonly messageId: string }
  | { readonly outcome: "try-later"; readonly reason: string }
  | { readonly outcome: "refused"; readonly reason: string };

export interface MailGateway {
  send(mail: OutgoingMail): Promise<MailResult>;
  close(): void;
}

export interface MailSettings {
  readonly host: string;
  readonly port: number;
  /** "none" only for the stand-in on this machine; otherwise a server that offers no encryption is refused. */
  readonly encryption: "none" | "starttls" | "tls";
  readonly user?: string;
  readonly password?: string;
}

export function messageIdOf(id: string, fromAddress: string): string {
  return `<${id}@${fromAddress.split("@").at(-1) ?? "localhost"}>`;
}

interface SmtpFailure {
  readonly code?: string;
  readonly command?: string;
  readonly responseCode?: number;
}

/** The commands that speak of this one message; a "no" to any other speaks of the server or of our account. */
const aboutThisMessage = new Set(["MAIL FROM", "RCPT TO", "DATA"]);

/**
 * A 5xx answer to the message itself is final; every other failure is worth another try (RFC 5321, 4.2.1:
 * 4yz transient, 5yz permanent).
 */
export function readFailure(error: unknown): MailResult {
  const failure: SmtpFailure = typeof error === "object" && error !== null ? error : {};
  const { responseCode, command = "", code = "unknown" } = failure;
  // 503 says that the conversation went wrong, not that the message was refused.
  const isFinal = responseCode !== undefined && responseCode >= 500 && responseCode !== 503;
  if (isFinal && aboutThisMessage.has(command)) {
    return { outcome: "refused", reason: `smtp-${responseCode}` };
  }
  // Nodemailer's own refusal of an address that no server would take.
  if (code === "EENVELOPE" && responseCode === undefined)
    return { outcome: "refused", reason: "bad-address" };
  return {
    outcome: "try-later",
    reason: responseCode === undefined ? code.toLowerCase() : `smtp-${responseCode}`,
  };
}

export function openMail(settings: MailSettings): MailGateway {
  const transport = createTransport({
    host: settings.host,
    port: settings.port,
    secure: settings.encryption === "tls",
    ignoreTLS: settings.encryption === "none",
    requireTLS: settings.encryption === "starttls",
    connectionTimeout: 10_000,
    greetingTimeout: 10_000,
    socketTimeout: 30_000,
    disableFileAccess: true,
    disableUrlAccess: true,
    ...(settings.user === undefined ? {} : { auth: { user: settings.user, pass: settings.password ?? "" } }),
  });
  return {
    async send(mail) {
      const messageId = messageIdOf(mail.id, mail.from.address);
      try {
        await transport.sendMail({
          messageId,
          from: mail.from,
          to: { name: "", address: mail.to },
          ...(mail.replyTo ? { replyTo: mail.replyTo } : {}),
          subject: mail.subject,
          text: mail.text,
          html: mail.html,
          attachments: mail.attachments.map((attachment) => ({ ...attachment })),
          ...(mail.calendar ? { icalEvent: { ...mail.calendar } } : {}),
          headers: { "Auto-Submitted": "auto-generated" },
        });
        return { outcome: "sent", messageId };
      } catch (error) {
        return readFailure(error);
      }
    },
    close: () => transport.close(),
  };
}
