import { foreignKey, index, mysqlTable, primaryKey, varchar } from "drizzle-orm/mysql-core";
import { instant, tenantKey, uuid } from "../../columns";
import { patients } from "./patients";

/** What the patient agreed to, in which version of our wording. Withdrawn ones stay. */
export const consents = mysqlTable(
  "consents",
  {
    ...tenantKey(),
    patientId: uuid("patient_id").notNull(),
    kind: varchar("kind", { length: 20 }).$type<"treatment" | "letter-to-gp" | "email" | "text">().notNull(),
    wordingVersion: varchar("wording_version", { length: 10 }).notNull(),
    givenAt: instant("given_at").notNull(),
    recordedBy: uuid("recorded_by").notNull(),
    withdrawnAt: instant("withdrawn_at"),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({
      name: "consents_patient",
      columns: [t.practiceId, t.patientId],
      foreignColumns: [patients.practiceId, patients.id],
    }),
    index("consents_by_patient").on(t.practiceId, t.patientId, t.kind),
  ],
);
