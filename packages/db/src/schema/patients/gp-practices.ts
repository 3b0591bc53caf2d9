import { foreignKey, index, json, mysqlTable, primaryKey, varchar } from "drizzle-orm/mysql-core";
import { tenantKey } from "../../columns";
import { practices } from "../practices/practices";

/** A family doctor's surgery, to which letters go. */
export const gpPractices = mysqlTable(
  "gp_practices",
  {
    ...tenantKey(),
    name: varchar("name", { length: 120 }).notNull(),
    addressLines: json("address_lines").$type<string[]>().notNull(),
    postcode: varchar("postcode", { length: 10 }).notNull(),
    phone: varchar("phone", { length: 20 }),
    email: varchar("email", { length: 254 }),
    odsCode: varchar("ods_code", { length: 9 }),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({ name: "gp_practices_practice", columns: [t.practiceId], foreignColumns: [practices.id] }),
    index("gp_practices_by_name").on(t.practiceId, t.name),
  ],
);
