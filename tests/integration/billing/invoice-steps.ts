import type { InvoiceView } from "@withy/contracts/billing";
import { draftInvoicesFromVisits, getInvoice, issueInvoice } from "@withy/services/billing";
import type { Context } from "@withy/services/context";
import { contextFor } from "../../support/contexts";
import { addAppointment, type VisitValues } from "../../support/diary-rows";
import { addPatient } from "../../support/people";
import type { TestPractice } from "../../support/practice";

let attended = 0;

/** A visit that was attended; each in a half-hour of its own, so that none overlaps. */
export async function attend(
  practice: TestPractice,
  patientId: string,
  day = "2026-11-24",
  values: VisitValues = {},
) {
  attended += 1;
  const half = attended % 40;
  const time = `${String(Math.floor(half / 2)).padStart(2, "0")}:${half % 2 === 0 ? "00" : "30"}`;
  const state = "fulfilled" as const;
  return addAppointment(practice, {
    patientId,
    day,
    time,
    values: { state, cleanDownMinutes: 0, ...values },
  });
}

/** A draft for a patient of its own with this many attended follow-ups at £52.00. */
export async function draftFor(practice: TestPractice, ctx: Context, visits = 1): Promise<InvoiceView> {
  const patient = await addPatient(practice);
  for (let i = 0; i < visits; i += 1) {
    await attend(practice, patient.id, `2026-11-${String((attended % 28) + 1).padStart(2, "0")}`);
  }
  const { invoiceIds } = await draftInvoicesFromVisits(ctx, { patientId: patient.id });
  return getInvoice(ctx, { invoiceId: invoiceIds[0] ?? "" });
}

export async function issuedFor(practice: TestPractice, visits = 1): Promise<InvoiceView> {
  const ctx = contextFor(practice, "accounts");
  const draft = await draftFor(practice, ctx, visits);
  return issueInvoice(ctx, { invoiceId: draft.id, version: draft.version });
}
