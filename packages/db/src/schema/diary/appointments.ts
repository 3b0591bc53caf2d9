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
import { instant, tenantKey, uuid } from "../../columns";
import { episodes } from "../clinical/episodes";
import { patients } from "../patients/patients";
import { rooms } from "../practices/rooms";
import { sites } from "../practices/sites";
import { staffMembers } from "../practices/staff-members";
import { courses } from "./courses";
import { services } from "./services";

export type AppointmentStateCode =
  | "booked"
  | "confirmed"
  | "arrived"
  | "in-session"
  | "fulfilled"
  | "cancelled"
  | "noshow";

/** One booked visit. Its claims on therapist and room are in diary_claims, which forbids an overlap. */
export const appointments = mysqlTable(
  "appointments",
  {
    ...tenantKey(),
    siteId: uuid("site_id").notNull(),
    therapistId: uuid("therapist_id").notNull(),
    roomId: uuid("room_id").notNull(),
    patientId: uuid("patient_id").notNull(),
    serviceId: uuid("service_id").notNull(),
    episodeId: uuid("episode_id"),
    /** The course that it was booked with, where it was. */
    courseId: uuid("course_id"),
    /** On the five-minute grid (a CHECK holds it there). */
    startsAt: instant("starts_at").notNull(),
    /** End of the visit, without the clean-down. */
    endsAt: instant("ends_at").notNull(),
    cleanDownMinutes: int("clean_down_minutes").notNull().default(0),
    state: varchar("state", { length: 12 }).$type<AppointmentStateCode>().notNull().default("booked"),
    /** A line for the desk. Never clinical. */
    deskNote: varchar("desk_note", { length: 300 }),
    /** Why it was booked outside working hours, where it was. */
    overrideReason: varchar("override_reason", { length: 200 }),
    arrivedAt: instant("arrived_at"),
    sessionStartedAt: instant("session_started_at"),
    sessionEndedAt: instant("session_ended_at"),
    cancelledAt: instant("cancelled_at"),
    cancelledBy: varchar("cancelled_by", { length: 10 }).$type<"patient" | "clinic">(),
    cancelReason: varchar("cancel_reason", { length: 200 }),
    isLateCancellation: boolean("is_late_cancellation").notNull().default(false),
    version: int("version").notNull().default(1),
    createdAt: instant("created_at").notNull(),
    createdBy: uuid("created_by").notNull(),
    updatedAt: instant("updated_at").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({
      name: "appointments_site",
      columns: [t.practiceId, t.siteId],
      foreignColumns: [sites.practiceId, sites.id],
    }),
    foreignKey({
      name: "appointments_therapist",
      columns: [t.practiceId, t.therapistId],
      foreignColumns: [staffMembers.practiceId, staffMembers.id],
    }),
    foreignKey({
      name: "appointments_room",
      columns: [t.practiceId, t.roomId],
      foreignColumns: [rooms.practiceId, rooms.id],
    }),
    foreignKey({
      name: "appointments_patient",
      columns: [t.practiceId, t.patientId],
      foreignColumns: [patients.practiceId, patients.id],
    }),
    foreignKey({
      name: "appointments_service",
      columns: [t.practiceId, t.serviceId],
      foreignColumns: [services.practiceId, services.id],
    }),
    foreignKey({
      name: "appointments_episode",
      columns: [t.practiceId, t.episodeId],
      foreignColumns: [episodes.practiceId, episodes.id],
    }),
    foreignKey({
      name: "appointments_course",
      columns: [t.practiceId, t.courseId],
      foreignColumns: [courses.practiceId, courses.id],
    }),
    // The visits of a course.
    index("appointments_by_course").on(t.practiceId, t.courseId, t.startsAt),
    // A therapist's day and week, and busy time when finding a time.
    index("appointments_by_therapist").on(t.practiceId, t.therapistId, t.startsAt, t.endsAt),
    // The site's day grid and the Today page.
    index("appointments_by_site").on(t.practiceId, t.siteId, t.startsAt, t.endsAt),
    // A patient's timeline, and continuity.
    index("appointments_by_patient").on(t.practiceId, t.patientId, t.startsAt),
    // Visits that wait for an invoice, and the month's figures.
    index("appointments_by_state").on(t.practiceId, t.state, t.startsAt),
  ],
);

/** What was done to an appointment: feeds "recent changes" and undo. */
export const appointmentChanges = mysqlTable(
  "appointment_changes",
  {
    ...tenantKey(),
    appointmentId: uuid("appointment_id").notNull(),
    siteId: uuid("site_id").notNull(),
    kind: varchar("kind", { length: 12 })
      .$type<"booked" | "moved" | "cancelled" | "marked" | "undone">()
      .notNull(),
    before: json("before").$type<Record<string, unknown>>(),
    after: json("after").$type<Record<string, unknown>>().notNull(),
    changedBy: uuid("changed_by").notNull(),
    changedAt: instant("changed_at").notNull(),
    undoneAt: instant("undone_at"),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({
      name: "appointment_changes_appointment",
      columns: [t.practiceId, t.appointmentId],
      foreignColumns: [appointments.practiceId, appointments.id],
    }),
    index("appointment_changes_by_site").on(t.practiceId, t.siteId, t.changedAt),
    index("appointment_changes_by_appointment").on(t.practiceId, t.appointmentId, t.changedAt),
  ],
);
