import { boolean, foreignKey, index, mysqlTable, primaryKey, varchar } from "drizzle-orm/mysql-core";
import { pence, plainDate, tenantKey, uuid } from "../../columns";
import { services } from "../diary/services";
import { payers } from "../patients/payers";
import { practices } from "../practices/practices";
import { sites } from "../practices/sites";

export type VatTreatmentCode = "exempt" | "standard" | "zero" | "outside-scope";

/** Something sold that is not a visit: a roller, a band, a brace. */
export const products = mysqlTable(
  "products",
  {
    ...tenantKey(),
    name: varchar("name", { length: 80 }).notNull(),
    vatTreatment: varchar("vat_treatment", { length: 15 })
      .$type<VatTreatmentCode>()
      .notNull()
      .default("standard"),
    isActive: boolean("is_active").notNull().default(true),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({ name: "products_practice", columns: [t.practiceId], foreignColumns: [practices.id] }),
  ],
);

/** A net price of one service or product; the most particular row that is valid on the day wins. */
export const prices = mysqlTable(
  "prices",
  {
    ...tenantKey(),
    serviceId: uuid("service_id"),
    productId: uuid("product_id"),
    /** Null: at every site. */
    siteId: uuid("site_id"),
    /** Null: whoever pays. */
    payerId: uuid("payer_id"),
    amountPence: pence("amount_pence").notNull(),
    vatTreatment: varchar("vat_treatment", { length: 15 }).$type<VatTreatmentCode>().notNull(),
    validFrom: plainDate("valid_from").notNull(),
    validUntil: plainDate("valid_until"),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({
      name: "prices_service",
      columns: [t.practiceId, t.serviceId],
      foreignColumns: [services.practiceId, services.id],
    }),
    foreignKey({
      name: "prices_product",
      columns: [t.practiceId, t.productId],
      foreignColumns: [products.practiceId, products.id],
    }),
    foreignKey({
      name: "prices_site",
      columns: [t.practiceId, t.siteId],
      foreignColumns: [sites.practiceId, sites.id],
    }),
    foreignKey({
      name: "prices_payer",
      columns: [t.practiceId, t.payerId],
      foreignColumns: [payers.practiceId, payers.id],
    }),
    index("prices_by_service").on(t.practiceId, t.serviceId, t.validFrom),
    index("prices_by_product").on(t.practiceId, t.productId, t.validFrom),
  ],
);
