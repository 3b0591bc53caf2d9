import { foreignKey, index, int, json, mysqlTable, primaryKey, varchar } from "drizzle-orm/mysql-core";
import { instant, tenantKey, uuid } from "../../columns";
import { patients } from "../patients/patients";
import { episodes } from "./episodes";

/** A home exercise programme of one episode. Its contents live in versions. */
export const programmes = mysqlTable(
  "programmes",
  {
    ...tenantKey(),
    episodeId: uuid("episode_id").notNull(),
    patientId: uuid("patient_id").notNull(),
    title: varchar("title", { length: 120 }).notNull(),
    /** The version that is being worked on or was issued last. */
    currentVersion: int("current_version").notNull().default(1),
    version: int("version").notNull().default(1),
    createdAt: instant("created_at").notNull(),
    createdBy: uuid("created_by").notNull(),
    updatedAt: instant("updated_at").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({
      name: "programmes_episode",
      columns: [t.practiceId, t.episodeId],
      foreignColumns: [episodes.practiceId, episodes.id],
    }),
    foreignKey({
      name: "programmes_patient",
      columns: [t.practiceId, t.patientId],
      foreignColumns: [patients.practiceId, patients.id],
    }),
    index("programmes_by_patient").on(t.practiceId, t.patientId, t.updatedAt),
    index("programmes_by_episode").on(t.practiceId, t.episodeId),
  ],
);

/** One version of a programme. Once issued to the patient a trigger forbids any change. */
export const programmeVersions = mysqlTable(
  "programme_versions",
  {
    practiceId: uuid("practice_id").notNull(),
    programmeId: uuid("programme_id").notNull(),
    versionNumber: int("version_number").notNull(),
    /** Items and doses, checked by the programme contract on every write. */
    content: json("content").$type<Record<string, unknown>>().notNull(),
    savedAt: instant("saved_at").notNull(),
    savedBy: uuid("saved_by").notNull(),
    issuedAt: instant("issued_at"),
    issuedBy: uuid("issued_by"),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.programmeId, t.versionNumber] }),
    foreignKey({
      name: "programme_versions_programme",
      columns: [t.practiceId, t.programmeId],
      foreignColumns: [programmes.practiceId, programmes.id],
    }),
  ],
);
