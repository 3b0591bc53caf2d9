import { index, int, json, mysqlTable, uniqueIndex, varchar } from "drizzle-orm/mysql-core";
import { instant, uuid } from "../../columns";

/**
 * A message to send, written in the transaction that causes it. The worker drains it; the key is global because
 * one worker serves every practice.
 */
export const outboxMessages = mysqlTable(
  "outbox_messages",
  {
    id: uuid("id").primaryKey(),
    practiceId: uuid("practice_id").notNull(),
    channel: varchar("channel", { length: 6 }).$type<"email">().notNull(),
    /** Which template renders it, for example "booking-confirmed". */
    template: varchar("template", { length: 40 }).notNull(),
    toAddress: varchar("to_address", { length: 254 }).notNull(),
    payload: json("payload").$type<Record<string, unknown>>().notNull(),
    /** The row that it speaks of; looked at again before sending. */
    aboutKind: varchar("about_kind", { length: 20 }).notNull(),
    aboutId: uuid("about_id").notNull(),
    patientId: uuid("patient_id"),
    /** Same key, same message: a repeated cause does not send twice. */
    dedupeKey: varchar("dedupe_key", { length: 120 }).notNull(),
    state: varchar("state", { length: 8 })
      .$type<"waiting" | "claimed" | "sent" | "failed" | "dropped">()
      .notNull()
      .default("waiting"),
    dueAt: instant("due_at").notNull(),
    attempts: int("attempts").notNull().default(0),
    claimedAt: instant("claimed_at"),
    claimedBy: varchar("claimed_by", { length: 40 }),
    sentAt: instant("sent_at"),
    /** SMTP code or our own reason; never an address or a name. */
    lastError: varchar("last_error", { length: 200 }),
    createdAt: instant("created_at").notNull(),
  },
  (t) => [
    index("outbox_messages_due").on(t.state, t.dueAt),
    index("outbox_messages_by_practice").on(t.practiceId, t.createdAt),
    // A patient's timeline.
    index("outbox_messages_by_patient").on(t.practiceId, t.patientId, t.createdAt),
    index("outbox_messages_by_subject").on(t.practiceId, t.aboutKind, t.aboutId),
    uniqueIndex("outbox_messages_once").on(t.practiceId, t.dedupeKey),
  ],
);
