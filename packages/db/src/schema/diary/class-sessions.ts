import { foreignKey, index, int, mysqlTable, primaryKey, uniqueIndex, varchar } from "drizzle-orm/mysql-core";
import { instant, tenantKey, uuid } from "../../columns";
import { patients } from "../patients/patients";
import { rooms } from "../practices/rooms";
import { sites } from "../practices/sites";
import { staffMembers } from "../practices/staff-members";
import { services } from "./services";

/** One class on one day: it takes its therapist and its room once, whoever comes. */
export const classSessions = mysqlTable(
  "class_sessions",
  {
    ...tenantKey(),
    siteId: uuid("site_id").notNull(),
    therapistId: uuid("therapist_id").notNull(),
    roomId: uuid("room_id").notNull(),
    serviceId: uuid("service_id").notNull(),
    title: varchar("title", { length: 80 }).notNull(),
    /** On the five-minute grid (a CHECK holds it there). */
    startsAt: instant("starts_at").notNull(),
    endsAt: instant("ends_at").notNull(),
    cleanDownMinutes: int("clean_down_minutes").notNull().default(0),
    capacity: int("capacity").notNull(),
    state: varchar("state", { length: 12 })
      .$type<"booked" | "fulfilled" | "cancelled">()
      .notNull()
      .default("booked"),
    cancelReason: varchar("cancel_reason", { length: 200 }),
    version: int("version").notNull().default(1),
    createdAt: instant("created_at").notNull(),
    createdBy: uuid("created_by").notNull(),
    updatedAt: instant("updated_at").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({
      name: "class_sessions_site",
      columns: [t.practiceId, t.siteId],
      foreignColumns: [sites.practiceId, sites.id],
    }),
    foreignKey({
      name: "class_sessions_therapist",
      columns: [t.practiceId, t.therapistId],
      foreignColumns: [staffMembers.practiceId, staffMembers.id],
    }),
    foreignKey({
      name: "class_sessions_room",
      columns: [t.practiceId, t.roomId],
      foreignColumns: [rooms.practiceId, rooms.id],
    }),
    foreignKey({
      name: "class_sessions_service",
      columns: [t.practiceId, t.serviceId],
      foreignColumns: [services.practiceId, services.id],
    }),
    // The day grid and the list of classes of a site.
    index("class_sessions_by_site").on(t.practiceId, t.siteId, t.startsAt, t.endsAt),
    index("class_sessions_by_therapist").on(t.practiceId, t.therapistId, t.startsAt, t.endsAt),
  ],
);

/** One patient on the list of one class: with a place, or waiting for one in order of `joinedAt`. */
export const classAttendees = mysqlTable(
  "class_attendees",
  {
    ...tenantKey(),
    classSessionId: uuid("class_session_id").notNull(),
    patientId: uuid("patient_id").notNull(),
    state: varchar("state", { length: 12 })
      .$type<"waiting" | "booked" | "arrived" | "fulfilled" | "cancelled" | "noshow">()
      .notNull(),
    joinedAt: instant("joined_at").notNull(),
    cancelReason: varchar("cancel_reason", { length: 200 }),
    version: int("version").notNull().default(1),
    createdBy: uuid("created_by").notNull(),
    updatedAt: instant("updated_at").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({
      name: "class_attendees_session",
      columns: [t.practiceId, t.classSessionId],
      foreignColumns: [classSessions.practiceId, classSessions.id],
    }),
    foreignKey({
      name: "class_attendees_patient",
      columns: [t.practiceId, t.patientId],
      foreignColumns: [patients.practiceId, patients.id],
    }),
    // Nobody stands on one list twice; who left and comes back takes up the same row.
    uniqueIndex("class_attendees_once").on(t.practiceId, t.classSessionId, t.patientId),
    index("class_attendees_by_patient").on(t.practiceId, t.patientId),
  ],
);
