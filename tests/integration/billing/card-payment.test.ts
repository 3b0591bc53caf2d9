import { newId } from "@withy/core/ids";
import { cardAttempts, cardEvents, payments } from "@withy/db/schema";
import {
  cancelCardPayment,
  checkCardPayment,
  getInvoice,
  receiveCardEvent,
  startCardPayment,
  takePayment,
  voidInvoice,
} from "@withy/services/billing";
import { eq, inArray } from "drizzle-orm";
import Stripe from "stripe";
import { afterEach, beforeAll, beforeEach, describe, expect, it } from "vitest";
import { auditOf } from "../../support/audit-rows";
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

describe("a card payment", () => {
  it("holds its amount, is paid on the provider's page, and posts by the signed event", async () => {
    const { invoice, card } = await started();
    const open = await invoiceNow(invoice.id);
    expect(open).toMatchObject({ state: "issued", pendingPence: 5200, owedPence: 5200, freePence: 0 });
    expect(open.openCardPayment).toMatchObject({ id: card.cardPaymentId, amountPence: 5200 });
    const back = await cards.press(card.url, "pay");
    expect(back.headers.get("location")).toContain(
      `/billing/invoices/${invoice.id}?card=${card.cardPaymentId}`,
    );
    const paid = await invoiceNow(invoice.id);
    expect(paid).toMatchObject({ state: "paid", paidPence: 5200, pendingPence: 0, openCardPayment: null });
    expect(paid.payments).toMatchObject([{ method: "card", amountPence: 5200 }]);
    expect((await auditOf(practice, invoice.id)).map((a) => a.action).slice(2)).toEqual([
      "card-payment.started",
      "payment.taken",
    ]);
  });

  it("posts once, however often and in whatever order events arrive", async () => {
    const { invoice, card } = await started(2000);
    await cards.press(card.url, "pay");
    const [event] = cards.events;
    const late = JSON.stringify({
      ...JSON.parse(event?.body ?? ""),
      id: "evt_late",
      type: "checkout.session.expired",
    });
    const signed = Stripe.webhooks.generateTestHeaderString({ payload: late, secret: "whsec_for_tests" });
    const again = () =>
      receiveCardEvent(systemContextFor(practice), event?.body ?? "", event?.signature ?? "");
    await Promise.all([
      again(),
      again(),
      receiveCardEvent(systemContextFor(practice), late, signed),
      again(),
    ]);
    expect(await paymentsOf(invoice.id)).toHaveLength(1);
    expect(await invoiceNow(invoice.id)).toMatchObject({
      state: "part-paid",
      paidPence: 2000,
      pendingPence: 0,
    });
    const ids = [JSON.parse(event?.body ?? "").id, "evt_late"];
    expect(await practice.db.select().from(cardEvents).where(inArray(cardEvents.id, ids))).toHaveLength(2);
  });

  it("posts once when the event and the returning payer ask at the same moment", async () => {
    const { invoice, card } = await started();
    cards.lost = true;
    await cards.press(card.url, "pay");
    cards.lost = false;
    const [event] = cards.events;
    await Promise.all([
      receiveCardEvent(systemContextFor(practice), event?.body ?? "", event?.signature ?? ""),
      ...[1, 2, 3].map(() => checkCardPayment(desk(), { cardPaymentId: card.cardPaymentId })),
    ]);
    expect(await paymentsOf(invoice.id)).toHaveLength(1);
    expect((await invoiceNow(invoice.id)).state).toBe("paid");
  });

  it("finds out by asking when the event is lost", async () => {
    const { invoice, card } = await started();
    cards.lost = true;
    await cards.press(card.url, "pay");
    expect((await invoiceNow(invoice.id)).state).toBe("issued");
    expect(await checkCardPayment(desk(), { cardPaymentId: card.cardPaymentId })).toMatchObject({
      state: "paid",
    });
    expect((await invoiceNow(invoice.id)).state).toBe("paid");
  });

  it("refuses an event that is not signed with our secret", async () => {
    const { invoice, card } = await started();
    cards.lost = true;
    await cards.press(card.url, "pay");
    const body = cards.events[0]?.body ?? "";
    const forged = Stripe.webhooks.generateTestHeaderString({ payload: body, secret: "whsec_other" });
    await expect(receiveCardEvent(systemContextFor(practice), body, forged)).rejects.toMatchObject({
      kind: "bad-signature",
    });
    expect(await paymentsOf(invoice.id)).toEqual([]);
  });

  it("stays open after a decline, and lets go when it is cancelled", async () => {
    const { invoice, card } = await started();
    await cards.press(card.url, "decline");
    await expect(
      takePayment(desk(), { invoiceId: invoice.id, amountPence: 100, method: "cash" }),
    ).rejects.toMatchObject({ kind: "card-payment-open" });
    await expect(startCardPayment(desk(), { invoiceId: invoice.id, amountPence: 100 })).rejects.toMatchObject(
      { kind: "card-payment-open" },
    );
    await expect(
      voidInvoice(accounts(), {
        invoiceId: invoice.id,
        version: (await invoiceNow(invoice.id)).version,
        reason: "x",
      }),
    ).rejects.toMatchObject({ kind: "card-payment-open" });
    expect(await cancelCardPayment(desk(), { cardPaymentId: card.cardPaymentId })).toMatchObject({
      state: "expired",
    });
    expect(await invoiceNow(invoice.id)).toMatchObject({
      pendingPence: 0,
      freePence: 5200,
      openCardPayment: null,
    });
    await cards.press(card.url, "pay");
    expect(await paymentsOf(invoice.id)).toEqual([]);
    expect(
      (await takePayment(desk(), { invoiceId: invoice.id, amountPence: 5200, method: "cash" })).state,
    ).toBe("paid");
  });

  it("posts a payment that was made just before it was cancelled", async () => {
    const { invoice, card } = await started();
    cards.lost = true;
    await cards.press(card.url, "pay");
    expect(await cancelCardPayment(desk(), { cardPaymentId: card.cardPaymentId })).toMatchObject({
      state: "paid",
    });
    expect((await invoiceNow(invoice.id)).state).toBe("paid");
  });

  it("holds no more than is owed when many begin at once", async () => {
    const invoice = await issuedFor(practice);
    const tries = await Promise.allSettled(
      Array.from({ length: 8 }, () => startCardPayment(desk(), { invoiceId: invoice.id, amountPence: 2000 })),
    );
    expect(tries.filter((t) => t.status === "fulfilled")).toHaveLength(2);
    expect(await invoiceNow(invoice.id)).toMatchObject({ pendingPence: 4000, freePence: 1200 });
  });

  it("opens one page for a repeated request", async () => {
    const invoice = await issuedFor(practice);
    const ctx = contextFor(practice, "receptionist", { idempotencyKey: newId() });
    const first = await startCardPayment(ctx, { invoiceId: invoice.id, amountPence: 5200 });
    expect(await startCardPayment(ctx, { invoiceId: invoice.id, amountPence: 5200 })).toEqual(first);
    expect(
      await practice.db.select().from(cardAttempts).where(eq(cardAttempts.invoiceId, invoice.id)),
    ).toHaveLength(1);
  });
});

describe("who may take cards", () => {
  it("is refused to therapists, other sites and other practices", async () => {
    const { invoice, card } = await started(1000);
    const other = await buildPractice({ name: "Cairn & Firth Clinics" });
    const start = { invoiceId: invoice.id, amountPence: 100 };
    const input = { cardPaymentId: card.cardPaymentId };
    await expect(startCardPayment(contextFor(practice, "therapist"), start)).rejects.toMatchObject({
      code: "forbidden",
    });
    for (const stranger of [contextFor(practice, "tollhouseReceptionist"), contextFor(other, "accounts")]) {
      await expect(startCardPayment(stranger, start)).rejects.toMatchObject({ code: "not-found" });
      await expect(checkCardPayment(stranger, input)).rejects.toMatchObject({ code: "not-found" });
      await expect(cancelCardPayment(stranger, input)).rejects.toMatchObject({ code: "not-found" });
    }
  });
});
