import { mkdirSync, readFileSync, renameSync, writeFileSync } from "node:fs";
import { dirname } from "node:path";

export interface CheckoutSession {
  readonly id: string;
  readonly amount: number;
  readonly currency: string;
  readonly description: string;
  readonly reference: string | null;
  readonly metadata: Readonly<Record<string, string>>;
  readonly successUrl: string;
  readonly cancelUrl: string;
  readonly createdAt: number;
  readonly pageUrl: string;
  status: "open" | "complete" | "expired";
  declines: number;
  paymentIntentId: string | null;
}

export interface PaymentIntent {
  readonly id: string;
  readonly amount: number;
  readonly currency: string;
  readonly sessionId: string;
  status: "requires_payment_method" | "succeeded";
  refunded: number;
}

export interface CardRefund {
  readonly id: string;
  readonly amount: number;
  readonly currency: string;
  readonly paymentIntentId: string;
  readonly metadata: Readonly<Record<string, string>>;
  readonly createdAt: number;
}

/** What was answered to an idempotency key, and a digest of what had been asked. */
export interface KeptAnswer {
  readonly digest: string;
  readonly status: number;
  readonly body: unknown;
}

export interface CardState {
  sessions: Record<string, CheckoutSession>;
  intents: Record<string, PaymentIntent>;
  refunds: Record<string, CardRefund>;
  answers: Record<string, KeptAnswer>;
}

export interface CardStore {
  readonly state: CardState;
  /** Keeps what was changed, so that a payment can still be given back after a restart. */
  save(): void;
}

const empty = (): CardState => ({ sessions: {}, intents: {}, refunds: {}, answers: {} });

/** The stand-in's memory: in a file where one is named, otherwise for as long as the process lives. */
export function openCardStore(file: string | null): CardStore {
  if (file === null) return { state: empty(), save: () => {} };
  const state = readState(file);
  return {
    state,
    save: () => {
      mkdirSync(dirname(file), { recursive: true });
      writeFileSync(`${file}.new`, JSON.stringify(state));
      renameSync(`${file}.new`, file);
    },
  };
}

function readState(file: string): CardState {
  try {
    return { ...empty(), ...(JSON.parse(readFileSync(file, "utf8")) as Partial<CardState>) };
  } catch (error) {
    if (error instanceof Error && "code" in error && error.code === "ENOENT") return empty();
    throw error;
  }
}
