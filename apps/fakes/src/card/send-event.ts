import { randomBytes } from "node:crypto";
import Stripe from "stripe";
import { sessionBody } from "./card-api";
import type { CheckoutSession } from "./card-store";

export interface EventTarget {
  readonly url: string;
  readonly secret: string;
  /** Waits between tries, in milliseconds. */
  readonly retryAfterMs: readonly number[];
}

export type CardEventKind = "checkout.session.completed" | "checkout.session.expired";

async function tryOnce(target: EventTarget, payload: string): Promise<boolean> {
  const signature = Stripe.webhooks.generateTestHeaderString({ payload, secret: target.secret });
  try {
    const response = await fetch(target.url, {
      method: "POST",
      headers: { "content-type": "application/json", "stripe-signature": signature },
      body: payload,
      signal: AbortSignal.timeout(5_000),
    });
    return response.ok;
  } catch {
    return false;
  }
}

/**
 * Tells the app about a session, signed as the real service signs. The first try is awaited, so that a payer who
 * comes back finds the invoice paid; later ones go on behind, with the same event id.
 */
export async function sendEvent(
  target: EventTarget,
  kind: CardEventKind,
  session: CheckoutSession,
): Promise<boolean> {
  const payload = JSON.stringify({
    id: `evt_test_${randomBytes(12).toString("hex")}`,
    object: "event",
    api_version: null,
    created: Math.floor(Date.now() / 1000),
    type: kind,
    data: { object: sessionBody(session) },
  });
  if (await tryOnce(target, payload)) return true;
  void retry(target, payload);
  return false;
}

async function retry(target: EventTarget, payload: string): Promise<void> {
  for (const wait of target.retryAfterMs) {
    await new Promise((resolve) => setTimeout(resolve, wait).unref());
    if (await tryOnce(target, payload)) return;
  }
}
