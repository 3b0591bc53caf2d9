import { foreignKey, mysqlTable, uniqueIndex, varchar } from "drizzle-orm/mysql-core";
import { instant, uuid } from "../../columns";
import { staffMembers } from "./staff-members";

/** How a person signs in. Apart from staff_members, so that a password hash is never near a list of names. */
export const staffAccounts = mysqlTable(
  "staff_accounts",
  {
    id: uuid("id").primaryKey(),
    practiceId: uuid("practice_id").notNull(),
    staffMemberId: uuid("staff_member_id").notNull(),
    /** Lower case. One address signs in to one practice. */
    email: varchar("email", { length: 254 }).notNull(),
    /** argon2id; absent until an invitation is taken up. */
    passwordHash: varchar("password_hash", { length: 200 }),
    passwordChangedAt: instant("password_changed_at"),
  },
  (t) => [
    uniqueIndex("staff_accounts_email").on(t.email),
    uniqueIndex("staff_accounts_member").on(t.practiceId, t.staffMemberId),
    foreignKey({
      name: "staff_accounts_member_fk",
      columns: [t.practiceId, t.staffMemberId],
      foreignColumns: [staffMembers.practiceId, staffMembers.id],
    }),
  ],
);
