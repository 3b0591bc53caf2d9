import { boolean, foreignKey, int, json, mysqlTable, primaryKey, varchar } from "drizzle-orm/mysql-core";
import { clockTime, instant, plainDate, tenantKey, uuid } from "../../columns";
import { practices } from "./practices";

/** A place where people are treated. Its zone and nation decide its clock and its bank holidays. */
export const sites = mysqlTable(
  "sites",
  {
    ...tenantKey(),
    name: varchar("name", { length: 80 }).notNull(),
    addressLines: json("address_lines").$type<string[]>().notNull(),
    postcode: varchar("postcode", { length: 10 }).notNull(),
    phone: varchar("phone", { length: 20 }).notNull(),
    zone: varchar("zone", { length: 40 }).notNull().default("Europe/London"),
    nation: varchar("nation", { length: 20 })
      .$type<"england" | "wales" | "scotland" | "northern-ireland">()
      .notNull()
      .default("england"),
    isStepFree: boolean("is_step_free").notNull().default(false),
    position: int("position").notNull().default(0),
    createdAt: instant("created_at").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({ name: "sites_practice", columns: [t.practiceId], foreignColumns: [practices.id] }),
  ],
);

/** When a site is open, by ISO weekday (1 Monday to 7 Sunday). No row: closed. */
export const siteHours = mysqlTable(
  "site_hours",
  {
    practiceId: uuid("practice_id").notNull(),
    siteId: uuid("site_id").notNull(),
    weekday: int("weekday").notNull(),
    opensAt: clockTime("opens_at").notNull(),
    closesAt: clockTime("closes_at").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.siteId, t.weekday] }),
    foreignKey({
      name: "site_hours_site",
      columns: [t.practiceId, t.siteId],
      foreignColumns: [sites.practiceId, sites.id],
    }),
  ],
);

/** A day on which a site stays shut although its hours say open. */
export const siteClosures = mysqlTable(
  "site_closures",
  {
    practiceId: uuid("practice_id").notNull(),
    siteId: uuid("site_id").notNull(),
    closedOn: plainDate("closed_on").notNull(),
    reason: varchar("reason", { length: 120 }).notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.siteId, t.closedOn] }),
    foreignKey({
      name: "site_closures_site",
      columns: [t.practiceId, t.siteId],
      foreignColumns: [sites.practiceId, sites.id],
    }),
  ],
);
