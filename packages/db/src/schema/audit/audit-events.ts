import { index, json, mysqlTable, primaryKey, varchar } from "drizzle-orm/mysql-core";
import { instant, tenantKey, uuid } from "../../columns";

/** Who did or read what. The app's user may insert and read, never change or delete. No foreign keys: it outlives its subjects. */
export const auditEvents = mysqlTable(
  "audit_events",
  {
    ...tenantKey(),
    at: instant("at").notNull(),
    /** Null where the worker or a sign-in form acted. */
    actorId: uuid("actor_id"),
    action: varchar("action", { length: 60 }).notNull(),
    subjectKind: varchar("subject_kind", { length: 30 }).notNull(),
    subjectId: uuid("subject_id").notNull(),
    patientId: uuid("patient_id"),
    siteId: uuid("site_id"),
    requestId: varchar("request_id", { length: 40 }).notNull(),
    /** Names of changed fields, states, amounts. Never clinical text. */
    detail: json("detail").$type<Record<string, unknown>>().notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    // "Who looked" at a patient.
    index("audit_events_by_patient").on(t.practiceId, t.patientId, t.at),
    index("audit_events_by_time").on(t.practiceId, t.at),
    index("audit_events_by_subject").on(t.practiceId, t.subjectKind, t.subjectId, t.at),
    index("audit_events_by_actor").on(t.practiceId, t.actorId, t.at),
  ],
);
