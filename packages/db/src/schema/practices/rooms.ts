import {
  boolean,
  foreignKey,
  index,
  int,
  json,
  mysqlTable,
  primaryKey,
  varchar,
} from "drizzle-orm/mysql-core";
import { tenantKey, uuid } from "../../columns";
import { sites } from "./sites";

/** A room that one appointment at a time can use. */
export const rooms = mysqlTable(
  "rooms",
  {
    ...tenantKey(),
    siteId: uuid("site_id").notNull(),
    name: varchar("name", { length: 40 }).notNull(),
    kind: varchar("kind", { length: 20 })
      .$type<"treatment" | "gym" | "video">()
      .notNull()
      .default("treatment"),
    /** Codes of what stands in it: "plinth-hydraulic", "parallel-bars". */
    equipment: json("equipment").$type<string[]>().notNull().default([]),
    isStepFree: boolean("is_step_free").notNull().default(false),
    position: int("position").notNull().default(0),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({
      name: "rooms_site",
      columns: [t.practiceId, t.siteId],
      foreignColumns: [sites.practiceId, sites.id],
    }),
    index("rooms_by_site").on(t.practiceId, t.siteId, t.position),
  ],
);
