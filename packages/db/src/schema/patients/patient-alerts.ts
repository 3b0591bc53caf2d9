import { boolean, foreignKey, index, mysqlTable, primaryKey, varchar } from "drizzle-orm/mysql-core";
import { instant, tenantKey, uuid } from "../../columns";
import { patients } from "./patients";

/** One line that must be seen before anyone acts. Clinical ones are shown only to those who may read notes. */
export const patientAlerts = mysqlTable(
  "patient_alerts",
  {
    ...tenantKey(),
    patientId: uuid("patient_id").notNull(),
    text: varchar("text", { length: 200 }).notNull(),
    isClinical: boolean("is_clinical").notNull().default(false),
    createdAt: instant("created_at").notNull(),
    createdBy: uuid("created_by").notNull(),
    resolvedAt: instant("resolved_at"),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({
      name: "patient_alerts_patient",
      columns: [t.practiceId, t.patientId],
      foreignColumns: [patients.practiceId, patients.id],
    }),
    index("patient_alerts_by_patient").on(t.practiceId, t.patientId, t.resolvedAt),
  ],
);
