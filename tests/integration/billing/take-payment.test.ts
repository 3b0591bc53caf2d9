import { newId } from "@withy/core/ids";
import { invoices, payments } from "@withy/db/schema";
import { getInvoice, refundPayment, takePayment, voidInvoice } from "@withy/services/billing";
import { eq, sum } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import { auditOf } from "../../support/audit-rows";
import { asDatabaseOwner } from "../../support/connection";
import { contextFor } from "../../support/contexts";
import { buildPractice, type TestPractice } from "../../support/practice";
import { draftFor, issuedFor } from "./invoice-steps";

let practice: TestPractice;
beforeAll(async () => {
  practice = await buildPractice();
});
const desk = () => contextFor(practice, "receptionist");
const accounts = () => contextFor(practice, "accounts");
const cash = (invoiceId: string, amountPence: number) => ({
  invoiceId,
  amountPence,
  method: "cash" as const,
});

async function paidOf(invoiceId: string): Promise<number> {
  const [row] = await practice.db
    .select({ paid: sum(payments.amountPence) })
    .from(payments)
    .where(eq(payments.invoiceId, invoiceId));
  return Number(row?.paid ?? 0);
}

describe("taking a payment", () => {
  it("takes a part, then the rest, with an audit row each", async () => {
    const invoice = await issuedFor(practice);
    const part = await takePayment(desk(), cash(invoice.id, 1200));
    expect(part).toMatchObject({ state: "part-paid", paidPence: 1200, owedPence: 4000 });
    const rest = { invoiceId: invoice.id, amountPence: 4000, method: "bank" as const, reference: "FP 4417" };
    const paid = await takePayment(desk(), rest);
    expect(paid).toMatchObject({ state: "paid", owedPence: 0 });
    expect(paid.payments).toMatchObject([
      { method: "cash", amountPence: 1200 },
      { method: "bank", reference: "FP 4417" },
    ]);
    expect((await auditOf(practice, invoice.id)).map((a) => a.action).slice(2)).toEqual([
      "payment.taken",
      "payment.taken",
    ]);
    expect(paid.steps.map((s) => s.said).slice(2)).toEqual(["£12.00 by cash", "£40.00 by bank"]);
  });

  it.each([
    [5201, "more-than-owed"],
    [0, "amount-not-positive"],
  ])("refuses %i pence as %s", async (amount, kind) => {
    const invoice = await issuedFor(practice);
    await expect(takePayment(desk(), cash(invoice.id, amount))).rejects.toMatchObject({
      code: "refused",
      kind,
    });
    expect(await paidOf(invoice.id)).toBe(0);
  });

  it("refuses drafts, void and paid invoices", async () => {
    const draft = await draftFor(practice, accounts());
    await expect(takePayment(desk(), cash(draft.id, 100))).rejects.toMatchObject({ kind: "invoice-draft" });
    const gone = await issuedFor(practice);
    await voidInvoice(accounts(), { invoiceId: gone.id, version: gone.version, reason: "Wrong payer" });
    await expect(takePayment(desk(), cash(gone.id, 100))).rejects.toMatchObject({ kind: "invoice-void" });
    const paid = await issuedFor(practice);
    const { version } = await takePayment(desk(), cash(paid.id, 5200));
    await expect(takePayment(desk(), cash(paid.id, 1))).rejects.toMatchObject({ kind: "invoice-paid" });
    await expect(voidInvoice(accounts(), { invoiceId: paid.id, version, reason: "x" })).rejects.toMatchObject(
      { kind: "invoice-paid" },
    );
  });

  it("takes a repeated request once", async () => {
    const invoice = await issuedFor(practice);
    const ctx = contextFor(practice, "receptionist", { idempotencyKey: newId() });
    await Promise.all([1, 2, 3].map(() => takePayment(ctx, cash(invoice.id, 1000))));
    expect(await paidOf(invoice.id)).toBe(1000);
  });

  it("never lets 20 at once pay more than is owed", async () => {
    const invoice = await issuedFor(practice, 2);
    const tries = await Promise.allSettled(
      Array.from({ length: 20 }, () => takePayment(desk(), cash(invoice.id, 1000))),
    );
    expect(tries.filter((t) => t.status === "fulfilled")).toHaveLength(10);
    for (const failed of tries.filter((t) => t.status === "rejected")) {
      expect(failed.reason).toMatchObject({ code: "refused", kind: "more-than-owed" });
    }
    expect(await getInvoice(accounts(), { invoiceId: invoice.id })).toMatchObject({
      paidPence: 10000,
      owedPence: 400,
    });
    expect(await paidOf(invoice.id)).toBe(10000);
  });

  it("is held by the database as well", async () => {
    const invoice = await issuedFor(practice);
    const tries = [
      "paid_pence = 5201",
      "credited_pence = 5201",
      "pending_pence = 5201",
      "paid_pence = -1",
      "paid_pence = 2601, pending_pence = 2600",
    ];
    await asDatabaseOwner(async (db) => {
      for (const set of tries) {
        await expect(
          db.query(`update invoices set ${set} where id = ?`, [invoice.id]),
          set,
        ).rejects.toMatchObject({ errno: 4025 });
      }
    });
  });

  it("is not for therapists, other sites or other practices", async () => {
    const invoice = await issuedFor(practice);
    const other = await buildPractice({ name: "Cairn & Firth Clinics" });
    const input = cash(invoice.id, 100);
    await expect(takePayment(contextFor(practice, "therapist"), input)).rejects.toMatchObject({
      code: "forbidden",
    });
    await expect(takePayment(contextFor(practice, "tollhouseReceptionist"), input)).rejects.toMatchObject({
      code: "not-found",
    });
    await expect(takePayment(contextFor(other, "accounts"), input)).rejects.toMatchObject({
      code: "not-found",
    });
  });
});

describe("giving cash back", () => {
  const back = (paymentId: string, amountPence: number, isOwedAgain: boolean) => ({
    paymentId,
    amountPence,
    method: "cash" as const,
    reason: "Class was cancelled",
    isOwedAgain,
  });

  it("forgives what it gives back, or asks for it again", async () => {
    const invoice = await issuedFor(practice);
    const paid = await takePayment(desk(), cash(invoice.id, 5200));
    const payment = paid.payments[0]?.id ?? "";
    const part = await refundPayment(accounts(), back(payment, 1000, false));
    expect(part).toMatchObject({ state: "paid", paidPence: 4200, creditedPence: 1000, owedPence: 0 });
    const again = await refundPayment(accounts(), back(payment, 200, true));
    expect(again).toMatchObject({ state: "part-paid", paidPence: 4000, owedPence: 200 });
    await takePayment(desk(), cash(invoice.id, 200));
    await refundPayment(accounts(), back(payment, 4000, false));
    const last = await getInvoice(accounts(), { invoiceId: invoice.id });
    const second = last.payments[1]?.id ?? "";
    const all = await refundPayment(accounts(), back(second, 200, false));
    expect(all).toMatchObject({ state: "refunded", paidPence: 0, creditedPence: 5200, owedPence: 0 });
    await expect(takePayment(desk(), cash(invoice.id, 1))).rejects.toMatchObject({
      kind: "invoice-refunded",
    });
  });

  it("never gives back more than was paid, however many ask at once", async () => {
    const invoice = await issuedFor(practice);
    const paid = await takePayment(desk(), cash(invoice.id, 5000));
    const payment = paid.payments[0]?.id ?? "";
    await expect(refundPayment(accounts(), back(payment, 5001, false))).rejects.toMatchObject({
      kind: "more-than-paid",
    });
    const tries = await Promise.allSettled(
      Array.from({ length: 12 }, () => refundPayment(accounts(), back(payment, 1000, true))),
    );
    expect(tries.filter((t) => t.status === "fulfilled")).toHaveLength(5);
    const now = await getInvoice(accounts(), { invoiceId: invoice.id });
    expect(now).toMatchObject({ state: "issued", paidPence: 0, owedPence: 5200 });
    expect(now.payments[0]?.refundedPence).toBe(5000);
  });

  it("is for owners and accounts only, and leaves the payment as it was", async () => {
    const invoice = await issuedFor(practice);
    const paid = await takePayment(desk(), cash(invoice.id, 5200));
    const payment = paid.payments[0]?.id ?? "";
    await expect(refundPayment(desk(), back(payment, 100, false))).rejects.toMatchObject({
      code: "forbidden",
    });
    const other = await buildPractice({ name: "Cairn & Firth Clinics" });
    await expect(refundPayment(contextFor(other, "owner"), back(payment, 100, false))).rejects.toMatchObject({
      code: "not-found",
    });
    expect(
      (await refundPayment(contextFor(practice, "owner"), back(payment, 100, false))).creditedPence,
    ).toBe(100);
    await asDatabaseOwner(async (db) => {
      const change = db.query("update payments set amount_pence = 9999 where id = ?", [payment]);
      await expect(change).rejects.toMatchObject({ sqlState: "45000" });
    });
    const [row] = await practice.db.select().from(invoices).where(eq(invoices.id, invoice.id));
    expect(row?.totalPence).toBe(5200);
  });
});
