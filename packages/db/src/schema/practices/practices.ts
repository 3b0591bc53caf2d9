import { int, json, mysqlTable, varchar } from "drizzle-orm/mysql-core";
import { instant, uuid } from "../../columns";

/** One tenant: a group of clinics that runs its own books. */
export const practices = mysqlTable("practices", {
  id: uuid("id").primaryKey(),
  name: varchar("name", { length: 120 }).notNull(),
  legalName: varchar("legal_name", { length: 160 }).notNull(),
  addressLines: json("address_lines").$type<string[]>().notNull(),
  postcode: varchar("postcode", { length: 10 }).notNull(),
  phone: varchar("phone", { length: 20 }).notNull(),
  email: varchar("email", { length: 254 }).notNull(),
  currency: varchar("currency", { length: 3 }).notNull().default("GBP"),
  zone: varchar("zone", { length: 40 }).notNull().default("Europe/London"),
  /** Absent: the practice is not registered, and its invoices show neither number nor VAT. */
  vatNumber: varchar("vat_number", { length: 20 }),
  invoicePrefix: varchar("invoice_prefix", { length: 6 }).notNull(),
  vatRounding: varchar("vat_rounding", { length: 20 })
    .$type<"line-nearest" | "line-down" | "invoice-nearest" | "invoice-down">()
    .notNull()
    .default("line-nearest"),
  paymentDays: int("payment_days").notNull().default(14),
  /** A cancellation with less notice than this is late. */
  noticeHours: int("notice_hours").notNull().default(24),
  /** Share of worked minutes that the owner aims to book, in whole percent. */
  utilisationTarget: int("utilisation_target").notNull().default(85),
  createdAt: instant("created_at").notNull(),
});
