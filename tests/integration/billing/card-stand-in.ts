import { createServer, type Server } from "node:http";
import type { AddressInfo } from "node:net";
import type { CardGateway } from "@withy/billing/card/card-gateway";
import { stripeCardGateway } from "@withy/billing/card/stripe-card-gateway";
import { isAppError } from "@withy/core/errors";
import { type CardStandIn, createCardStandIn } from "@withy/fakes/card/handle-card";
import { receiveCardEvent, setCardGateway } from "@withy/services/billing";
import type { SystemContext } from "@withy/services/context";

const secret = "whsec_for_tests";
const secretKey = "sk_test_for_tests";

export interface RunningCards {
  readonly standIn: CardStandIn;
  readonly gateway: CardGateway;
  /** Every event as it came, to be sent again in any order. */
  readonly events: { body: string; signature: string }[];
  /** While true, events are lost on the way. */
  lost: boolean;
  press(url: string, outcome: "pay" | "decline"): Promise<Response>;
  stop(): void;
}

async function listen(server: Server): Promise<number> {
  await new Promise<void>((ready) => server.listen(0, "127.0.0.1", ready));
  return (server.address() as AddressInfo).port;
}

/** The card stand-in on a port of its own, sending its events to `receiveCardEvent` over HTTP as it would in real life. */
export async function runCards(ctx: () => SystemContext): Promise<RunningCards> {
  const events: RunningCards["events"] = [];
  const app = createServer(async (req, res) => {
    let body = "";
    for await (const chunk of req) body += chunk;
    const signature = req.headers["stripe-signature"]?.toString() ?? "";
    events.push({ body, signature });
    if (cards.lost) return void res.writeHead(503).end();
    try {
      await receiveCardEvent(ctx(), body, signature);
      res.writeHead(200).end();
    } catch (error) {
      res.writeHead(isAppError(error) ? 400 : 500).end();
    }
  });
  const appPort = await listen(app);
  const target = { url: `http://127.0.0.1:${appPort}`, secret, retryAfterMs: [] };
  const standIn = createCardStandIn({ secretKey, stateFile: null, events: target });
  const server = createServer((req, res) => void standIn.handle(req, res));
  const port = await listen(server);
  const endpoint = { protocol: "http", host: "127.0.0.1", port } as const;
  const gateway = stripeCardGateway({ secretKey, webhookSecret: secret, endpoint });
  setCardGateway(gateway);
  const cards: RunningCards = {
    standIn,
    gateway,
    events,
    lost: false,
    press: (url, outcome) =>
      fetch(url, { method: "POST", redirect: "manual", body: new URLSearchParams({ outcome }) }),
    stop() {
      setCardGateway(undefined);
      for (const one of [app, server]) {
        one.close();
        one.closeAllConnections();
      }
    },
  };
  return cards;
}
