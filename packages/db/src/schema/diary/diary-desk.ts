import {
  boolean,
  foreignKey,
  index,
  json,
  mysqlTable,
  primaryKey,
  uniqueIndex,
  varchar,
} from "drizzle-orm/mysql-core";
import { instant, tenantKey, uuid } from "../../columns";
import { sites } from "../practices/sites";
import { staffMembers } from "../practices/staff-members";
import { appointments } from "./appointments";

/** A time that somebody is booking right now: hatched for everyone else until it expires. One for each person. */
export const diaryHolds = mysqlTable(
  "diary_holds",
  {
    ...tenantKey(),
    heldBy: uuid("held_by").notNull(),
    siteId: uuid("site_id").notNull(),
    therapistId: uuid("therapist_id").notNull(),
    startsAt: instant("starts_at").notNull(),
    endsAt: instant("ends_at").notNull(),
    expiresAt: instant("expires_at").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({
      name: "diary_holds_member",
      columns: [t.practiceId, t.heldBy],
      foreignColumns: [staffMembers.practiceId, staffMembers.id],
    }),
    foreignKey({
      name: "diary_holds_site",
      columns: [t.practiceId, t.siteId],
      foreignColumns: [sites.practiceId, sites.id],
    }),
    uniqueIndex("diary_holds_one_each").on(t.practiceId, t.heldBy),
    // The live picture of a site.
    index("diary_holds_by_site").on(t.practiceId, t.siteId, t.expiresAt),
  ],
);

/** Who has an appointment open, and whether they are changing it. Old rows mean nothing. */
export const diaryPresence = mysqlTable(
  "diary_presence",
  {
    practiceId: uuid("practice_id").notNull(),
    appointmentId: uuid("appointment_id").notNull(),
    staffMemberId: uuid("staff_member_id").notNull(),
    isEditing: boolean("is_editing").notNull().default(false),
    seenAt: instant("seen_at").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.appointmentId, t.staffMemberId] }),
    foreignKey({
      name: "diary_presence_appointment",
      columns: [t.practiceId, t.appointmentId],
      foreignColumns: [appointments.practiceId, appointments.id],
    }),
    foreignKey({
      name: "diary_presence_member",
      columns: [t.practiceId, t.staffMemberId],
      foreignColumns: [staffMembers.practiceId, staffMembers.id],
    }),
    index("diary_presence_by_time").on(t.practiceId, t.seenAt),
  ],
);

/** Half-made work that was put aside at an interruption, for its own person to take up again. */
export const putAsideItems = mysqlTable(
  "put_aside_items",
  {
    ...tenantKey(),
    staffMemberId: uuid("staff_member_id").notNull(),
    kind: varchar("kind", { length: 20 }).$type<"booking" | "finding" | "course">().notNull(),
    /** What the tray says: "Initial assessment, Priya, Thu pm". */
    title: varchar("title", { length: 120 }).notNull(),
    /** What was chosen and typed, as the screen of its kind takes it back. */
    typed: json("typed").$type<Record<string, unknown>>().notNull(),
    putAsideAt: instant("put_aside_at").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({
      name: "put_aside_items_member",
      columns: [t.practiceId, t.staffMemberId],
      foreignColumns: [staffMembers.practiceId, staffMembers.id],
    }),
    index("put_aside_items_by_member").on(t.practiceId, t.staffMemberId, t.putAsideAt),
  ],
);

/** A view of the diary that a person named and comes back to. */
export const savedViews = mysqlTable(
  "saved_views",
  {
    ...tenantKey(),
    staffMemberId: uuid("staff_member_id").notNull(),
    name: varchar("name", { length: 60 }).notNull(),
    /** Path and query of our own app, without the day: "/diary?by=room&site=…". */
    address: varchar("address", { length: 500 }).notNull(),
    createdAt: instant("created_at").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({
      name: "saved_views_member",
      columns: [t.practiceId, t.staffMemberId],
      foreignColumns: [staffMembers.practiceId, staffMembers.id],
    }),
    uniqueIndex("saved_views_name").on(t.practiceId, t.staffMemberId, t.name),
  ],
);
