import { foreignKey, index, mysqlTable, varchar } from "drizzle-orm/mysql-core";
import { instant, uuid } from "../../columns";
import { staffMembers } from "./staff-members";

/** One signed-in browser. Read on every request: ending a session works at once. */
export const sessions = mysqlTable(
  "sessions",
  {
    id: uuid("id").primaryKey(),
    practiceId: uuid("practice_id").notNull(),
    staffMemberId: uuid("staff_member_id").notNull(),
    createdAt: instant("created_at").notNull(),
    /** Written at most once a minute. */
    lastSeenAt: instant("last_seen_at").notNull(),
    expiresAt: instant("expires_at").notNull(),
    revokedAt: instant("revoked_at"),
    userAgent: varchar("user_agent", { length: 200 }).notNull().default(""),
    /** The site whose desk this browser stands at. */
    deskSiteId: uuid("desk_site_id").notNull(),
  },
  (t) => [
    foreignKey({
      name: "sessions_member",
      columns: [t.practiceId, t.staffMemberId],
      foreignColumns: [staffMembers.practiceId, staffMembers.id],
    }),
    index("sessions_by_member").on(t.practiceId, t.staffMemberId, t.createdAt),
  ],
);
