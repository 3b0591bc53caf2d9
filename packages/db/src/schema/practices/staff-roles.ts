import type { Role } from "@withy/core/access/roles";
import { foreignKey, index, mysqlTable, primaryKey, varchar } from "drizzle-orm/mysql-core";
import { tenantKey, uuid } from "../../columns";
import { sites } from "./sites";
import { staffMembers } from "./staff-members";

/** A role as a person holds it: at one site, or at every site where site_id is null. */
export const staffRoles = mysqlTable(
  "staff_roles",
  {
    ...tenantKey(),
    staffMemberId: uuid("staff_member_id").notNull(),
    siteId: uuid("site_id"),
    role: varchar("role", { length: 20 }).$type<Role>().notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({
      name: "staff_roles_member",
      columns: [t.practiceId, t.staffMemberId],
      foreignColumns: [staffMembers.practiceId, staffMembers.id],
    }),
    foreignKey({
      name: "staff_roles_site",
      columns: [t.practiceId, t.siteId],
      foreignColumns: [sites.practiceId, sites.id],
    }),
    // Read on every request beside the session.
    index("staff_roles_by_member").on(t.practiceId, t.staffMemberId),
  ],
);
