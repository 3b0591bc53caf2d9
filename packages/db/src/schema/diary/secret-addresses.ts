import { foreignKey, index, mysqlTable, primaryKey, uniqueIndex, varchar } from "drizzle-orm/mysql-core";
import { instant, sha256, tenantKey, uuid } from "../../columns";
import { practices } from "../practices/practices";
import { staffMembers } from "../practices/staff-members";

/** The secret address of one therapist's calendar feed. Only the token's hash is kept. */
export const calendarFeeds = mysqlTable(
  "calendar_feeds",
  {
    ...tenantKey(),
    staffMemberId: uuid("staff_member_id").notNull(),
    tokenHash: sha256("token_hash").notNull(),
    createdAt: instant("created_at").notNull(),
    lastReadAt: instant("last_read_at"),
    revokedAt: instant("revoked_at"),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({
      name: "calendar_feeds_member",
      columns: [t.practiceId, t.staffMemberId],
      foreignColumns: [staffMembers.practiceId, staffMembers.id],
    }),
    uniqueIndex("calendar_feeds_token").on(t.tokenHash),
    index("calendar_feeds_by_member").on(t.practiceId, t.staffMemberId),
  ],
);

/** A key with which another program may read the diary. Only the key's hash is kept. */
export const apiKeys = mysqlTable(
  "api_keys",
  {
    ...tenantKey(),
    name: varchar("name", { length: 80 }).notNull(),
    keyHash: sha256("key_hash").notNull(),
    createdAt: instant("created_at").notNull(),
    createdBy: uuid("created_by").notNull(),
    lastUsedAt: instant("last_used_at"),
    revokedAt: instant("revoked_at"),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({ name: "api_keys_practice", columns: [t.practiceId], foreignColumns: [practices.id] }),
    uniqueIndex("api_keys_hash").on(t.keyHash),
  ],
);
