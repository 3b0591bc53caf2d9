import { foreignKey, mysqlTable, uniqueIndex, varchar } from "drizzle-orm/mysql-core";
import { instant, uuid } from "../../columns";
import { staffMembers } from "./staff-members";

/** A link sent by e-mail to set a password. Only the SHA-256 of the token is kept; it works once. */
export const accountTokens = mysqlTable(
  "account_tokens",
  {
    id: uuid("id").primaryKey(),
    practiceId: uuid("practice_id").notNull(),
    staffMemberId: uuid("staff_member_id").notNull(),
    purpose: varchar("purpose", { length: 12 }).$type<"reset" | "invitation">().notNull(),
    tokenHash: varchar("token_hash", { length: 64 }).notNull(),
    createdAt: instant("created_at").notNull(),
    expiresAt: instant("expires_at").notNull(),
    usedAt: instant("used_at"),
  },
  (t) => [
    uniqueIndex("account_tokens_hash").on(t.tokenHash),
    foreignKey({
      name: "account_tokens_member",
      columns: [t.practiceId, t.staffMemberId],
      foreignColumns: [staffMembers.practiceId, staffMembers.id],
    }),
  ],
);
