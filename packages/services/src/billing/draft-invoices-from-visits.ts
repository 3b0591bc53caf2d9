import { mostVisitsAtOnce } from "@withy/billing/draft-groups";
import { type DraftedView, draftInvoicesInput } from "@withy/contracts/billing";
import { verb } from "../verb";
import { draftVisits } from "./draft-visits";
import { hasPrice, visitsToInvoice } from "./visits-to-invoice";

/**
 * Puts attended visits that wait onto drafts: one for each patient, payer and site, the open one if there is one.
 * The oldest go first, as many as one request may do. Running it again, or twice at once, adds nothing.
 */
export const draftInvoicesFromVisits = verb(
  "billing.draft",
  draftInvoicesInput,
  async (ctx, wish): Promise<DraftedView> => {
    const visits = await visitsToInvoice(ctx, wish);
    const priced = visits.filter(hasPrice);
    const { invoiceIds, visitsDrafted } = await draftVisits(ctx, priced.slice(0, mostVisitsAtOnce));
    return { invoiceIds, visitsDrafted, visitsWithoutPrice: visits.length - priced.length };
  },
);
