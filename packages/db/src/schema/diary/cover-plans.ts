import { foreignKey, index, int, json, mysqlTable, primaryKey, varchar } from "drizzle-orm/mysql-core";
import { instant, tenantKey, uuid } from "../../columns";
import { rooms } from "../practices/rooms";
import { staffMembers } from "../practices/staff-members";
import { type AppointmentStateCode, appointments } from "./appointments";

/** Where a visit could go, or goes, when its therapist or room falls out. */
export interface CoverPlace {
  readonly startsAt: string;
  readonly siteId: string;
  readonly therapistId: string;
  readonly roomId: string;
  /** What it costs, in the rule's points, and why in words. */
  readonly cost: number;
  readonly reasons: readonly string[];
}

/** Where a visit was, and in which state: what taking the plan back restores. */
export interface CoverBefore extends CoverPlace {
  readonly state: AppointmentStateCode;
}

/** A therapist away or a room shut from one instant to another, and what becomes of the visits. */
export const coverPlans = mysqlTable(
  "cover_plans",
  {
    ...tenantKey(),
    therapistId: uuid("therapist_id"),
    roomId: uuid("room_id"),
    startsAt: instant("starts_at").notNull(),
    endsAt: instant("ends_at").notNull(),
    reason: varchar("reason", { length: 120 }).notNull(),
    state: varchar("state", { length: 10 })
      .$type<"solving" | "ready" | "applied" | "undone" | "dropped">()
      .notNull()
      .default("solving"),
    jobId: uuid("job_id"),
    /** Milliseconds of solving, number of visits and candidates, and whether the optimum was proved. */
    outcome: json("outcome").$type<Record<string, unknown>>(),
    appliedAt: instant("applied_at"),
    version: int("version").notNull().default(1),
    createdAt: instant("created_at").notNull(),
    createdBy: uuid("created_by").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({
      name: "cover_plans_therapist",
      columns: [t.practiceId, t.therapistId],
      foreignColumns: [staffMembers.practiceId, staffMembers.id],
    }),
    foreignKey({
      name: "cover_plans_room",
      columns: [t.practiceId, t.roomId],
      foreignColumns: [rooms.practiceId, rooms.id],
    }),
    index("cover_plans_by_time").on(t.practiceId, t.createdAt),
  ],
);

/** One visit of a plan: where it was, where it is to go, and what the desk decided. */
export const coverMoves = mysqlTable(
  "cover_moves",
  {
    ...tenantKey(),
    planId: uuid("plan_id").notNull(),
    appointmentId: uuid("appointment_id").notNull(),
    /** The visit's version when the plan was made: a visit that changed since is not moved. */
    appointmentVersion: int("appointment_version").notNull(),
    before: json("before").$type<CoverBefore>().notNull(),
    /** Null: no place was found, and `problem` says why. */
    place: json("place").$type<CoverPlace>(),
    problem: varchar("problem", { length: 300 }),
    decision: varchar("decision", { length: 10 })
      .$type<"keep" | "change" | "phone">()
      .notNull()
      .default("keep"),
    isApplied: int("is_applied").notNull().default(0),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({
      name: "cover_moves_plan",
      columns: [t.practiceId, t.planId],
      foreignColumns: [coverPlans.practiceId, coverPlans.id],
    }),
    foreignKey({
      name: "cover_moves_appointment",
      columns: [t.practiceId, t.appointmentId],
      foreignColumns: [appointments.practiceId, appointments.id],
    }),
    index("cover_moves_by_plan").on(t.practiceId, t.planId),
  ],
);
