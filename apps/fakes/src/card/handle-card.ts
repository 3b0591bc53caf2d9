import type { IncomingMessage, ServerResponse } from "node:http";
import { join } from "node:path";
import { type ApiRequest, answerApi, paySession } from "./card-api";
import { payPage, sessionsPage } from "./card-page";
import { type CardStore, openCardStore } from "./card-store";
import { type EventTarget, sendEvent } from "./send-event";

export interface CardStandIn {
  readonly store: CardStore;
  /** True where the path was the card stand-in's own and has been answered. */
  handle(req: IncomingMessage, res: ServerResponse): Promise<boolean>;
}

export interface CardStandInSettings {
  readonly secretKey: string;
  readonly events: EventTarget;
  /** Null: nothing is kept when the process ends. */
  readonly stateFile: string | null;
}

async function readBody(req: IncomingMessage): Promise<string> {
  let body = "";
  for await (const chunk of req) {
    body += chunk;
    if (body.length > 100_000) throw new Error("Request too large.");
  }
  return body;
}

function sendHtml(res: ServerResponse, status: number, html: string): void {
  const policy =
    "default-src 'none'; style-src 'unsafe-inline'; form-action http: https:; frame-ancestors 'none'";
  res
    .writeHead(status, { "content-type": "text/html; charset=utf-8", "content-security-policy": policy })
    .end(html);
}

/** A local stand-in for the card company: its interface, its payment page and its signed events. */
export function createCardStandIn(settings: CardStandInSettings): CardStandIn {
  const store = openCardStore(settings.stateFile);

  async function api(req: IncomingMessage, res: ServerResponse, path: string): Promise<void> {
    if (req.headers.authorization !== `Bearer ${settings.secretKey}`) {
      res.writeHead(401, { "content-type": "application/json" });
      res.end(JSON.stringify({ error: { type: "invalid_request_error", message: "Invalid API key." } }));
      return;
    }
    const request: ApiRequest = {
      method: req.method ?? "GET",
      path,
      form: new URLSearchParams(await readBody(req)),
      idempotencyKey: req.headers["idempotency-key"]?.toString() ?? null,
      origin: `http://${req.headers.host ?? "localhost"}`,
    };
    const answer = answerApi(store, request);
    const replay = answer.isReplay ? { "idempotent-replayed": "true" } : {};
    res.writeHead(answer.status, { "content-type": "application/json", ...replay });
    res.end(JSON.stringify(answer.body));
    if (answer.closed) await sendEvent(settings.events, "checkout.session.expired", answer.closed);
  }

  async function pay(req: IncomingMessage, res: ServerResponse, id: string): Promise<void> {
    const session = store.state.sessions[id];
    if (!session) return sendHtml(res, 404, "<p>No such payment page.</p>");
    if (req.method !== "POST" || session.status !== "open") return sendHtml(res, 200, payPage(session));
    const outcome = new URLSearchParams(await readBody(req)).get("outcome");
    if (outcome !== "pay") {
      session.declines += 1;
      store.save();
      return sendHtml(res, 200, payPage(session));
    }
    paySession(store, session);
    await sendEvent(settings.events, "checkout.session.completed", session);
    res.writeHead(303, { location: session.successUrl.replace("{CHECKOUT_SESSION_ID}", session.id) }).end();
  }

  return {
    store,
    async handle(req, res) {
      const { pathname } = new URL(req.url ?? "/", "http://localhost");
      if (pathname.startsWith("/v1/")) await api(req, res, pathname);
      else if (pathname.startsWith("/card/pay/")) await pay(req, res, pathname.slice("/card/pay/".length));
      else if (pathname === "/card") {
        const sessions = Object.values(store.state.sessions).sort((a, b) => b.createdAt - a.createdAt);
        sendHtml(res, 200, sessionsPage(sessions));
      } else return false;
      return true;
    },
  };
}

let standIn: CardStandIn | undefined;

function fromEnvironment(): CardStandIn {
  const env = process.env;
  const dataDir = env.WITHY_DATA_DIR;
  const port = env.WITHY_PORT ?? "3000";
  return createCardStandIn({
    secretKey: env.WITHY_CARD_KEY ?? "",
    stateFile: dataDir === undefined ? null : join(dataDir, "card-stand-in.json"),
    events: {
      url: env.WITHY_CARD_WEBHOOK_URL ?? `http://127.0.0.1:${port}/api/billing/card-events`,
      secret: env.WITHY_CARD_WEBHOOK_SECRET ?? "",
      retryAfterMs: [1_000, 5_000, 30_000, 120_000, 600_000],
    },
  });
}

/** The card stand-in as the environment sets it up; answers false for paths that are not its own. */
export async function handleCard(req: IncomingMessage, res: ServerResponse): Promise<boolean> {
  standIn ??= fromEnvironment();
  return standIn.handle(req, res);
}
