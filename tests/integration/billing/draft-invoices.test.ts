import {
  discardDraft,
  draftInvoicesFromVisits,
  editDraft,
  getInvoice,
  issueInvoice,
  listProducts,
  listToIssue,
  voidInvoice,
} from "@withy/services/billing";
import { beforeAll, describe, expect, it } from "vitest";
import { auditOf } from "../../support/audit-rows";
import { contextFor } from "../../support/contexts";
import { addInsurance, addPatient } from "../../support/people";
import { buildPractice, type TestPractice } from "../../support/practice";
import { attend, draftFor } from "./invoice-steps";

let practice: TestPractice;
let other: TestPractice;
beforeAll(async () => {
  practice = await buildPractice();
  other = await buildPractice({ name: "Cairn & Firth Clinics" });
});

const accounts = () => contextFor(practice, "accounts");
const waitingOf = async (patientId: string) => (await listToIssue(accounts(), { patientId })).visits;

describe("drafting from attended visits", () => {
  it("puts a patient's visits on one draft at the price list's price", async () => {
    const patient = await addPatient(practice);
    const first = await attend(practice, patient.id, "2026-11-10");
    await attend(practice, patient.id, "2026-11-17");
    await attend(practice, patient.id, "2026-12-08", { state: "booked" });
    expect(await waitingOf(patient.id)).toMatchObject([
      { pricePence: 5200, on: "2026-11-10" },
      { on: "2026-11-17" },
    ]);
    const drafted = await draftInvoicesFromVisits(accounts(), { patientId: patient.id });
    expect(drafted).toMatchObject({ visitsDrafted: 2, visitsWithoutPrice: 0 });
    const draft = await getInvoice(accounts(), { invoiceId: drafted.invoiceIds[0] ?? "" });
    expect(draft).toMatchObject({
      state: "draft",
      reference: null,
      totalPence: 10400,
      vatPence: 0,
      owedPence: 0,
    });
    expect(draft.lines[0]).toMatchObject({
      appointmentId: first.id,
      on: "2026-11-10",
      unitPence: 5200,
      vatTreatment: "exempt",
    });
    expect(await waitingOf(patient.id)).toEqual([]);
    expect((await auditOf(practice, draft.id)).map((a) => a.action)).toEqual(["invoice.drafted"]);
  });

  it("adds nothing when run again, and a later visit to the same draft", async () => {
    const patient = await addPatient(practice);
    await attend(practice, patient.id, "2026-11-10");
    const first = await draftInvoicesFromVisits(accounts(), { patientId: patient.id });
    expect(await draftInvoicesFromVisits(accounts(), { patientId: patient.id })).toMatchObject({
      invoiceIds: [],
      visitsDrafted: 0,
    });
    await attend(practice, patient.id, "2026-11-17");
    const again = await draftInvoicesFromVisits(accounts(), { patientId: patient.id });
    expect(again).toMatchObject({ invoiceIds: first.invoiceIds, visitsDrafted: 1 });
  });

  it("drafts each visit once when two people draft at once", async () => {
    const patient = await addPatient(practice);
    for (const day of ["2026-11-03", "2026-11-10", "2026-11-17"]) await attend(practice, patient.id, day);
    const runs = await Promise.all(
      Array.from({ length: 6 }, () => draftInvoicesFromVisits(accounts(), { patientId: patient.id })),
    );
    expect(runs.reduce((sum, run) => sum + run.visitsDrafted, 0)).toBe(3);
    const { drafts } = await listToIssue(accounts(), { patientId: patient.id });
    expect(drafts).toMatchObject([{ visits: 3, items: 0, totalPence: 15600 }]);
  });

  it("bills the insurer at its own price, apart from the patient", async () => {
    const patient = await addPatient(practice);
    await addInsurance(practice, patient.id);
    await attend(practice, patient.id, "2026-11-10", { serviceId: practice.services.initial.id });
    const { invoiceIds } = await draftInvoicesFromVisits(accounts(), { patientId: patient.id });
    const draft = await getInvoice(accounts(), { invoiceId: invoiceIds[0] ?? "" });
    expect(draft).toMatchObject({ totalPence: 6100, payer: { id: practice.payers.insurer.id } });
    expect(draft.billTo.name).toBe(draft.payer?.name);
  });

  it("leaves a visit without a price to a person", async () => {
    const young = await buildPractice();
    young.clock.set("2025-02-01T09:00:00Z");
    const ctx = contextFor(young, "accounts");
    const patient = await addPatient(young);
    await attend(young, patient.id, "2025-01-07");
    expect(await draftInvoicesFromVisits(ctx, { patientId: patient.id })).toEqual({
      invoiceIds: [],
      visitsDrafted: 0,
      visitsWithoutPrice: 1,
    });
    expect((await listToIssue(ctx, { patientId: patient.id })).visits).toMatchObject([{ pricePence: null }]);
  });

  it("lets a receptionist draft for her own site only, and no therapist or other practice at all", async () => {
    const patient = await addPatient(practice);
    await attend(practice, patient.id);
    const elsewhere = contextFor(practice, "tollhouseReceptionist");
    expect(await draftInvoicesFromVisits(elsewhere, { patientId: patient.id })).toMatchObject({
      visitsDrafted: 0,
    });
    await expect(draftInvoicesFromVisits(contextFor(practice, "therapist"), {})).rejects.toMatchObject({
      code: "forbidden",
    });
    expect((await listToIssue(contextFor(other, "accounts"), { patientId: patient.id })).visits).toEqual([]);
    const mine = await draftInvoicesFromVisits(contextFor(practice, "receptionist"), {
      patientId: patient.id,
    });
    expect(mine.visitsDrafted).toBe(1);
    const invoiceId = mine.invoiceIds[0] ?? "";
    for (const stranger of [elsewhere, contextFor(other, "accounts")]) {
      await expect(getInvoice(stranger, { invoiceId })).rejects.toMatchObject({ code: "not-found" });
    }
  });
});

describe("changing a draft", () => {
  it("adds a band at 20% and a discount on the visit", async () => {
    const draft = await draftFor(practice, accounts());
    const [product] = await listProducts(accounts(), { invoiceId: draft.id });
    expect(product).toMatchObject({ pricePence: 1250, vatTreatment: "standard" });
    const visit = draft.lines[0]?.id ?? "";
    const edited = await editDraft(accounts(), {
      invoiceId: draft.id,
      version: draft.version,
      lines: [
        { lineId: visit, quantity: 1, discountBasisPoints: 1000 },
        { productId: product?.id ?? "", quantity: 2, discountBasisPoints: 0 },
      ],
    });
    expect(edited.lines.map((l) => [l.netPence, l.vatPence])).toEqual([
      [4680, 0],
      [2500, 500],
    ]);
    expect(edited).toMatchObject({
      netPence: 7180,
      vatPence: 500,
      totalPence: 7680,
      version: draft.version + 1,
    });
    expect(edited.vatNote).toContain("£25.00 at 20% is £5.00.");
  });

  it("charges no VAT and prints none where the practice is not registered", async () => {
    const plain = await buildPractice({ isVatRegistered: false });
    const ctx = contextFor(plain, "accounts");
    const draft = await draftFor(plain, ctx);
    const [product] = await listProducts(ctx, { invoiceId: draft.id });
    const lines = [
      { lineId: draft.lines[0]?.id ?? "", quantity: 1, discountBasisPoints: 0 },
      { productId: product?.id ?? "", quantity: 1, discountBasisPoints: 0 },
    ];
    const edited = await editDraft(ctx, { invoiceId: draft.id, version: draft.version, lines });
    expect(edited).toMatchObject({ vatPence: 0, totalPence: 6450, isVatShown: false, vatNote: [] });
  });

  it("refuses an old version, a visit billed twice, and a discount above 100%", async () => {
    const draft = await draftFor(practice, accounts());
    const lineId = draft.lines[0]?.id ?? "";
    const edit = (line: { quantity: number; discountBasisPoints: number }, version = draft.version) =>
      editDraft(accounts(), { invoiceId: draft.id, version, lines: [{ lineId, ...line }] });
    await expect(edit({ quantity: 1, discountBasisPoints: 0 }, 99)).rejects.toMatchObject({ code: "stale" });
    await expect(edit({ quantity: 2, discountBasisPoints: 0 })).rejects.toMatchObject({ kind: "visit-once" });
    await expect(edit({ quantity: 1, discountBasisPoints: 10_001 })).rejects.toMatchObject({
      code: "invalid",
    });
    expect((await getInvoice(accounts(), { invoiceId: draft.id })).version).toBe(draft.version);
  });

  it("gives a visit back when its line goes or its draft is discarded", async () => {
    const draft = await draftFor(practice, accounts(), 2);
    const [kept] = draft.lines;
    const lines = [{ lineId: kept?.id ?? "", quantity: 1, discountBasisPoints: 0 }];
    const edited = await editDraft(accounts(), { invoiceId: draft.id, version: draft.version, lines });
    expect(await waitingOf(draft.patient.id)).toHaveLength(1);
    await discardDraft(accounts(), { invoiceId: draft.id, version: edited.version });
    expect(await waitingOf(draft.patient.id)).toHaveLength(2);
    await expect(getInvoice(accounts(), { invoiceId: draft.id })).rejects.toMatchObject({
      code: "not-found",
    });
  });
});

describe("making an invoice void", () => {
  it("keeps the number, frees the visits, and says why", async () => {
    const draft = await draftFor(practice, accounts());
    const issued = await issueInvoice(accounts(), { invoiceId: draft.id, version: draft.version });
    const reason = "Billed to the wrong payer";
    const input = { invoiceId: issued.id, version: issued.version, reason };
    const gone = await voidInvoice(accounts(), input);
    expect(gone).toMatchObject({
      state: "void",
      reference: issued.reference,
      owedPence: 0,
      voidReason: reason,
    });
    expect(await waitingOf(draft.patient.id)).toHaveLength(1);
    await expect(voidInvoice(accounts(), { ...input, version: gone.version })).rejects.toMatchObject({
      kind: "invoice-void",
    });
    const second = await draftInvoicesFromVisits(accounts(), { patientId: draft.patient.id });
    const again = await getInvoice(accounts(), { invoiceId: second.invoiceIds[0] ?? "" });
    expect(again.id).not.toBe(issued.id);
  });
});
