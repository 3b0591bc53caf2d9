import type { InvoiceAddress } from "@withy/db/schema";
import { patients, payers } from "@withy/db/schema";
import { and, eq, inArray } from "drizzle-orm";
import type { Context } from "../context";
import { loadRecord } from "../load-record";

type Billed = { readonly patientId: string; readonly payerId: string | null };

/** Whose name and address an invoice carries: the payer's where there is one, otherwise the patient's. */
export async function billToOf(ctx: Context, invoice: Billed): Promise<InvoiceAddress> {
  return invoice.payerId === null
    ? addressOfPatient(await loadRecord(ctx, patients, invoice.patientId, "patient"))
    : addressOfPayer(await loadRecord(ctx, payers, invoice.payerId, "payer"));
}

/** The same for many at once, by the id of the payer or, where there is none, of the patient. */
export async function billTosOf(
  ctx: Context,
  invoices: readonly Billed[],
): Promise<Map<string, InvoiceAddress>> {
  const payerIds = [...new Set(invoices.flatMap(({ payerId }) => payerId ?? []))];
  const patientIds = [...new Set(invoices.flatMap(({ payerId, patientId }) => (payerId ? [] : patientId)))];
  const found = new Map<string, InvoiceAddress>();
  if (payerIds.length > 0) {
    const ofThese = and(eq(payers.practiceId, ctx.practiceId), inArray(payers.id, payerIds));
    for (const row of await ctx.db.select().from(payers).where(ofThese))
      found.set(row.id, addressOfPayer(row));
  }
  if (patientIds.length > 0) {
    const ofThese = and(eq(patients.practiceId, ctx.practiceId), inArray(patients.id, patientIds));
    for (const row of await ctx.db.select().from(patients).where(ofThese))
      found.set(row.id, addressOfPatient(row));
  }
  return found;
}

function addressOfPayer(payer: typeof payers.$inferSelect): InvoiceAddress {
  const { name, addressLines, postcode, email } = payer;
  return { name, addressLines, postcode, email };
}

function addressOfPatient(patient: typeof patients.$inferSelect): InvoiceAddress {
  const { givenName, familyName, addressLines, postcode, email } = patient;
  return { name: `${givenName} ${familyName}`, addressLines, postcode, email };
}
