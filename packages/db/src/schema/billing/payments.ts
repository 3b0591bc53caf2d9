import {
  boolean,
  foreignKey,
  index,
  json,
  mysqlTable,
  primaryKey,
  uniqueIndex,
  varchar,
} from "drizzle-orm/mysql-core";
import { instant, pence, tenantKey, uuid } from "../../columns";
import { sites } from "../practices/sites";
import { invoices } from "./invoices";

/** Money received for one invoice. Never changed but for what has been given back (CHECK: at most the amount). */
export const payments = mysqlTable(
  "payments",
  {
    ...tenantKey(),
    invoiceId: uuid("invoice_id").notNull(),
    siteId: uuid("site_id").notNull(),
    method: varchar("method", { length: 10 }).$type<"cash" | "card" | "terminal" | "bank">().notNull(),
    amountPence: pence("amount_pence").notNull(),
    refundedPence: pence("refunded_pence").notNull().default(0),
    reference: varchar("reference", { length: 80 }),
    cardAttemptId: uuid("card_attempt_id"),
    receivedAt: instant("received_at").notNull(),
    takenBy: uuid("taken_by"),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({
      name: "payments_invoice",
      columns: [t.practiceId, t.invoiceId],
      foreignColumns: [invoices.practiceId, invoices.id],
    }),
    foreignKey({
      name: "payments_site",
      columns: [t.practiceId, t.siteId],
      foreignColumns: [sites.practiceId, sites.id],
    }),
    // A card session pays once, however often its event arrives.
    uniqueIndex("payments_card_once").on(t.practiceId, t.cardAttemptId),
    index("payments_by_invoice").on(t.practiceId, t.invoiceId, t.receivedAt),
    index("payments_by_day").on(t.practiceId, t.receivedAt),
  ],
);

/** Money given back from one payment. */
export const refunds = mysqlTable(
  "refunds",
  {
    ...tenantKey(),
    paymentId: uuid("payment_id").notNull(),
    invoiceId: uuid("invoice_id").notNull(),
    amountPence: pence("amount_pence").notNull(),
    reason: varchar("reason", { length: 200 }).notNull(),
    method: varchar("method", { length: 10 }).$type<"cash" | "card" | "terminal" | "bank">().notNull(),
    /** The invoice is owed again by this much, as after a payment taken by mistake; otherwise it is forgiven. */
    isOwedAgain: boolean("is_owed_again").notNull().default(false),
    /** "asked" from before the card service is called until it has answered. Cash is "done" at once. */
    state: varchar("state", { length: 8 }).$type<"asked" | "done" | "failed">().notNull(),
    cardReference: varchar("card_reference", { length: 80 }),
    refundedAt: instant("refunded_at").notNull(),
    refundedBy: uuid("refunded_by").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({
      name: "refunds_payment",
      columns: [t.practiceId, t.paymentId],
      foreignColumns: [payments.practiceId, payments.id],
    }),
    foreignKey({
      name: "refunds_invoice",
      columns: [t.practiceId, t.invoiceId],
      foreignColumns: [invoices.practiceId, invoices.id],
    }),
    index("refunds_by_invoice").on(t.practiceId, t.invoiceId),
    index("refunds_by_day").on(t.practiceId, t.refundedAt),
  ],
);

/** One try to be paid by card, written before the card service is called, so that none is ever unknown. */
export const cardAttempts = mysqlTable(
  "card_attempts",
  {
    ...tenantKey(),
    invoiceId: uuid("invoice_id").notNull(),
    amountPence: pence("amount_pence").notNull(),
    state: varchar("state", { length: 10 })
      .$type<"asked" | "open" | "paid" | "failed" | "expired">()
      .notNull(),
    sessionReference: varchar("session_reference", { length: 120 }),
    paymentReference: varchar("payment_reference", { length: 120 }),
    startedBy: uuid("started_by").notNull(),
    startedAt: instant("started_at").notNull(),
    settledAt: instant("settled_at"),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({
      name: "card_attempts_invoice",
      columns: [t.practiceId, t.invoiceId],
      foreignColumns: [invoices.practiceId, invoices.id],
    }),
    // A webhook knows only the session.
    uniqueIndex("card_attempts_session").on(t.sessionReference),
    index("card_attempts_by_invoice").on(t.practiceId, t.invoiceId, t.startedAt),
    index("card_attempts_open").on(t.state, t.startedAt),
  ],
);

/** Card events by the service's own id: a repeat is recognised and answered without effect. */
export const cardEvents = mysqlTable("card_events", {
  id: varchar("id", { length: 120 }).primaryKey(),
  kind: varchar("kind", { length: 60 }).notNull(),
  receivedAt: instant("received_at").notNull(),
  detail: json("detail").$type<Record<string, string | number | null>>().notNull(),
});
