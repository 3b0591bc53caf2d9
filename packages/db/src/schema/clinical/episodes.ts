import { foreignKey, index, int, json, mysqlTable, primaryKey, text, varchar } from "drizzle-orm/mysql-core";
import { instant, plainDate, tenantKey, uuid } from "../../columns";
import { patients } from "../patients/patients";
import { sites } from "../practices/sites";
import { staffMembers } from "../practices/staff-members";

export interface EpisodeGoal {
  text: string;
  setOn: string;
  metOn: string | null;
}

/** One course of care for one problem, from referral to discharge. */
export const episodes = mysqlTable(
  "episodes",
  {
    ...tenantKey(),
    patientId: uuid("patient_id").notNull(),
    therapistId: uuid("therapist_id").notNull(),
    siteId: uuid("site_id").notNull(),
    /** Working problem in the therapist's words, for example "Hip osteoarthritis". */
    problem: varchar("problem", { length: 160 }).notNull(),
    region: varchar("region", { length: 20 }).notNull(),
    side: varchar("side", { length: 8 }).$type<"left" | "right" | "both" | "none">().notNull(),
    referralSource: varchar("referral_source", { length: 20 }).notNull().default("self"),
    referredBy: varchar("referred_by", { length: 160 }),
    referredOn: plainDate("referred_on"),
    reason: text("reason"),
    goals: json("goals").$type<EpisodeGoal[]>().notNull(),
    plannedVisits: int("planned_visits"),
    state: varchar("state", { length: 12 }).$type<"open" | "discharged">().notNull().default("open"),
    openedOn: plainDate("opened_on").notNull(),
    dischargedAt: instant("discharged_at"),
    dischargedBy: uuid("discharged_by"),
    outcome: varchar("outcome", { length: 30 }),
    /** Red flags asked about, and what was found, as of the last save. */
    redFlags: json("red_flags").$type<Record<string, "absent" | "present" | "not-asked">>().notNull(),
    version: int("version").notNull().default(1),
    createdAt: instant("created_at").notNull(),
    updatedAt: instant("updated_at").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({
      name: "episodes_patient",
      columns: [t.practiceId, t.patientId],
      foreignColumns: [patients.practiceId, patients.id],
    }),
    foreignKey({
      name: "episodes_therapist",
      columns: [t.practiceId, t.therapistId],
      foreignColumns: [staffMembers.practiceId, staffMembers.id],
    }),
    foreignKey({
      name: "episodes_site",
      columns: [t.practiceId, t.siteId],
      foreignColumns: [sites.practiceId, sites.id],
    }),
    index("episodes_by_patient").on(t.practiceId, t.patientId, t.openedOn),
    // A therapist's caseload.
    index("episodes_by_therapist").on(t.practiceId, t.therapistId, t.state, t.openedOn),
  ],
);
