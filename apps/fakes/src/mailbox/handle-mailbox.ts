import type { IncomingMessage, ServerResponse } from "node:http";
import type { CaughtMail, MailStore } from "./mail-store";
import { listPage, mailPage } from "./mailbox-page";

const policy =
  "default-src 'none'; style-src 'unsafe-inline'; img-src 'self' data:; frame-src 'self'; form-action 'self'; base-uri 'none'";

function send(
  res: ServerResponse,
  status: number,
  type: string,
  body: string | Buffer,
  more: Record<string, string> = {},
): void {
  const headers = {
    "content-type": type,
    "content-security-policy": policy,
    "x-content-type-options": "nosniff",
    ...more,
  };
  res.writeHead(status, headers).end(body);
}

function jsonOf(mail: CaughtMail) {
  const { parsed } = mail;
  return {
    id: mail.id,
    receivedAt: mail.receivedAt.toISOString(),
    to: mail.envelopeTo,
    from: parsed.from?.text ?? "",
    replyTo: parsed.replyTo?.text ?? null,
    messageId: parsed.messageId ?? null,
    subject: parsed.subject ?? "",
    text: parsed.text ?? "",
    html: parsed.html === false ? null : parsed.html,
    attachments: parsed.attachments.map((file, index) => ({
      filename: file.filename ?? null,
      contentType: file.contentType,
      size: file.size,
      path: `/mailbox/${mail.id}/files/${index}`,
    })),
  };
}

/** A link in the mail leaves the frame: the app lets no other site frame it. */
function framed(html: string): string {
  const base = '<base target="_top">';
  return /<head[^>]*>/i.test(html)
    ? html.replace(/<head[^>]*>/i, (head) => `${head}${base}`)
    : `${base}${html}`;
}

function sendFile(res: ServerResponse, mail: CaughtMail, index: number): void {
  const file = mail.parsed.attachments[index];
  if (!file) {
    send(res, 404, "text/plain; charset=utf-8", "No such file.");
    return;
  }
  const name = encodeURIComponent(file.filename ?? `file-${index + 1}`);
  send(res, 200, file.contentType, file.content, {
    "content-disposition": `inline; filename*=UTF-8''${name}`,
    "content-security-policy":
      "default-src 'none'; style-src 'unsafe-inline'; object-src 'self'; plugin-types application/pdf",
  });
}

/**
 * Pages and JSON of the mailbox: /mailbox, /mailbox/<id>, /mailbox.json?to=<address>, DELETE /mailbox.json.
 * Answers false for paths that are not its own.
 */
export function handleMailbox(store: MailStore, req: IncomingMessage, res: ServerResponse): boolean {
  const url = new URL(req.url ?? "/", "http://localhost");
  const html = "text/html; charset=utf-8";
  if (url.pathname === "/") {
    res.writeHead(302, { location: "/mailbox" }).end();
    return true;
  }
  if (url.pathname === "/mailbox.json") {
    if (req.method === "DELETE") store.clear();
    send(
      res,
      200,
      "application/json; charset=utf-8",
      JSON.stringify(store.list(url.searchParams.get("to")).map(jsonOf)),
    );
    return true;
  }
  const match = /^\/mailbox(?:\/([0-9a-f-]{36})(?:\/(html|files)(?:\/(\d+))?)?)?$/.exec(url.pathname);
  if (!match) return false;
  const [, id, part, index] = match;
  if (id === undefined) {
    const to = url.searchParams.get("to");
    send(res, 200, html, listPage(store.list(to), to));
    return true;
  }
  const mail = store.find(id);
  if (!mail) send(res, 404, "text/plain; charset=utf-8", "No such mail. It may have been cleared away.");
  else if (part === "html")
    send(res, 200, html, framed(mail.parsed.html || ""), {
      "content-security-policy": `${policy}; sandbox allow-popups allow-top-navigation-by-user-activation`,
    });
  else if (part === "files") sendFile(res, mail, Number(index ?? -1));
  else send(res, 200, html, mailPage(mail));
  return true;
}
