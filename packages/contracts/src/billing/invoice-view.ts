import type { PaymentMethod } from "@withy/billing/check-payment";
import type { InvoiceState } from "@withy/billing/invoice-states";
import type { VatTreatment } from "@withy/billing/vat";
import type { Pence } from "@withy/core/money";
import type { PlainDateText } from "@withy/core/plain-date";

export interface InvoiceLineView {
  readonly id: string;
  readonly kind: "visit" | "product" | "fee";
  readonly appointmentId: string | null;
  readonly productId: string | null;
  /** The day of the visit; for goods the day they were put on the invoice. */
  readonly on: PlainDateText | null;
  readonly description: string;
  readonly quantity: number;
  readonly unitPence: Pence;
  readonly discountBasisPoints: number;
  readonly vatTreatment: VatTreatment;
  readonly netPence: Pence;
  readonly vatPence: Pence;
  readonly totalPence: Pence;
}

export interface PaymentView {
  readonly id: string;
  readonly method: PaymentMethod;
  readonly amountPence: Pence;
  readonly refundedPence: Pence;
  readonly reference: string | null;
  readonly on: PlainDateText;
}

export interface RefundView {
  readonly id: string;
  readonly paymentId: string;
  readonly method: PaymentMethod;
  readonly amountPence: Pence;
  readonly reason: string;
  readonly isOwedAgain: boolean;
  readonly state: "asked" | "done" | "failed";
  readonly on: PlainDateText;
}

/** A card payment that was begun and has not ended. */
export interface OpenCardPaymentView {
  readonly id: string;
  readonly amountPence: Pence;
  readonly startedTime: string;
}

/** One step in an invoice's life, for its margin. */
export interface InvoiceStepView {
  readonly id: string;
  readonly on: PlainDateText;
  readonly time: string | null;
  readonly said: string;
  readonly by: string | null;
}

export interface InvoiceSenderView {
  readonly practiceName: string;
  readonly legalName: string;
  readonly siteName: string;
  readonly addressLine: string;
  readonly phone: string;
  readonly email: string;
}

export interface InvoiceBillToView {
  readonly name: string;
  readonly addressLines: readonly string[];
  readonly postcode: string | null;
  readonly email: string | null;
}

export interface InvoiceView {
  readonly id: string;
  readonly version: number;
  readonly state: InvoiceState;
  readonly stateWord: string;
  readonly reference: string | null;
  readonly currency: string;
  readonly sender: InvoiceSenderView;
  readonly billTo: InvoiceBillToView;
  readonly patient: { readonly id: string; readonly name: string; readonly bornOn: PlainDateText };
  readonly payer: {
    readonly id: string;
    readonly name: string;
    readonly kind: "insurer" | "employer";
  } | null;
  readonly siteId: string;
  readonly treatedBy: readonly string[];
  readonly today: PlainDateText;
  readonly issuedOn: PlainDateText | null;
  readonly dueOn: PlainDateText | null;
  /** Whole days past the due date while money is owed; zero or less before. */
  readonly daysPastDue: number | null;
  readonly lines: readonly InvoiceLineView[];
  readonly netPence: Pence;
  readonly vatPence: Pence;
  readonly totalPence: Pence;
  readonly paidPence: Pence;
  readonly creditedPence: Pence;
  readonly pendingPence: Pence;
  readonly owedPence: Pence;
  /** Owed and not promised by an open card payment. */
  readonly freePence: Pence;
  readonly isVatShown: boolean;
  readonly vatNote: readonly string[];
  readonly voidReason: string | null;
  readonly payments: readonly PaymentView[];
  readonly refunds: readonly RefundView[];
  readonly openCardPayment: OpenCardPaymentView | null;
  readonly steps: readonly InvoiceStepView[];
}
