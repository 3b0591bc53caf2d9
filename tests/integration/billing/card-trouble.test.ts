import type { CardGateway } from "@withy/billing/card/card-gateway";
import { CardGatewayError } from "@withy/billing/card/card-gateway";
import { newId } from "@withy/core/ids";
import { payments } from "@withy/db/schema";
import {
  cancelCardPayment,
  checkCardPayment,
  getInvoice,
  refundPayment,
  retryRefund,
  setCardGateway,
  startCardPayment,
} from "@withy/services/billing";
import { eq } from "drizzle-orm";
import { afterEach, beforeAll, beforeEach, describe, expect, it } from "vitest";
import { contextFor, systemContextFor } from "../../support/contexts";
import { buildPractice, type TestPractice } from "../../support/practice";
import { type RunningCards, runCards } from "./card-stand-in";
import { issuedFor } from "./invoice-steps";

let practice: TestPractice;
let cards: RunningCards;
beforeAll(async () => {
  practice = await buildPractice();
});
beforeEach(async () => {
  cards = await runCards(() => systemContextFor(practice));
});
afterEach(() => cards.stop());

const desk = () => contextFor(practice, "receptionist");
const accounts = () => contextFor(practice, "accounts");
const invoiceNow = (invoiceId: string) => getInvoice(accounts(), { invoiceId });
const paymentsOf = (invoiceId: string) =>
  practice.db.select().from(payments).where(eq(payments.invoiceId, invoiceId));

async function started(amountPence = 5200) {
  const invoice = await issuedFor(practice);
  const card = await startCardPayment(desk(), { invoiceId: invoice.id, amountPence });
  return { invoice, card };
}

/** A gateway that behaves like the running one, but for what is given. */
function swap(change: (real: CardGateway) => Partial<CardGateway>): void {
  setCardGateway({ ...cards.gateway, ...change(cards.gateway) });
}

describe("a card provider that says no or nothing", () => {
  it("lets go of the amount after a no", async () => {
    const invoice = await issuedFor(practice);
    await expect(startCardPayment(desk(), { invoiceId: invoice.id, amountPence: 29 })).rejects.toMatchObject({
      kind: "card-refused",
    });
    expect(await invoiceNow(invoice.id)).toMatchObject({ pendingPence: 0, openCardPayment: null });
  });

  it("keeps hold after a silence, and closes the page that was opened unheard", async () => {
    const invoice = await issuedFor(practice);
    swap((real) => ({
      openCheckout: async (wish) => {
        await real.openCheckout(wish);
        throw new CardGatewayError("No answer.", false, null);
      },
    }));
    await expect(
      startCardPayment(desk(), { invoiceId: invoice.id, amountPence: 5200 }),
    ).rejects.toMatchObject({ code: "unavailable" });
    const { openCardPayment } = await invoiceNow(invoice.id);
    expect(openCardPayment).toMatchObject({ amountPence: 5200 });
    setCardGateway(cards.gateway);
    expect(await cancelCardPayment(desk(), { cardPaymentId: openCardPayment?.id ?? "" })).toMatchObject({
      state: "expired",
    });
    const sessions = Object.values(cards.standIn.store.state.sessions);
    expect(sessions).toMatchObject([{ status: "expired" }]);
  });

  it("posts nothing where another amount was taken than was asked for", async () => {
    const { invoice, card } = await started();
    cards.lost = true;
    await cards.press(card.url, "pay");
    swap((real) => ({ getCheckout: async (id) => ({ ...(await real.getCheckout(id)), amountPence: 1 }) }));
    await expect(checkCardPayment(desk(), { cardPaymentId: card.cardPaymentId })).rejects.toThrow(
      /another amount/,
    );
    expect(await paymentsOf(invoice.id)).toEqual([]);
    expect((await invoiceNow(invoice.id)).pendingPence).toBe(5200);
  });
});

describe("giving money back to a card", () => {
  async function paid() {
    const { invoice, card } = await started();
    await cards.press(card.url, "pay");
    const view = await invoiceNow(invoice.id);
    const wish = {
      paymentId: view.payments[0]?.id ?? "",
      amountPence: 2000,
      method: "card" as const,
      reason: "Overcharged",
      isOwedAgain: false,
    };
    return { invoice, wish };
  }

  it("gives back to the card, once for one key", async () => {
    const { invoice, wish } = await paid();
    const ctx = contextFor(practice, "accounts", { idempotencyKey: newId() });
    const first = await refundPayment(ctx, wish);
    expect(first).toMatchObject({ state: "paid", paidPence: 3200, creditedPence: 2000 });
    expect(first.refunds).toMatchObject([{ state: "done", method: "card", amountPence: 2000 }]);
    await refundPayment(ctx, wish);
    expect((await invoiceNow(invoice.id)).refunds).toHaveLength(1);
    expect(Object.values(cards.standIn.store.state.refunds)).toMatchObject([{ amount: 2000 }]);
    await expect(refundPayment(accounts(), { ...wish, amountPence: 3201 })).rejects.toMatchObject({
      kind: "more-than-paid",
    });
    await expect(refundPayment(accounts(), { ...wish, method: "cash" })).rejects.toMatchObject({
      kind: "card-to-card",
    });
  });

  it("changes nothing when the provider says no", async () => {
    const { invoice, wish } = await paid();
    swap(() => ({ refund: () => Promise.reject(new CardGatewayError("No.", true, null)) }));
    await expect(refundPayment(accounts(), wish)).rejects.toMatchObject({ kind: "card-refused" });
    const now = await invoiceNow(invoice.id);
    expect(now).toMatchObject({
      paidPence: 5200,
      refunds: [{ state: "failed" }],
      payments: [{ refundedPence: 0 }],
    });
  });

  it("waits after a silence and is given once when asked again", async () => {
    const { invoice, wish } = await paid();
    swap((real) => ({
      refund: async (asked) => {
        await real.refund(asked);
        throw new CardGatewayError("No answer.", false, null);
      },
    }));
    await expect(refundPayment(accounts(), wish)).rejects.toMatchObject({ code: "unavailable" });
    const waiting = await invoiceNow(invoice.id);
    expect(waiting).toMatchObject({
      paidPence: 5200,
      refunds: [{ state: "asked" }],
      payments: [{ refundedPence: 2000 }],
    });
    setCardGateway(cards.gateway);
    const refundId = waiting.refunds[0]?.id ?? "";
    await Promise.all([1, 2, 3].map(() => retryRefund(accounts(), { refundId })));
    expect(await invoiceNow(invoice.id)).toMatchObject({ paidPence: 3200, refunds: [{ state: "done" }] });
    expect(Object.values(cards.standIn.store.state.refunds)).toHaveLength(1);
  });
});
