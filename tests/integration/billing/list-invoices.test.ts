import type { AgeBucket } from "@withy/billing/ageing";
import type { ListInvoicesInput } from "@withy/contracts/billing";
import { sumPence } from "@withy/core/money";
import {
  draftInvoicesFromVisits,
  getAgedDebt,
  getInvoice,
  getPatientAccount,
  issueInvoice,
  listInvoices,
  takePayment,
  voidInvoice,
} from "@withy/services/billing";
import { beforeAll, describe, expect, it } from "vitest";
import { contextFor } from "../../support/contexts";
import { addInsurance, addPatient } from "../../support/people";
import { buildPractice, type TestPractice } from "../../support/practice";
import { attend, draftFor, issuedFor } from "./invoice-steps";

let practice: TestPractice;
const accounts = () => contextFor(practice, "accounts");
const list = (input: ListInvoicesInput) => listInvoices(accounts(), input);

/** Days on which invoices were issued; each falls due 14 days later. Today is 1 December. */
const issueDays = ["2026-08-10", "2026-09-10", "2026-10-10", "2026-11-10", "2026-11-17", "2026-11-24"];

beforeAll(async () => {
  practice = await buildPractice();
  for (const day of issueDays) {
    practice.clock.set("2026-12-01T09:00:00Z");
    const draft = await draftFor(practice, accounts());
    practice.clock.set(`${day}T12:00:00Z`);
    await issueInvoice(accounts(), { invoiceId: draft.id, version: draft.version });
  }
  practice.clock.set("2026-12-01T09:00:00Z");
});

describe("the list of invoices", () => {
  it("shows who owes, oldest due first, with the sums of page and filter", async () => {
    const page = await list({ pageSize: 2 });
    expect(page.rows.map((r) => [r.dueOn, r.daysPastDue, r.stateWord])).toEqual([
      ["2026-08-24", 99, "Overdue"],
      ["2026-09-24", 68, "Overdue"],
    ]);
    expect(page.pageSums).toEqual({ count: 2, totalPence: 10400, paidPence: 0, owedPence: 10400 });
    expect(page.filterSums).toEqual({ count: 6, totalPence: 31200, paidPence: 0, owedPence: 31200 });
    const last = await list({ pageSize: 4, page: 2 });
    expect(last.rows.map((r) => [r.dueOn, r.stateWord])).toEqual([
      ["2026-12-01", "Issued"],
      ["2026-12-08", "Issued"],
    ]);
  });

  it.each<[AgeBucket, number]>([
    ["not-due", 1],
    ["0-30", 2],
    ["31-60", 1],
    ["61-90", 1],
    ["over-90", 1],
  ])("keeps %i by age", async (age, count) => {
    expect((await list({ age })).filterSums.count).toBe(count);
  });

  it("agrees with the aged debt, bucket by bucket", async () => {
    const aged = await getAgedDebt(accounts(), {});
    for (const { bucket, count, pence } of aged.buckets) {
      const { filterSums } = await list({ age: bucket });
      expect({ count, pence }).toEqual({ count: filterSums.count, pence: filterSums.owedPence });
    }
    expect(sumPence(aged.buckets.map((b) => b.pence))).toBe(aged.totalPence);
    expect(aged.totalPence).toBe((await list({})).filterSums.owedPence);
    expect(aged.payers.map((p) => p.id)).toContain(practice.payers.insurer.id);
  });

  it("finds by number as typed and by name in either order", async () => {
    const patient = await addPatient(practice, { givenName: "Zoë", familyName: "Quill" });
    await addInsurance(practice, patient.id);
    await attend(practice, patient.id, "2026-11-20", { serviceId: practice.services.initial.id });
    const { invoiceIds } = await draftInvoicesFromVisits(accounts(), { patientId: patient.id });
    const draft = await getInvoice(accounts(), { invoiceId: invoiceIds[0] ?? "" });
    const { reference } = await issueInvoice(accounts(), { invoiceId: draft.id, version: draft.version });
    for (const find of [reference ?? "", "mp 7", "7", "zoe q", "quill z"]) {
      expect(
        (await list({ find })).rows.map((r) => r.reference),
        find,
      ).toEqual([reference]);
    }
    for (const find of ["%", "_", "nobody"]) expect((await list({ find })).rows, find).toEqual([]);
    const byPayer = await list({ payer: practice.payers.insurer.id });
    expect(byPayer.rows.map((r) => r.reference)).toEqual([reference]);
    expect((await list({ payer: "patients" })).filterSums.count).toBe(6);
    expect((await list({ patientId: patient.id })).filterSums.count).toBe(1);
  });

  it("moves an invoice between the kinds as it is paid and made void", async () => {
    const paid = await issuedFor(practice);
    await takePayment(accounts(), { invoiceId: paid.id, amountPence: 5200, method: "bank" });
    const gone = await issuedFor(practice);
    await voidInvoice(accounts(), { invoiceId: gone.id, version: gone.version, reason: "Wrong payer" });
    expect((await list({ kind: "paid" })).rows.map((r) => r.id)).toEqual([paid.id]);
    expect((await list({ kind: "void" })).filterSums).toMatchObject({ count: 1, owedPence: 0 });
    expect((await list({ kind: "owed", pageSize: 100 })).rows.map((r) => r.id)).not.toContain(paid.id);
    const all = await list({ kind: "all", pageSize: 100 });
    expect(all.rows.map((r) => r.id)).toEqual(expect.arrayContaining([paid.id, gone.id]));
    expect((await list({ kind: "overdue" })).rows.every((r) => r.daysPastDue > 0)).toBe(true);
  });

  it("shows a receptionist her own site and another practice nothing", async () => {
    const other = await buildPractice({ name: "Cairn & Firth Clinics" });
    expect((await listInvoices(contextFor(other, "accounts"), {})).filterSums.count).toBe(0);
    expect((await listInvoices(contextFor(practice, "tollhouseReceptionist"), {})).filterSums.count).toBe(0);
    expect((await listInvoices(contextFor(practice, "receptionist"), {})).filterSums.count).toBeGreaterThan(
      0,
    );
    await expect(listInvoices(contextFor(practice, "therapist"), {})).rejects.toMatchObject({
      code: "forbidden",
    });
  });
});

describe("a patient's account", () => {
  it("adds up what is owed, what is overdue and what waits", async () => {
    practice.clock.set("2026-11-02T09:00:00Z");
    const late = await issuedFor(practice);
    const patientId = late.patient.id;
    practice.clock.set("2026-12-01T09:00:00Z");
    await attend(practice, patientId, "2026-11-25");
    const { invoiceIds } = await draftInvoicesFromVisits(accounts(), { patientId });
    const draft = await getInvoice(accounts(), { invoiceId: invoiceIds[0] ?? "" });
    await issueInvoice(accounts(), { invoiceId: draft.id, version: draft.version });
    await takePayment(accounts(), { invoiceId: late.id, amountPence: 1200, method: "cash" });
    await attend(practice, patientId, "2026-11-30");
    const account = await getPatientAccount(accounts(), { patientId });
    expect(account).toMatchObject({ owedPence: 9200, overduePence: 4000, toInvoice: 1 });
    expect(account.invoices.map((i) => i.stateWord)).toEqual(["Issued", "Part paid"]);
    const other = await buildPractice({ name: "Cairn & Firth Clinics" });
    await expect(getPatientAccount(contextFor(other, "accounts"), { patientId })).rejects.toMatchObject({
      code: "not-found",
    });
  });
});
