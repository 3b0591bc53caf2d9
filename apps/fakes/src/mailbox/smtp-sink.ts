import { SMTPServer } from "smtp-server";
import type { MailStore } from "./mail-store";

/** An answer that a real server may give, asked for by the address, so that a failure can be seen and tried. */
function failureFor(address: string): (Error & { responseCode: number }) | null {
  const name = address.split("@")[0]?.toLowerCase() ?? "";
  if (name.startsWith("refuse")) return Object.assign(new Error("No such mailbox"), { responseCode: 550 });
  if (name.startsWith("later")) return Object.assign(new Error("Mailbox busy"), { responseCode: 451 });
  return null;
}

/** Takes every mail and delivers none. Listen on the loopback address only. */
export function createSmtpSink(store: MailStore): SMTPServer {
  return new SMTPServer({
    authOptional: true,
    disabledCommands: ["STARTTLS", "AUTH"],
    banner: "Withy mailbox",
    size: 30_000_000,
    onRcptTo: (address, _session, callback) => callback(failureFor(address.address)),
    onData(stream, session, callback) {
      const chunks: Buffer[] = [];
      stream.on("data", (chunk: Buffer) => chunks.push(chunk));
      stream.on("error", (error) => callback(error));
      stream.on("end", () => {
        const to = session.envelope.rcptTo.map((recipient) => recipient.address);
        store.add(Buffer.concat(chunks).toString("latin1"), to, new Date()).then(
          () => callback(),
          (error: Error) => callback(error),
        );
      });
    },
  });
}
