import { createServer, type IncomingMessage, type ServerResponse } from "node:http";
import type { Server } from "node:net";
import { join } from "node:path";
import { handleCard } from "./card/handle-card";
import type { FakesEnv } from "./env";
import { handleMailbox } from "./mailbox/handle-mailbox";
import { MailStore } from "./mailbox/mail-store";
import { createSmtpSink } from "./mailbox/smtp-sink";

const loopback = "127.0.0.1";

function portOf(server: Server): number {
  const address = server.address();
  return typeof address === "object" && address !== null ? address.port : 0;
}

export interface Fakes {
  readonly store: MailStore;
  /** The ports in use: those asked for, or free ones where 0 was asked. */
  readonly httpPort: number;
  readonly smtpPort: number;
  close(): Promise<void>;
}

async function answer(store: MailStore, req: IncomingMessage, res: ServerResponse): Promise<void> {
  try {
    if (handleMailbox(store, req, res)) return;
    if (await handleCard(req, res)) return;
    res
      .writeHead(404, { "content-type": "text/plain; charset=utf-8" })
      .end("Nothing here. Try /mailbox or /card.");
  } catch (error) {
    console.error("stand-in failed", error instanceof Error ? error.message : "unknown");
    if (!res.headersSent) res.writeHead(500, { "content-type": "text/plain; charset=utf-8" });
    res.end("The stand-in could not answer. Look at its log.");
  }
}

/** One HTTP server for the mailbox page and the card stand-in, and one SMTP server, both on loopback. */
export async function startFakes(env: FakesEnv): Promise<Fakes> {
  const store = new MailStore(env.dataDir === null ? null : join(env.dataDir, "mailbox"));
  await store.load();
  const smtp = createSmtpSink(store);
  smtp.on("error", (error) => console.error("mail sink:", error.message));
  const http = createServer((req, res) => void answer(store, req, res));
  await new Promise<void>((resolve, reject) => {
    smtp.server.once("error", reject);
    smtp.listen(env.smtpPort, loopback, () => resolve());
  });
  await new Promise<void>((resolve, reject) => {
    http.once("error", reject);
    http.listen(env.httpPort, loopback, () => resolve());
  });
  const close = async () => {
    http.closeAllConnections();
    await Promise.all([
      new Promise<void>((resolve) => http.close(() => resolve())),
      new Promise<void>((resolve) => smtp.close(() => resolve())),
    ]);
  };
  return { store, httpPort: portOf(http), smtpPort: portOf(smtp.server), close };
}
