import { createHash, randomBytes } from "node:crypto";
import type { CardStore, CheckoutSession } from "./card-store";

export interface ApiRequest {
  readonly method: string;
  readonly path: string;
  readonly form: URLSearchParams;
  readonly idempotencyKey: string | null;
  /** Where a browser reaches this stand-in, for example "http://127.0.0.1:3100". */
  readonly origin: string;
}

export interface ApiAnswer {
  readonly status: number;
  readonly body: unknown;
  readonly isReplay?: boolean;
  /** A session that this call closed, which the app is told about. */
  readonly closed?: CheckoutSession;
}

/** The least that may be charged in pounds sterling at the real service (from memory). */
const leastAmount = 30;
const newRef = (kind: string): string => `${kind}_test_${randomBytes(12).toString("hex")}`;
const seconds = (): number => Math.floor(Date.now() / 1000);

function refuse(status: number, code: string, message: string): ApiAnswer {
  const type = code === "idempotency_error" ? code : "invalid_request_error";
  return { status, body: { error: { type, code, message } } };
}

const missing = (what: string): ApiAnswer => refuse(404, "resource_missing", `No such ${what}.`);

function metadataOf(form: URLSearchParams): Record<string, string> {
  const entries = [...form].flatMap(([key, value]) => {
    const name = /^metadata\[([^\]]+)\]$/.exec(key)?.[1];
    return name === undefined ? [] : [[name, value] as const];
  });
  return Object.fromEntries(entries);
}

export function sessionBody(session: CheckoutSession): object {
  return {
    id: session.id,
    object: "checkout.session",
    mode: "payment",
    status: session.status,
    payment_status: session.status === "complete" ? "paid" : "unpaid",
    amount_total: session.amount,
    currency: session.currency,
    client_reference_id: session.reference,
    metadata: session.metadata,
    payment_intent: session.paymentIntentId,
    success_url: session.successUrl,
    cancel_url: session.cancelUrl,
    created: session.createdAt,
    url: session.status === "open" ? session.pageUrl : null,
  };
}

function openSession(store: CardStore, request: ApiRequest): ApiAnswer {
  const { form } = request;
  const price = "line_items[0][price_data]";
  const amount = Number(form.get(`${price}[unit_amount]`)) * Number(form.get("line_items[0][quantity]"));
  const successUrl = form.get("success_url") ?? "";
  if (!Number.isSafeInteger(amount)) return refuse(400, "parameter_invalid_integer", "Invalid integer.");
  if (amount < leastAmount)
    return refuse(400, "amount_too_small", "The amount is below the least that can be charged.");
  if (!URL.canParse(successUrl)) return refuse(400, "url_invalid", "Not a valid URL.");
  const id = newRef("cs");
  const session: CheckoutSession = {
    id,
    amount,
    currency: form.get(`${price}[currency]`) ?? "gbp",
    description: form.get(`${price}[product_data][name]`) ?? "",
    reference: form.get("client_reference_id"),
    metadata: metadataOf(form),
    successUrl,
    cancelUrl: form.get("cancel_url") ?? successUrl,
    createdAt: seconds(),
    pageUrl: `${request.origin}/card/pay/${id}`,
    status: "open",
    declines: 0,
    paymentIntentId: null,
  };
  store.state.sessions[id] = session;
  return { status: 200, body: sessionBody(session) };
}

function expireSession(session: CheckoutSession): ApiAnswer {
  if (session.status !== "open")
    return refuse(400, "resource_already_closed", "Only an open session can expire.");
  session.status = "expired";
  return { status: 200, body: sessionBody(session), closed: session };
}

function refund(store: CardStore, form: URLSearchParams): ApiAnswer {
  const intent = store.state.intents[form.get("payment_intent") ?? ""];
  if (intent?.status !== "succeeded") return missing("payment_intent");
  const left = intent.amount - intent.refunded;
  const amount = form.has("amount") ? Number(form.get("amount")) : left;
  if (!Number.isSafeInteger(amount) || amount <= 0)
    return refuse(400, "parameter_invalid_integer", "Invalid integer.");
  if (amount > left)
    return refuse(400, "charge_already_refunded", "The refund is greater than what is left of the charge.");
  intent.refunded += amount;
  const made = {
    id: newRef("re"),
    amount,
    currency: intent.currency,
    paymentIntentId: intent.id,
    metadata: metadataOf(form),
    createdAt: seconds(),
  };
  store.state.refunds[made.id] = made;
  return { status: 200, body: refundBody(made) };
}

function refundBody(made: CardStore["state"]["refunds"][string]): object {
  const { id, amount, currency, metadata } = made;
  return {
    id,
    object: "refund",
    amount,
    currency,
    metadata,
    payment_intent: made.paymentIntentId,
    status: "succeeded",
  };
}

/** Marks a session as paid and makes its payment. */
export function paySession(store: CardStore, session: CheckoutSession): void {
  const intent = {
    id: newRef("pi"),
    amount: session.amount,
    currency: session.currency,
    sessionId: session.id,
  };
  store.state.intents[intent.id] = { ...intent, status: "succeeded", refunded: 0 };
  session.paymentIntentId = intent.id;
  session.status = "complete";
  store.save();
}

function route(store: CardStore, request: ApiRequest): ApiAnswer {
  const { method, path } = request;
  const [, , kind = "", a = "", b = "", c = ""] = path.split("/");
  if (method === "POST" && path === "/v1/checkout/sessions") return openSession(store, request);
  if (kind === "checkout" && a === "sessions") {
    const session = store.state.sessions[b];
    if (!session) return missing("checkout.session");
    if (method === "GET" && c === "") return { status: 200, body: sessionBody(session) };
    if (method === "POST" && c === "expire") return expireSession(session);
  }
  if (method === "POST" && path === "/v1/refunds") return refund(store, request.form);
  if (method === "GET" && kind === "refunds") {
    const made = store.state.refunds[a];
    return made ? { status: 200, body: refundBody(made) } : missing("refund");
  }
  if (method === "GET" && kind === "payment_intents") {
    const intent = store.state.intents[a];
    if (!intent) return missing("payment_intent");
    const received = intent.status === "succeeded" ? intent.amount : 0;
    return { status: 200, body: { ...intent, object: "payment_intent", amount_received: received } };
  }
  return refuse(404, "unknown_url", "This stand-in has no such call.");
}

/** Answers one call of the provider's interface; a repeated idempotency key gets its first answer again. */
export function answerApi(store: CardStore, request: ApiRequest): ApiAnswer {
  const key = request.method === "POST" ? request.idempotencyKey : null;
  const digest = createHash("sha256").update(`${request.path}\n${request.form}`).digest("hex");
  const kept = key === null ? undefined : store.state.answers[key];
  if (kept && kept.digest !== digest) {
    return refuse(400, "idempotency_error", "This idempotency key was used with other parameters.");
  }
  if (kept) return { status: kept.status, body: kept.body, isReplay: true };
  const answer = route(store, request);
  if (key !== null) store.state.answers[key] = { digest, status: answer.status, body: answer.body };
  if (request.method === "POST") store.save();
  return answer;
}
