import { choosePrice } from "@withy/billing/prices";
import { invoiceIdInput, type ProductView } from "@withy/contracts/billing";
import { dayOf } from "@withy/core/zoned-time";
import { products } from "@withy/db/schema";
import { and, asc, eq } from "drizzle-orm";
import { verb } from "../verb";
import { loadInvoice } from "./load-invoice";
import { loadPrices } from "./visits-to-invoice";

/** The goods that can be put on this invoice today, at the price that holds for its site and payer. */
export const listProducts = verb(
  "billing.draft",
  invoiceIdInput,
  async (ctx, input): Promise<ProductView[]> => {
    const invoice = await loadInvoice(ctx, input.invoiceId, "billing.draft");
    const rows = await ctx.db
      .select()
      .from(products)
      .where(and(eq(products.practiceId, ctx.practiceId), eq(products.isActive, true)))
      .orderBy(asc(products.name));
    const list = await loadPrices(ctx);
    const on = dayOf(ctx.clock.now(), ctx.zone);
    return rows.flatMap(({ id, name }) => {
      const price = choosePrice(list, { itemId: id, siteId: invoice.siteId, payerId: invoice.payerId, on });
      return price ? [{ id, name, pricePence: price.amountPence, vatTreatment: price.vatTreatment }] : [];
    });
  },
);
