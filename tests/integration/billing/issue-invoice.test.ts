import { newId } from "@withy/core/ids";
import { invoiceCounters, invoiceLines, invoices, patients } from "@withy/db/schema";
import { editDraft, issueInvoice, listProducts, voidInvoice } from "@withy/services/billing";
import { and, asc, eq, isNotNull } from "drizzle-orm";
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
const accounts = () => contextFor(practice, "accounts");

async function numbersOf(of: TestPractice): Promise<number[]> {
  const rows = await of.db
    .select({ number: invoices.number })
    .from(invoices)
    .where(and(eq(invoices.practiceId, of.practiceId), isNotNull(invoices.number)))
    .orderBy(asc(invoices.number));
  return rows.map((row) => row.number ?? 0);
}

describe("issuing an invoice", () => {
  it("gives it the next number, its dates and an audit row", async () => {
    const fresh = await buildPractice();
    const first = await issuedFor(fresh);
    const second = await issuedFor(fresh);
    expect(first).toMatchObject({
      reference: "MP-00001",
      state: "issued",
      issuedOn: "2026-12-01",
      dueOn: "2026-12-15",
      owedPence: 5200,
    });
    expect(second.reference).toBe("MP-00002");
    expect((await auditOf(fresh, first.id)).map((a) => a.action)).toEqual([
      "invoice.drafted",
      "invoice.issued",
    ]);
    expect(first.steps.map((s) => s.said)).toEqual(["Drafted", "Issued as MP-00001, £52.00"]);
  });

  it("numbers 20 at once without a gap and without a repeat", async () => {
    const fresh = await buildPractice();
    const ctx = contextFor(fresh, "accounts");
    const drafts = [];
    for (let i = 0; i < 20; i += 1) drafts.push(await draftFor(fresh, ctx));
    const issued = await Promise.all(
      drafts.map((d) => issueInvoice(contextFor(fresh, "accounts"), { invoiceId: d.id, version: d.version })),
    );
    expect(new Set(issued.map((i) => i.reference)).size).toBe(20);
    expect(await numbersOf(fresh)).toEqual(Array.from({ length: 20 }, (_, i) => i + 1));
  });

  it("starts its own count where the practice has issued none and two are first at once", async () => {
    const fresh = await buildPractice();
    await asDatabaseOwner((db) =>
      db.query("delete from invoice_counters where practice_id = ?", [fresh.practiceId]),
    );
    const ctx = contextFor(fresh, "accounts");
    const drafts = [await draftFor(fresh, ctx), await draftFor(fresh, ctx), await draftFor(fresh, ctx)];
    await Promise.all(drafts.map((d) => issueInvoice(ctx, { invoiceId: d.id, version: d.version })));
    expect(await numbersOf(fresh)).toEqual([1, 2, 3]);
  });

  it("gives the number back when issuing fails", async () => {
    const fresh = await buildPractice();
    const ctx = contextFor(fresh, "accounts");
    const draft = await draftFor(fresh, ctx, 6);
    await fresh.db.update(patients).set({ addressLines: [] }).where(eq(patients.id, draft.patient.id));
    const issue = () => issueInvoice(ctx, { invoiceId: draft.id, version: draft.version });
    await expect(issue()).rejects.toMatchObject({ kind: "missing-customerAddress" });
    expect((await issuedFor(fresh)).reference).toBe("MP-00001");
    await fresh.db
      .update(patients)
      .set({ addressLines: ["1 Quay"] })
      .where(eq(patients.id, draft.patient.id));
    expect((await issue()).reference).toBe("MP-00002");
  });

  it("issues once for one key, and refuses an old version and a second issue", async () => {
    const draft = await draftFor(practice, accounts());
    const input = { invoiceId: draft.id, version: draft.version };
    const ctx = contextFor(practice, "accounts", { idempotencyKey: newId() });
    const first = await issueInvoice(ctx, input);
    expect((await issueInvoice(ctx, input)).reference).toBe(first.reference);
    await expect(issueInvoice(accounts(), input)).rejects.toMatchObject({ code: "stale" });
    await expect(issueInvoice(accounts(), { ...input, version: first.version })).rejects.toMatchObject({
      kind: "invoice-issued",
    });
  });

  it("is paid at once where nothing is to be paid", async () => {
    const draft = await draftFor(practice, accounts());
    const lines = [{ lineId: draft.lines[0]?.id ?? "", quantity: 1, discountBasisPoints: 10_000 }];
    const free = await editDraft(accounts(), { invoiceId: draft.id, version: draft.version, lines });
    expect(await issueInvoice(accounts(), { invoiceId: draft.id, version: free.version })).toMatchObject({
      state: "paid",
      totalPence: 0,
      owedPence: 0,
    });
  });

  it("is not for therapists, other sites or other practices", async () => {
    const draft = await draftFor(practice, accounts());
    const input = { invoiceId: draft.id, version: draft.version };
    const other = await buildPractice({ name: "Cairn & Firth Clinics" });
    await expect(issueInvoice(contextFor(practice, "therapist"), input)).rejects.toMatchObject({
      code: "forbidden",
    });
    await expect(issueInvoice(contextFor(practice, "tollhouseReceptionist"), input)).rejects.toMatchObject({
      code: "not-found",
    });
    await expect(issueInvoice(contextFor(other, "accounts"), input)).rejects.toMatchObject({
      code: "not-found",
    });
    expect((await issueInvoice(contextFor(practice, "receptionist"), input)).state).toBe("issued");
  });
});

describe("an issued invoice", () => {
  it("cannot be changed by the verbs", async () => {
    const issued = await issuedFor(practice);
    const [product] = await listProducts(accounts(), { invoiceId: issued.id });
    const lines = [{ productId: product?.id ?? "", quantity: 1, discountBasisPoints: 0 }];
    await expect(
      editDraft(accounts(), { invoiceId: issued.id, version: issued.version, lines }),
    ).rejects.toMatchObject({ kind: "invoice-issued" });
  });

  it("cannot be changed in the database either", async () => {
    const issued = await issuedFor(practice);
    const [practiceId, id] = [practice.practiceId, issued.id];
    const where = "where practice_id = ? and id = ?";
    const onLines = "where practice_id = ? and invoice_id = ?";
    const tries = [
      `update invoices set total_pence = 1, net_pence = 1 ${where}`,
      `update invoices set number = 999 ${where}`,
      `update invoices set issued_on = '2020-01-01' ${where}`,
      `update invoices set bill_to = '{}' ${where}`,
      `update invoices set state = 'draft', number = null, reference = null, issued_on = null ${where}`,
      `delete from invoices ${where}`,
      `update invoice_lines set net_pence = 1, total_pence = 1 ${onLines}`,
      `update invoice_lines set appointment_id = null ${onLines}`,
      `delete from invoice_lines ${onLines}`,
      `insert into invoice_lines select practice_id, uuid(), invoice_id, 99, 'fee', null, null, 'x', 1, 0, 0, 'exempt', 0, 0, 0, 0 from invoice_lines ${onLines}`,
    ];
    await asDatabaseOwner(async (db) => {
      for (const statement of tries) {
        await expect(db.query(statement, [practiceId, id]), statement).rejects.toMatchObject({
          sqlState: "45000",
        });
      }
    });
  });

  it("lets go of its visits only once it is void, and of nothing else", async () => {
    const issued = await issuedFor(practice);
    await voidInvoice(accounts(), { invoiceId: issued.id, version: issued.version, reason: "Wrong payer" });
    const [line] = await practice.db.select().from(invoiceLines).where(eq(invoiceLines.invoiceId, issued.id));
    expect(line).toMatchObject({ appointmentId: null, netPence: 5200 });
    await asDatabaseOwner(async (db) => {
      const change = db.query("update invoice_lines set net_pence = 0, total_pence = 0 where id = ?", [
        line?.id,
      ]);
      await expect(change).rejects.toMatchObject({ sqlState: "45000" });
    });
  });

  it("leaves the counter to count on", async () => {
    const before = await practice.db
      .select()
      .from(invoiceCounters)
      .where(eq(invoiceCounters.practiceId, practice.practiceId));
    const numbers = await numbersOf(practice);
    expect(before[0]?.nextNumber).toBe((numbers.at(-1) ?? 0) + 1);
    expect(numbers).toEqual(Array.from({ length: numbers.length }, (_, i) => i + 1));
  });
});
