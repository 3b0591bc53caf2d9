import type { InvoiceAddress } from "@withy/db/schema";
import { patients, payers } from "@withy/db/schema";
import type { Context } from "../context";
import { loadRecord } from "../load-record";

/** Whose name and address an invoice carries: the payer's where there is one, otherwise the patient's. */
export async function billToOf(
  ctx: Context,
  invoice: { patientId: string; payerId: string | null },
): Promise<InvoiceAddress> {
  if (invoice.payerId !== null) {
    const payer = await loadRecord(ctx, payers, invoice.payerId, "payer");
    return {
      name: payer.name,
      addressLines: payer.addressLines,
      postcode: payer.postcode,
      email: payer.email,
    };
  }
  const patient = await loadRecord(ctx, patients, invoice.patientId, "patient");
  return {
    name: `${patient.givenName} ${patient.familyName}`,
    addressLines: patient.addressLines,
    postcode: patient.postcode,
    email: patient.email,
  };
}
