import { foreignKey, index, json, mysqlTable, primaryKey, varchar } from "drizzle-orm/mysql-core";
import { instant, plainDate, tenantKey, uuid } from "../../columns";
import { patients } from "../patients/patients";
import { episodes } from "./episodes";
import { notes } from "./notes";

/** What was answered: numbers by item, null where left blank, and words such as the patient's own activities. */
export interface MeasureAnswers {
  items: (number | null)[];
  labels?: string[];
  details?: Record<string, string | number | boolean>;
}

/** One filling-in of one outcome measure. Scores are reckoned from the answers by the published rule when saved. */
export const measureRecords = mysqlTable(
  "measure_records",
  {
    ...tenantKey(),
    episodeId: uuid("episode_id").notNull(),
    patientId: uuid("patient_id").notNull(),
    noteId: uuid("note_id"),
    measureKey: varchar("measure_key", { length: 40 }).notNull(),
    /** Which edition of the scoring rule was used. */
    ruleVersion: varchar("rule_version", { length: 20 }).notNull(),
    answers: json("answers").$type<MeasureAnswers>().notNull(),
    /** Score by scale key, unrounded; null where the rule gives none. */
    scores: json("scores").$type<Record<string, number | null>>().notNull(),
    takenOn: plainDate("taken_on").notNull(),
    enteredBy: uuid("entered_by").notNull(),
    enteredAt: instant("entered_at").notNull(),
    /** Set when a later record corrects this one; it then counts no more, but stays. */
    replacedBy: uuid("replaced_by"),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({
      name: "measure_records_episode",
      columns: [t.practiceId, t.episodeId],
      foreignColumns: [episodes.practiceId, episodes.id],
    }),
    foreignKey({
      name: "measure_records_patient",
      columns: [t.practiceId, t.patientId],
      foreignColumns: [patients.practiceId, patients.id],
    }),
    foreignKey({
      name: "measure_records_note",
      columns: [t.practiceId, t.noteId],
      foreignColumns: [notes.practiceId, notes.id],
    }),
    index("measure_records_by_episode").on(t.practiceId, t.episodeId, t.measureKey, t.takenOn),
    index("measure_records_by_patient").on(t.practiceId, t.patientId, t.takenOn),
  ],
);
