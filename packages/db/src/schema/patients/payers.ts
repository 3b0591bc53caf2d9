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
import { instant, pence, tenantKey, uuid } from "../../columns";
import { practices } from "../practices/practices";
import { patients } from "./patients";

/** An insurer or employer that pays for patients. */
export const payers = mysqlTable(
  "payers",
  {
    ...tenantKey(),
    name: varchar("name", { length: 120 }).notNull(),
    kind: varchar("kind", { length: 12 }).$type<"insurer" | "employer">().notNull(),
    addressLines: json("address_lines").$type<string[]>().notNull(),
    postcode: varchar("postcode", { length: 10 }).notNull(),
    email: varchar("email", { length: 254 }),
    paymentDays: int("payment_days").notNull().default(30),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({ name: "payers_practice", columns: [t.practiceId], foreignColumns: [practices.id] }),
    index("payers_by_name").on(t.practiceId, t.name),
  ],
);

/** Who pays for a patient's visits, under which policy and authorisation. No row: the patient pays. */
export const patientPayers = mysqlTable(
  "patient_payers",
  {
    ...tenantKey(),
    patientId: uuid("patient_id").notNull(),
    payerId: uuid("payer_id").notNull(),
    policyNumber: varchar("policy_number", { length: 40 }),
    authorisationCode: varchar("authorisation_code", { length: 40 }),
    sessionsAuthorised: int("sessions_authorised"),
    excessPence: pence("excess_pence").notNull().default(0),
    isCurrent: boolean("is_current").notNull().default(true),
    createdAt: instant("created_at").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({
      name: "patient_payers_patient",
      columns: [t.practiceId, t.patientId],
      foreignColumns: [patients.practiceId, patients.id],
    }),
    foreignKey({
      name: "patient_payers_payer",
      columns: [t.practiceId, t.payerId],
      foreignColumns: [payers.practiceId, payers.id],
    }),
    index("patient_payers_by_patient").on(t.practiceId, t.patientId, t.isCurrent),
  ],
);
