import { mkdtempSync, rmSync } from "node:fs";
import { createServer, type RequestListener, type Server } from "node:http";
import type { AddressInfo } from "node:net";
import { tmpdir } from "node:os";
import { join } from "node:path";
import Stripe from "stripe";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { type CardStandIn, createCardStandIn } from "./handle-card";

const secret = "whsec_for_tests";
const secretKey = "sk_test_for_tests";
const folder = mkdtempSync(join(tmpdir(), "withy-card-"));
const servers: Server[] = [];

async function listen(listener: RequestListener): Promise<number> {
  const server = createServer(listener);
  servers.push(server);
  await new Promise<void>((ready) => server.listen(0, "127.0.0.1", ready));
  return (server.address() as AddressInfo).port;
}

let events: { type: string; id: string; sessionId: string }[];
let appAnswers: number[];
let standIn: CardStandIn;
let stripe: Stripe;
let base: string;
let stateFile: string;

async function start(): Promise<void> {
  const appPort = await listen(async (req, res) => {
    let body = "";
    for await (const chunk of req) body += chunk;
    const status = appAnswers.shift() ?? 200;
    if (status === 200) {
      const event = stripe.webhooks.constructEvent(body, req.headers["stripe-signature"] ?? "", secret);
      events.push({ type: event.type, id: event.id, sessionId: (event.data.object as { id: string }).id });
    }
    res.writeHead(status).end();
  });
  const target = { url: `http://127.0.0.1:${appPort}/events`, secret, retryAfterMs: [5, 5] };
  standIn = createCardStandIn({ secretKey, stateFile, events: target });
  const port = await listen(async (req, res) => {
    if (!(await standIn.handle(req, res))) res.writeHead(404).end();
  });
  base = `http://127.0.0.1:${port}`;
  stripe = new Stripe(secretKey, {
    protocol: "http",
    host: "127.0.0.1",
    port,
    telemetry: false,
    maxNetworkRetries: 0,
  });
}

beforeEach(async () => {
  events = [];
  appAnswers = [];
  stateFile = join(folder, `${crypto.randomUUID()}.json`);
  await start();
});

afterEach(() => {
  for (const server of servers.splice(0)) {
    server.close();
    server.closeAllConnections();
  }
  rmSync(stateFile, { force: true });
});

const wish = (unit_amount = 18600): Stripe.Checkout.SessionCreateParams => ({
  mode: "payment",
  line_items: [
    {
      quantity: 1,
      price_data: { currency: "gbp", unit_amount, product_data: { name: "Invoice <SG-04171>" } },
    },
  ],
  client_reference_id: "attempt-1",
  success_url: "http://app.example/back?session={CHECKOUT_SESSION_ID}",
  cancel_url: "http://app.example/invoice",
});

const press = (id: string, outcome: "pay" | "decline") =>
  fetch(`${base}/card/pay/${id}`, {
    method: "POST",
    redirect: "manual",
    body: new URLSearchParams({ outcome }),
  });

describe("card stand-in", () => {
  it("takes a payment on its page, tells the app, and sends the payer back", async () => {
    const session = await stripe.checkout.sessions.create(wish());
    const page = await (await fetch(session.url ?? "")).text();
    expect(page).toContain("Invoice &lt;SG-04171&gt;");
    expect(page).toContain("£186.00");
    const back = await press(session.id, "pay");
    expect(back.status).toBe(303);
    expect(back.headers.get("location")).toBe(`http://app.example/back?session=${session.id}`);
    expect(events).toMatchObject([{ type: "checkout.session.completed", sessionId: session.id }]);
    const paid = await stripe.checkout.sessions.retrieve(session.id);
    expect(paid).toMatchObject({
      status: "complete",
      payment_status: "paid",
      amount_total: 18600,
      client_reference_id: "attempt-1",
    });
    const intent = await stripe.paymentIntents.retrieve(paid.payment_intent as string);
    expect(intent).toMatchObject({ status: "succeeded", amount_received: 18600 });
  });

  it("lets a declined payer try again", async () => {
    const session = await stripe.checkout.sessions.create(wish());
    expect(await (await press(session.id, "decline")).text()).toContain("declined");
    expect(events).toEqual([]);
    expect((await press(session.id, "pay")).status).toBe(303);
  });

  it("takes no second payment for a session", async () => {
    const session = await stripe.checkout.sessions.create(wish());
    await press(session.id, "pay");
    const again = await press(session.id, "pay");
    expect(again.status).toBe(200);
    expect(await again.text()).toContain("This payment is done.");
    expect(Object.keys(standIn.store.state.intents)).toHaveLength(1);
  });

  it("answers a repeated key with the first answer, and refuses it for another wish", async () => {
    const first = await stripe.checkout.sessions.create(wish(), { idempotencyKey: "k1" });
    const second = await stripe.checkout.sessions.create(wish(), { idempotencyKey: "k1" });
    expect(second.id).toBe(first.id);
    await expect(stripe.checkout.sessions.create(wish(500), { idempotencyKey: "k1" })).rejects.toThrow(
      /other parameters/,
    );
  });

  it("gives back no more than was paid", async () => {
    const session = await stripe.checkout.sessions.create(wish(10000));
    await press(session.id, "pay");
    const payment_intent = standIn.store.state.sessions[session.id]?.paymentIntentId ?? "";
    const part = await stripe.refunds.create({ payment_intent, amount: 4000 }, { idempotencyKey: "r1" });
    const repeat = await stripe.refunds.create({ payment_intent, amount: 4000 }, { idempotencyKey: "r1" });
    expect(repeat.id).toBe(part.id);
    await expect(stripe.refunds.create({ payment_intent, amount: 6001 })).rejects.toThrow(/greater than/);
    expect(await stripe.refunds.create({ payment_intent })).toMatchObject({
      amount: 6000,
      status: "succeeded",
    });
    await expect(stripe.refunds.create({ payment_intent: "pi_unknown" })).rejects.toThrow(/No such/);
  });

  it("closes an open session and can no longer be paid there", async () => {
    const session = await stripe.checkout.sessions.create(wish());
    expect(await stripe.checkout.sessions.expire(session.id)).toMatchObject({ status: "expired", url: null });
    expect(await (await press(session.id, "pay")).text()).toContain("has closed");
    await expect(stripe.checkout.sessions.expire(session.id)).rejects.toThrow(/Only an open session/);
    await expect.poll(() => events.map((e) => e.type)).toEqual(["checkout.session.expired"]);
  });

  it("sends the same event again until the app takes it", async () => {
    appAnswers = [500, 503];
    const session = await stripe.checkout.sessions.create(wish());
    await press(session.id, "pay");
    await expect.poll(() => events.length).toBe(1);
  });

  it("remembers a payment after a restart", async () => {
    const session = await stripe.checkout.sessions.create(wish());
    await press(session.id, "pay");
    await start();
    expect(await stripe.checkout.sessions.retrieve(session.id)).toMatchObject({ payment_status: "paid" });
  });

  it("refuses a wrong key, an amount too small, and unknown things", async () => {
    expect((await fetch(`${base}/v1/refunds`, { method: "POST" })).status).toBe(401);
    await expect(stripe.checkout.sessions.create(wish(29))).rejects.toMatchObject({
      code: "amount_too_small",
    });
    await expect(stripe.checkout.sessions.retrieve("cs_none")).rejects.toMatchObject({ statusCode: 404 });
    expect((await fetch(`${base}/elsewhere`)).status).toBe(404);
  });

  it("lists what it knows", async () => {
    await stripe.checkout.sessions.create(wish());
    expect(await (await fetch(`${base}/card`)).text()).toContain("£186.00");
  });
});
