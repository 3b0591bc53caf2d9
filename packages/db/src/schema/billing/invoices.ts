import {
  foreignKey,
  index,
  int,
  json,
  mysqlTable,
  primaryKey,
  uniqueIndex,
  varchar,
} from "drizzle-orm/mysql-core";
import { instant, pence, plainDate, tenantKey, uuid } from "../../columns";
import { appointments } from "../diary/appointments";
import { patients } from "../patients/patients";
import { payers } from "../patients/payers";
import { sites } from "../practices/sites";
import { products } from "./prices";

export type InvoiceStateCode = "draft" | "issued" | "part-paid" | "paid" | "void" | "refunded";

export interface InvoiceAddress {
  name: string;
  addressLines: string[];
  postcode: string | null;
  email: string | null;
}

/** An invoice. From the moment it is issued its text and sums cannot change (a trigger); what was paid can. */
export const invoices = mysqlTable(
  "invoices",
  {
    ...tenantKey(),
    /** Gapless in the practice; null while it is a draft. */
    number: int("number"),
    /** The number as printed, for example SG-04187. */
    reference: varchar("reference", { length: 20 }),
    state: varchar("state", { length: 10 }).$type<InvoiceStateCode>().notNull().default("draft"),
    patientId: uuid("patient_id").notNull(),
    payerId: uuid("payer_id"),
    siteId: uuid("site_id").notNull(),
    billTo: json("bill_to").$type<InvoiceAddress>().notNull(),
    issuedOn: plainDate("issued_on"),
    dueOn: plainDate("due_on"),
    netPence: pence("net_pence").notNull().default(0),
    vatPence: pence("vat_pence").notNull().default(0),
    totalPence: pence("total_pence").notNull().default(0),
    /** Money received and not given back. */
    paidPence: pence("paid_pence").notNull().default(0),
    /** The part of the total that is no longer asked for, since its money was given back for good. */
    creditedPence: pence("credited_pence").notNull().default(0),
    /** Held by open card payments. CHECK: paid, credited and pending together are never above the total. */
    pendingPence: pence("pending_pence").notNull().default(0),
    vatRounding: varchar("vat_rounding", { length: 20 }).notNull(),
    /** As printed: null where the practice is not registered. */
    vatNumber: varchar("vat_number", { length: 20 }),
    voidReason: varchar("void_reason", { length: 200 }),
    version: int("version").notNull().default(1),
    createdAt: instant("created_at").notNull(),
    createdBy: uuid("created_by").notNull(),
    issuedAt: instant("issued_at"),
    issuedBy: uuid("issued_by"),
    updatedAt: instant("updated_at").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({
      name: "invoices_patient",
      columns: [t.practiceId, t.patientId],
      foreignColumns: [patients.practiceId, patients.id],
    }),
    foreignKey({
      name: "invoices_payer",
      columns: [t.practiceId, t.payerId],
      foreignColumns: [payers.practiceId, payers.id],
    }),
    foreignKey({
      name: "invoices_site",
      columns: [t.practiceId, t.siteId],
      foreignColumns: [sites.practiceId, sites.id],
    }),
    uniqueIndex("invoices_number").on(t.practiceId, t.number),
    uniqueIndex("invoices_reference").on(t.practiceId, t.reference),
    index("invoices_by_patient").on(t.practiceId, t.patientId, t.createdAt),
    // Accounts' list: what is owed, oldest first; drafts.
    index("invoices_by_state").on(t.practiceId, t.state, t.dueOn),
    // The month's income.
    index("invoices_by_issue").on(t.practiceId, t.issuedOn),
  ],
);

/** One line. A visit can stand on one live line only. */
export const invoiceLines = mysqlTable(
  "invoice_lines",
  {
    ...tenantKey(),
    invoiceId: uuid("invoice_id").notNull(),
    position: int("position").notNull(),
    kind: varchar("kind", { length: 10 }).$type<"visit" | "product" | "fee">().notNull(),
    appointmentId: uuid("appointment_id"),
    productId: uuid("product_id"),
    description: varchar("description", { length: 200 }).notNull(),
    quantity: int("quantity").notNull().default(1),
    unitPence: pence("unit_pence").notNull(),
    discountBasisPoints: int("discount_basis_points").notNull().default(0),
    vatTreatment: varchar("vat_treatment", { length: 15 }).notNull(),
    vatBasisPoints: int("vat_basis_points").notNull(),
    netPence: pence("net_pence").notNull(),
    vatPence: pence("vat_pence").notNull(),
    totalPence: pence("total_pence").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({
      name: "invoice_lines_invoice",
      columns: [t.practiceId, t.invoiceId],
      foreignColumns: [invoices.practiceId, invoices.id],
    }),
    foreignKey({
      name: "invoice_lines_visit",
      columns: [t.practiceId, t.appointmentId],
      foreignColumns: [appointments.practiceId, appointments.id],
    }),
    foreignKey({
      name: "invoice_lines_product",
      columns: [t.practiceId, t.productId],
      foreignColumns: [products.practiceId, products.id],
    }),
    uniqueIndex("invoice_lines_visit_once").on(t.practiceId, t.appointmentId),
    uniqueIndex("invoice_lines_order").on(t.practiceId, t.invoiceId, t.position),
  ],
);

/** The next number of a series, updated inside the issuing transaction: that row's lock is what makes it gapless. */
export const invoiceCounters = mysqlTable(
  "invoice_counters",
  {
    practiceId: uuid("practice_id").notNull(),
    series: varchar("series", { length: 12 }).notNull(),
    nextNumber: int("next_number").notNull(),
  },
  (t) => [primaryKey({ columns: [t.practiceId, t.series] })],
);
