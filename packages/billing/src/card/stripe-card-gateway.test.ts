import { createServer, type Server } from "node:http";
import type { AddressInfo } from "node:net";
import Stripe from "stripe";
import { afterEach, describe, expect, it } from "vitest";
import { type CardGateway, CardGatewayError } from "./card-gateway";
import { stripeCardGateway } from "./stripe-card-gateway";

const webhookSecret = "whsec_for_tests";
const event = JSON.stringify({
  id: "evt_1",
  object: "event",
  type: "checkout.session.completed",
  data: { object: { id: "cs_1", object: "checkout.session" } },
});

let server: Server | undefined;
afterEach(() => server?.close());

interface Seen {
  path: string;
  body: string;
  key: string | undefined;
}

/** Answers each call in turn with the given status and body. */
async function answering(...answers: [number, object][]): Promise<{ gateway: CardGateway; seen: Seen[] }> {
  const seen: Seen[] = [];
  server = createServer(async (req, res) => {
    let body = "";
    for await (const chunk of req) body += chunk;
    seen.push({ path: `${req.method} ${req.url}`, body, key: req.headers["idempotency-key"]?.toString() });
    const [status, answer] = answers[seen.length - 1] ?? [500, {}];
    res.writeHead(status, { "content-type": "application/json" }).end(JSON.stringify(answer));
  });
  await new Promise<void>((ready) => server?.listen(0, "127.0.0.1", ready));
  const { port } = server.address() as AddressInfo;
  const endpoint = { protocol: "http", host: "127.0.0.1", port } as const;
  return { gateway: stripeCardGateway({ secretKey: "sk_test_x", webhookSecret, endpoint }), seen };
}

const session = (more: object) => ({
  id: "cs_1",
  object: "checkout.session",
  client_reference_id: "attempt-1",
  status: "open",
  payment_status: "unpaid",
  amount_total: 18600,
  currency: "gbp",
  payment_intent: null,
  url: "http://pay.example/cs_1",
  ...more,
});

describe("cards through Stripe", () => {
  it("opens a checkout for exact pence under the attempt's own key", async () => {
    const { gateway, seen } = await answering([200, session({})]);
    const opened = await gateway.openCheckout({
      idempotencyKey: "attempt-1",
      amountPence: 18600,
      currency: "GBP",
      description: "Invoice SG-04171",
      reference: "attempt-1",
      returnUrl: "http://app.example/back",
      cancelUrl: "http://app.example/cancel",
    });
    expect(opened).toEqual({ checkoutId: "cs_1", url: "http://pay.example/cs_1" });
    const sent = new URLSearchParams(seen[0]?.body);
    expect(seen[0]).toMatchObject({ path: "POST /v1/checkout/sessions", key: "attempt-1" });
    expect(sent.get("line_items[0][price_data][unit_amount]")).toBe("18600");
    expect(sent.get("line_items[0][price_data][currency]")).toBe("gbp");
    expect(sent.get("client_reference_id")).toBe("attempt-1");
  });

  it.each([
    [{ status: "open" }, "open"],
    [{ status: "complete", payment_status: "paid", payment_intent: "pi_1" }, "paid"],
    [{ status: "complete", payment_status: "unpaid" }, "unpaid"],
    [{ status: "expired" }, "expired"],
  ])("reads a session %o as %s", async (more, status) => {
    const { gateway } = await answering([200, session(more)]);
    expect(await gateway.getCheckout("cs_1")).toMatchObject({
      status,
      amountPence: 18600,
      currency: "GBP",
      reference: "attempt-1",
    });
  });

  it("says that a checkout was paid while it was being closed", async () => {
    const paid = session({ status: "complete", payment_status: "paid", payment_intent: "pi_1" });
    const no = { error: { type: "invalid_request_error", message: "Only open sessions can expire." } };
    const { gateway } = await answering([200, session({})], [400, no], [200, paid]);
    expect(await gateway.closeCheckout("cs_1")).toMatchObject({ status: "paid", paymentRef: "pi_1" });
  });

  it.each([
    ["succeeded", "succeeded"],
    ["pending", "pending"],
    ["failed", "failed"],
    ["canceled", "failed"],
  ])("reads a refund that is %s as %s", async (status, read) => {
    const { gateway, seen } = await answering([200, { id: "re_1", object: "refund", status }]);
    const wish = { idempotencyKey: "refund-1", paymentRef: "pi_1", amountPence: 500, reference: "refund-1" };
    expect(await gateway.refund(wish)).toEqual({ refundRef: "re_1", status: read });
    expect(seen[0]?.key).toBe("refund-1");
  });

  it("tells a no from a silence", async () => {
    const no = {
      error: { type: "invalid_request_error", code: "resource_missing", message: "No such session" },
    };
    const { gateway } = await answering([404, no]);
    const refused = await gateway.getCheckout("cs_9").catch((e: unknown) => e);
    expect(refused).toBeInstanceOf(CardGatewayError);
    expect(refused).toMatchObject({ isRefused: true });
    server?.close();
    server?.closeAllConnections();
    const silent = await gateway.getCheckout("cs_9").catch((e: unknown) => e);
    expect(silent).toMatchObject({ name: "CardGatewayError", isRefused: false });
  });

  it("believes only a fresh event signed with our secret", async () => {
    const { gateway } = await answering();
    const sign = (more: object = {}) =>
      Stripe.webhooks.generateTestHeaderString({ payload: event, secret: webhookSecret, ...more });
    expect(gateway.readEvent(event, sign())).toEqual({
      eventId: "evt_1",
      kind: "checkout.session.completed",
      checkoutId: "cs_1",
    });
    expect(gateway.readEvent(event.replace("cs_1", "cs_2"), sign())).toBeNull();
    expect(gateway.readEvent(event, sign({ secret: "whsec_other" }))).toBeNull();
    expect(gateway.readEvent(event, sign({ timestamp: Math.floor(Date.now() / 1000) - 600 }))).toBeNull();
    expect(gateway.readEvent(event, "")).toBeNull();
  });
});
