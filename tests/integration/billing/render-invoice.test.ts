import {
  editDraft,
  issueInvoice,
  listProducts,
  renderInvoice,
  takePayment,
  voidInvoice,
} from "@withy/services/billing";
import { getDocument } from "pdfjs-dist/legacy/build/pdf.mjs";
import { beforeAll, describe, expect, it } from "vitest";
import { contextFor } from "../../support/contexts";
import { buildPractice, type TestPractice } from "../../support/practice";
import { draftFor, issuedFor } from "./invoice-steps";

let practice: TestPractice;
beforeAll(async () => {
  practice = await buildPractice();
});
const accounts = () => contextFor(practice, "accounts");

async function textOf(invoiceId: string, of = practice): Promise<string> {
  const { bytes } = await renderInvoice(contextFor(of, "accounts"), { invoiceId });
  const file = await getDocument({ data: new Uint8Array(bytes), verbosity: 0 }).promise;
  const texts: string[] = [];
  for (let n = 1; n <= file.numPages; n += 1) {
    const { items } = await (await file.getPage(n)).getTextContent();
    texts.push(items.flatMap((item) => ("str" in item ? [item.str] : [])).join(" "));
  }
  return texts.join(" ").replace(/\s+/g, " ");
}

describe("an invoice as a PDF", () => {
  it("prints what the law asks for and what was paid", async () => {
    const draft = await draftFor(practice, accounts());
    const [product] = await listProducts(accounts(), { invoiceId: draft.id });
    const lines = [
      { lineId: draft.lines[0]?.id ?? "", quantity: 1, discountBasisPoints: 1000 },
      { productId: product?.id ?? "", quantity: 2, discountBasisPoints: 0 },
    ];
    const edited = await editDraft(accounts(), { invoiceId: draft.id, version: draft.version, lines });
    const issued = await issueInvoice(accounts(), { invoiceId: draft.id, version: edited.version });
    await takePayment(accounts(), { invoiceId: issued.id, amountPence: 1200, method: "cash" });
    const text = await textOf(issued.id);
    for (const part of [
      issued.reference ?? "",
      "Marram Physiotherapy",
      draft.patient.name,
      "3 Net Loft Row",
      "Tuesday 1 December 2026",
      "Tuesday 15 December 2026",
      "less 10%",
      "exempt",
      "20%",
      "25.00",
      "5.00",
      "£76.80",
      "−£12.00",
      "£64.80",
      "VAT registration GB 999 0012 34",
      "£25.00 at 20% is £5.00",
      "Page 1 of 1",
    ]) {
      expect(text).toContain(part);
    }
  });

  it("names no VAT where the practice is not registered", async () => {
    const plain = await buildPractice({ isVatRegistered: false });
    const issued = await issuedFor(plain);
    expect(await textOf(issued.id, plain)).not.toMatch(/VAT|exempt|20%/);
  });

  it("says that a draft is no invoice yet, and that a void one asks for nothing", async () => {
    const draft = await draftFor(practice, accounts());
    expect(await textOf(draft.id)).toContain("Not issued yet");
    const issued = await issuedFor(practice);
    await voidInvoice(accounts(), { invoiceId: issued.id, version: issued.version, reason: "Wrong payer" });
    const text = await textOf(issued.id);
    expect(text).toContain("Void: Wrong payer");
    expect(text).not.toContain("How to pay");
  });

  it("keeps a long invoice's columns over its pages", async () => {
    const long = await draftFor(practice, accounts(), 26);
    const issued = await issueInvoice(accounts(), { invoiceId: long.id, version: long.version });
    const text = await textOf(issued.id);
    expect(text).toContain("Page 2 of 2");
    expect(text).toContain("£1,352.00");
  });

  it("is not for other practices", async () => {
    const issued = await issuedFor(practice);
    const other = await buildPractice({ name: "Cairn & Firth Clinics" });
    const read = renderInvoice(contextFor(other, "accounts"), { invoiceId: issued.id });
    await expect(read).rejects.toMatchObject({ code: "not-found" });
  });
});
