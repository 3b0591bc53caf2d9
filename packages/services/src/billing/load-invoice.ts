import type { InvoiceSums } from "@withy/billing/invoice-balance";
import type { Permission } from "@withy/core/access/permissions";
import { refused, stale } from "@withy/core/errors";
import { refusal } from "@withy/core/refusal";
import { invoices } from "@withy/db/schema";
import type { Context } from "../context";
import { loadRecord } from "../load-record";
import { requireReach } from "../reach";

export type InvoiceRow = typeof invoices.$inferSelect;

interface LoadOptions {
  lock?: boolean;
  /** The version that the screen saw; another one is refused as stale. */
  version?: number;
}

/** Loads an invoice inside the practice and inside the person's reach, or refuses as not found. */
export async function loadInvoice(
  ctx: Context,
  id: string,
  permission: Permission,
  options: LoadOptions = {},
): Promise<InvoiceRow> {
  const row = await loadRecord(ctx, invoices, id, "invoice", { lock: options.lock ?? false });
  requireReach(ctx, permission, row.siteId, "invoice");
  if (options.version !== undefined && options.version !== row.version) throw stale("invoice");
  return row;
}

export async function loadDraft(ctx: Context, id: string, version: number): Promise<InvoiceRow> {
  const row = await loadInvoice(ctx, id, "billing.draft", { lock: true, version });
  if (row.state !== "draft") {
    throw refused(
      refusal(
        "invoice-issued",
        "This invoice is issued and cannot be changed. Make it void and draft it again.",
      ),
    );
  }
  return row;
}

export const sumsOf = (row: InvoiceRow): InvoiceSums => ({
  totalPence: row.totalPence,
  paidPence: row.paidPence,
  creditedPence: row.creditedPence,
  pendingPence: row.pendingPence,
});
