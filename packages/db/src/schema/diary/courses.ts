import { foreignKey, index, int, json, mysqlTable, primaryKey } from "drizzle-orm/mysql-core";
import { clockTime, instant, tenantKey, uuid } from "../../columns";
import { patients } from "../patients/patients";
import { sites } from "../practices/sites";
import { staffMembers } from "../practices/staff-members";
import { services } from "./services";

/** How the visits of a course follow each other: every so many days, or on weekdays (1 Monday to 7 Sunday). */
export type CourseRhythm =
  | { readonly kind: "interval"; readonly days: number }
  | { readonly kind: "weekdays"; readonly weekdays: readonly number[] };

/** Visits booked in one go for one patient. The visits themselves are appointments that name it. */
export const courses = mysqlTable(
  "courses",
  {
    ...tenantKey(),
    patientId: uuid("patient_id").notNull(),
    serviceId: uuid("service_id").notNull(),
    siteId: uuid("site_id").notNull(),
    therapistId: uuid("therapist_id").notNull(),
    rhythm: json("rhythm").$type<CourseRhythm>().notNull(),
    /** The clock time at the site that holds over a change of the clocks. */
    startTime: clockTime("start_time").notNull(),
    plannedVisits: int("planned_visits").notNull(),
    version: int("version").notNull().default(1),
    createdAt: instant("created_at").notNull(),
    createdBy: uuid("created_by").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({
      name: "courses_patient",
      columns: [t.practiceId, t.patientId],
      foreignColumns: [patients.practiceId, patients.id],
    }),
    foreignKey({
      name: "courses_service",
      columns: [t.practiceId, t.serviceId],
      foreignColumns: [services.practiceId, services.id],
    }),
    foreignKey({
      name: "courses_site",
      columns: [t.practiceId, t.siteId],
      foreignColumns: [sites.practiceId, sites.id],
    }),
    foreignKey({
      name: "courses_therapist",
      columns: [t.practiceId, t.therapistId],
      foreignColumns: [staffMembers.practiceId, staffMembers.id],
    }),
    // A patient's courses on the record.
    index("courses_by_patient").on(t.practiceId, t.patientId, t.createdAt),
  ],
);
