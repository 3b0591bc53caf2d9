import { boolean, foreignKey, int, json, mysqlTable, primaryKey, varchar } from "drizzle-orm/mysql-core";
import { tenantKey, uuid } from "../../columns";
import { practices } from "../practices/practices";
import { staffMembers } from "../practices/staff-members";

/** What can be booked, for how long, and what the room needs afterwards. Lengths are multiples of five. */
export const services = mysqlTable(
  "services",
  {
    ...tenantKey(),
    name: varchar("name", { length: 80 }).notNull(),
    kind: varchar("kind", { length: 12 }).$type<"initial" | "follow-up" | "class" | "other">().notNull(),
    durationMinutes: int("duration_minutes").notNull(),
    cleanDownMinutes: int("clean_down_minutes").notNull().default(0),
    roomKind: varchar("room_kind", { length: 20 })
      .$type<"treatment" | "gym" | "video">()
      .notNull()
      .default("treatment"),
    /** Codes of equipment that the room must have; empty for none. */
    needsEquipment: json("needs_equipment").$type<string[]>().notNull().default([]),
    isActive: boolean("is_active").notNull().default(true),
    position: int("position").notNull().default(0),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({ name: "services_practice", columns: [t.practiceId], foreignColumns: [practices.id] }),
  ],
);

/** Which therapists give a service. */
export const serviceTherapists = mysqlTable(
  "service_therapists",
  {
    practiceId: uuid("practice_id").notNull(),
    serviceId: uuid("service_id").notNull(),
    staffMemberId: uuid("staff_member_id").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.serviceId, t.staffMemberId] }),
    foreignKey({
      name: "service_therapists_service",
      columns: [t.practiceId, t.serviceId],
      foreignColumns: [services.practiceId, services.id],
    }),
    foreignKey({
      name: "service_therapists_member",
      columns: [t.practiceId, t.staffMemberId],
      foreignColumns: [staffMembers.practiceId, staffMembers.id],
    }),
  ],
);
