import { checkDiscount } from "@withy/billing/discount";
import { choosePrice } from "@withy/billing/prices";
import { type DraftLineInput, editDraftInput, type InvoiceView } from "@withy/contracts/billing";
import { notFound, refused, refuseIf } from "@withy/core/errors";
import { newId } from "@withy/core/ids";
import { refusal } from "@withy/core/refusal";
import { dayOf } from "@withy/core/zoned-time";
import { invoiceLines, products } from "@withy/db/schema";
import { and, asc, eq, notInArray } from "drizzle-orm";
import { recordAudit } from "../audit";
import type { Context } from "../context";
import { loadRecord } from "../load-record";
import { inTransaction } from "../transaction";
import { verb } from "../verb";
import { viewInvoice } from "./get-invoice";
import { type InvoiceRow, loadDraft } from "./load-invoice";
import { reckonDraft } from "./reckon-draft";
import { loadPrices } from "./visits-to-invoice";

type LineRow = typeof invoiceLines.$inferSelect;

/** Replaces a draft's lines by the list given: kept lines, added products; what is left out goes. */
export const editDraft = verb("billing.draft", editDraftInput, async (ctx, input): Promise<InvoiceView> => {
  await inTransaction(ctx, async (tx) => {
    const draft = await loadDraft(tx, input.invoiceId, input.version);
    const ofDraft = and(eq(invoiceLines.practiceId, tx.practiceId), eq(invoiceLines.invoiceId, draft.id));
    const before = await tx.db.select().from(invoiceLines).where(ofDraft).orderBy(asc(invoiceLines.position));
    const kept = input.lines.flatMap((line) => ("lineId" in line ? [line.lineId] : []));
    await tx.db
      .delete(invoiceLines)
      .where(kept.length === 0 ? ofDraft : and(ofDraft, notInArray(invoiceLines.id, kept)));
    let position = before.at(-1)?.position ?? 0;
    for (const [i, line] of input.lines.entries()) {
      if ("lineId" in line) await keepLine(tx, before, line, i);
      else {
        position += 1;
        await addProduct(tx, draft, line, position);
      }
    }
    await reckonDraft(tx, draft);
    await recordAudit(tx, {
      action: "invoice.edited",
      subjectKind: "invoice",
      subjectId: draft.id,
      patientId: draft.patientId,
      siteId: draft.siteId,
      detail: { linesBefore: before.length, linesAfter: input.lines.length },
    });
  });
  return viewInvoice(ctx, input.invoiceId);
});

async function keepLine(
  tx: Context,
  before: readonly LineRow[],
  line: Extract<DraftLineInput, { lineId: string }>,
  index: number,
): Promise<void> {
  const row = before.find((l) => l.id === line.lineId);
  if (!row) throw notFound("line");
  if (row.kind === "visit" && line.quantity !== 1) {
    throw refused(
      refusal("visit-once", "A visit is billed once. Set its quantity to 1.", `lines.${index}.quantity`),
    );
  }
  refuseIf(
    checkDiscount(row.unitPence * line.quantity, { kind: "percent", basisPoints: line.discountBasisPoints }),
  );
  await tx.db
    .update(invoiceLines)
    .set({ quantity: line.quantity, discountBasisPoints: line.discountBasisPoints })
    .where(and(eq(invoiceLines.practiceId, tx.practiceId), eq(invoiceLines.id, row.id)));
}

async function addProduct(
  tx: Context,
  draft: InvoiceRow,
  line: Extract<DraftLineInput, { productId: string }>,
  position: number,
): Promise<void> {
  const product = await loadRecord(tx, products, line.productId, "product");
  const price = choosePrice(await loadPrices(tx), {
    itemId: product.id,
    siteId: draft.siteId,
    payerId: draft.payerId,
    on: dayOf(tx.clock.now(), tx.zone),
  });
  if (!product.isActive || !price) {
    throw refused(
      refusal("product-without-price", "This item has no price today. Add one to the price list first."),
    );
  }
  await tx.db.insert(invoiceLines).values({
    practiceId: tx.practiceId,
    id: newId(),
    invoiceId: draft.id,
    position,
    kind: "product",
    productId: product.id,
    description: product.name,
    quantity: line.quantity,
    unitPence: price.amountPence,
    discountBasisPoints: line.discountBasisPoints,
    vatTreatment: price.vatTreatment,
    vatBasisPoints: 0,
    netPence: 0,
    vatPence: 0,
    totalPence: 0,
  });
}
