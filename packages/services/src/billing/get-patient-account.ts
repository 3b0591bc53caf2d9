import { type PatientAccountView, patientAccountInput } from "@withy/contracts/billing";
import { sumPence } from "@withy/core/money";
import { dayOf } from "@withy/core/zoned-time";
import { patients } from "@withy/db/schema";
import { loadRecord } from "../load-record";
import { verb } from "../verb";
import { whereInvoices } from "./invoice-filter";
import { invoiceRows } from "./invoice-rows";
import { visitsToInvoice } from "./visits-to-invoice";

/** The most invoices that one patient's page shows; older ones are found in the list. */
const mostShown = 200;

/** A patient's money: every issued invoice, newest first, what is owed, and how many visits wait. */
export const getPatientAccount = verb(
  "billing.read",
  patientAccountInput,
  async (ctx, input): Promise<PatientAccountView> => {
    await loadRecord(ctx, patients, input.patientId, "patient");
    const today = dayOf(ctx.clock.now(), ctx.zone);
    const where = whereInvoices(
      ctx.practiceId,
      ctx.roles,
      { kind: "all", patientId: input.patientId },
      today,
    );
    const slice = { isOldestDueFirst: false, limit: mostShown, offset: 0 };
    const invoices = await invoiceRows(ctx, where, today, slice);
    const waiting = await visitsToInvoice(ctx, { patientId: input.patientId });
    return {
      patientId: input.patientId,
      owedPence: sumPence(invoices.map((i) => i.owedPence)),
      overduePence: sumPence(invoices.filter((i) => i.daysPastDue > 0).map((i) => i.owedPence)),
      toInvoice: waiting.length,
      invoices,
    };
  },
);
