import Stripe from "stripe";
import {
  type CardEvent,
  type CardGateway,
  CardGatewayError,
  type CardRefundReport,
  type CardRefundWish,
  type CheckoutReport,
  type CheckoutStatus,
  type CheckoutWish,
  type OpenedCheckout,
} from "./card-gateway";

export interface StripeSettings {
  readonly secretKey: string;
  readonly webhookSecret: string;
  /** Where the provider's interface lives; left out for Stripe itself. */
  readonly endpoint?: { readonly protocol: "http" | "https"; readonly host: string; readonly port: number };
  readonly timeoutMs?: number;
}

/** Cards through Stripe's own library: a hosted checkout page, refunds, and signed events. */
export function stripeCardGateway(settings: StripeSettings): CardGateway {
  const stripe = new Stripe(settings.secretKey, {
    ...settings.endpoint,
    telemetry: false,
    maxNetworkRetries: 1,
    timeout: settings.timeoutMs ?? 15_000,
  });
  return {
    openCheckout: (wish) => asking(() => openCheckout(stripe, wish)),
    getCheckout: (id) => asking(async () => reportOf(await stripe.checkout.sessions.retrieve(id))),
    closeCheckout: (id) => asking(() => closeCheckout(stripe, id)),
    refund: (wish) => asking(() => refund(stripe, wish)),
    readEvent: (rawBody, signature) => readEvent(stripe, rawBody, signature, settings.webhookSecret),
  };
}

async function asking<T>(ask: () => Promise<T>): Promise<T> {
  try {
    return await ask();
  } catch (error) {
    if (!(error instanceof Stripe.errors.StripeError)) throw error;
    const isRefused = error.statusCode !== undefined && error.statusCode >= 400 && error.statusCode < 500;
    throw new CardGatewayError(`The card provider answered ${error.code ?? error.type}.`, isRefused, error);
  }
}

async function openCheckout(stripe: Stripe, wish: CheckoutWish): Promise<OpenedCheckout> {
  const session = await stripe.checkout.sessions.create(
    {
      mode: "payment",
      line_items: [
        {
          quantity: 1,
          price_data: {
            currency: wish.currency.toLowerCase(),
            unit_amount: wish.amountPence,
            product_data: { name: wish.description },
          },
        },
      ],
      client_reference_id: wish.reference,
      metadata: { reference: wish.reference },
      payment_intent_data: { metadata: { reference: wish.reference } },
      success_url: wish.returnUrl,
      cancel_url: wish.cancelUrl,
    },
    { idempotencyKey: wish.idempotencyKey },
  );
  if (session.url === null)
    throw new CardGatewayError("The card provider gave no payment page.", false, null);
  return { checkoutId: session.id, url: session.url };
}

async function closeCheckout(stripe: Stripe, checkoutId: string): Promise<CheckoutReport> {
  const now = reportOf(await stripe.checkout.sessions.retrieve(checkoutId));
  if (now.status !== "open") return now;
  try {
    return reportOf(await stripe.checkout.sessions.expire(checkoutId));
  } catch (error) {
    // Paid between the two calls: the provider then refuses to close it, and its state is the answer.
    const again = reportOf(await stripe.checkout.sessions.retrieve(checkoutId));
    if (again.status === "open") throw error;
    return again;
  }
}

async function refund(stripe: Stripe, wish: CardRefundWish): Promise<CardRefundReport> {
  const made = await stripe.refunds.create(
    { payment_intent: wish.paymentRef, amount: wish.amountPence, metadata: { reference: wish.reference } },
    { idempotencyKey: wish.idempotencyKey },
  );
  const isDone = made.status === "succeeded";
  const isFailed = made.status === "failed" || made.status === "canceled";
  return { refundRef: made.id, status: isDone ? "succeeded" : isFailed ? "failed" : "pending" };
}

function statusOf(session: Stripe.Checkout.Session): CheckoutStatus {
  if (session.status === "expired") return "expired";
  if (session.status === "open") return "open";
  return session.payment_status === "paid" ? "paid" : "unpaid";
}

function reportOf(session: Stripe.Checkout.Session): CheckoutReport {
  const intent = session.payment_intent;
  return {
    checkoutId: session.id,
    reference: session.client_reference_id,
    status: statusOf(session),
    amountPence: session.amount_total ?? 0,
    currency: (session.currency ?? "").toUpperCase(),
    paymentRef: typeof intent === "string" ? intent : (intent?.id ?? null),
  };
}

function readEvent(stripe: Stripe, rawBody: string, signature: string, secret: string): CardEvent | null {
  try {
    const event = stripe.webhooks.constructEvent(rawBody, signature, secret);
    const isCheckout = event.type.startsWith("checkout.session.");
    const about = event.data.object as { id?: unknown };
    return {
      eventId: event.id,
      kind: event.type,
      checkoutId: isCheckout && typeof about.id === "string" ? about.id : null,
    };
  } catch (error) {
    if (error instanceof Stripe.errors.StripeSignatureVerificationError) return null;
    // A body that is no event at all is no better signed than one with a wrong signature.
    if (error instanceof SyntaxError) return null;
    throw error;
  }
}
