import { index, json, mysqlTable, primaryKey, varchar } from "drizzle-orm/mysql-core";
import { instant, uuid } from "../../columns";

/** The answer of a write that must not happen twice, found again when the browser repeats it. */
export const idempotencyKeys = mysqlTable(
  "idempotency_keys",
  {
    practiceId: uuid("practice_id").notNull(),
    key: varchar("key", { length: 64 }).notNull(),
    verb: varchar("verb", { length: 60 }).notNull(),
    staffMemberId: uuid("staff_member_id").notNull(),
    answer: json("answer").notNull(),
    createdAt: instant("created_at").notNull(),
  },
  (t) => [primaryKey({ columns: [t.practiceId, t.key] }), index("idempotency_keys_age").on(t.createdAt)],
);
