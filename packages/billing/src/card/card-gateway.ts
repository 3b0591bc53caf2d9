import type { Pence } from "@withy/core/money";

export interface CheckoutWish {
  /** Repeating a call with the same key opens no second checkout. */
  readonly idempotencyKey: string;
  readonly amountPence: Pence;
  readonly currency: string;
  /** What the payer reads on the payment page, for example "Invoice SG-04187". */
  readonly description: string;
  /** Our own id of the attempt, given back by every answer about it. */
  readonly reference: string;
  readonly returnUrl: string;
  readonly cancelUrl: string;
}

export interface OpenedCheckout {
  readonly checkoutId: string;
  readonly url: string;
}

export type CheckoutStatus = "open" | "paid" | "unpaid" | "expired";

/** What the provider says about a checkout now. Only this is believed; an event merely says when to ask. */
export interface CheckoutReport {
  readonly checkoutId: string;
  readonly reference: string | null;
  readonly status: CheckoutStatus;
  readonly amountPence: Pence;
  readonly currency: string;
  /** The provider's payment, which a refund names; null until paid. */
  readonly paymentRef: string | null;
}

export interface CardRefundWish {
  readonly idempotencyKey: string;
  readonly paymentRef: string;
  readonly amountPence: Pence;
  readonly reference: string;
}

export type CardRefundStatus = "succeeded" | "pending" | "failed";

export interface CardRefundReport {
  readonly refundRef: string;
  readonly status: CardRefundStatus;
}

export interface CardEvent {
  readonly eventId: string;
  readonly kind: string;
  /** The checkout that the event is about; null for events of other kinds. */
  readonly checkoutId: string | null;
}

/** The provider said no, or could not be reached. The message never carries card or personal data. */
export class CardGatewayError extends Error {
  readonly isRefused: boolean;
  constructor(message: string, isRefused: boolean, cause: unknown) {
    super(message, { cause });
    this.name = "CardGatewayError";
    this.isRefused = isRefused;
  }
}

/** Everything that we ask of a card provider. Amounts are pence; every call may throw `CardGatewayError`. */
export interface CardGateway {
  openCheckout(wish: CheckoutWish): Promise<OpenedCheckout>;
  getCheckout(checkoutId: string): Promise<CheckoutReport>;
  /** Closes an open checkout, so that it can no longer be paid. The answer tells if it was paid just before. */
  closeCheckout(checkoutId: string): Promise<CheckoutReport>;
  refund(wish: CardRefundWish): Promise<CardRefundReport>;
  /** The event, or null where the signature or its age is wrong. */
  readEvent(rawBody: string, signature: string): CardEvent | null;
}
