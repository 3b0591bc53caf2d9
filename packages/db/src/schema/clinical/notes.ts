import {
  foreignKey,
  index,
  int,
  json,
  mysqlTable,
  primaryKey,
  text,
  uniqueIndex,
  varchar,
} from "drizzle-orm/mysql-core";
import { instant, tenantKey, uuid } from "../../columns";
import { appointments } from "../diary/appointments";
import { patients } from "../patients/patients";
import { staffMembers } from "../practices/staff-members";
import { episodes } from "./episodes";

/** A note's text, by heading key. */
export type NoteBody = Record<string, string>;

/** One clinical note. Once signed a trigger forbids any change; corrections are addenda. */
export const notes = mysqlTable(
  "notes",
  {
    ...tenantKey(),
    episodeId: uuid("episode_id").notNull(),
    patientId: uuid("patient_id").notNull(),
    appointmentId: uuid("appointment_id"),
    authorId: uuid("author_id").notNull(),
    kind: varchar("kind", { length: 10 }).$type<"initial" | "session">().notNull(),
    state: varchar("state", { length: 8 }).$type<"draft" | "signed">().notNull().default("draft"),
    body: json("body").$type<NoteBody>().notNull(),
    /** When the visit was; the note may be written later. */
    visitAt: instant("visit_at").notNull(),
    version: int("version").notNull().default(1),
    createdAt: instant("created_at").notNull(),
    updatedAt: instant("updated_at").notNull(),
    signedAt: instant("signed_at"),
    signedBy: uuid("signed_by"),
    /** As it stood when signed: name and registration number do not follow later changes. */
    signedName: varchar("signed_name", { length: 130 }),
    registrationNumber: varchar("registration_number", { length: 10 }),
    /** SHA-256 of the signed text. */
    bodyHash: varchar("body_hash", { length: 64 }),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({
      name: "notes_episode",
      columns: [t.practiceId, t.episodeId],
      foreignColumns: [episodes.practiceId, episodes.id],
    }),
    foreignKey({
      name: "notes_patient",
      columns: [t.practiceId, t.patientId],
      foreignColumns: [patients.practiceId, patients.id],
    }),
    foreignKey({
      name: "notes_appointment",
      columns: [t.practiceId, t.appointmentId],
      foreignColumns: [appointments.practiceId, appointments.id],
    }),
    foreignKey({
      name: "notes_author",
      columns: [t.practiceId, t.authorId],
      foreignColumns: [staffMembers.practiceId, staffMembers.id],
    }),
    // One note a visit.
    uniqueIndex("notes_one_per_visit").on(t.practiceId, t.appointmentId),
    index("notes_by_episode").on(t.practiceId, t.episodeId, t.visitAt),
    // Notes to sign.
    index("notes_by_author").on(t.practiceId, t.authorId, t.state, t.visitAt),
    index("notes_by_patient").on(t.practiceId, t.patientId, t.visitAt),
  ],
);

/** Every saved state of a note. The app's user may only insert and read. */
export const noteVersions = mysqlTable(
  "note_versions",
  {
    practiceId: uuid("practice_id").notNull(),
    noteId: uuid("note_id").notNull(),
    version: int("version").notNull(),
    body: json("body").$type<NoteBody>().notNull(),
    savedAt: instant("saved_at").notNull(),
    savedBy: uuid("saved_by").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.noteId, t.version] }),
    foreignKey({
      name: "note_versions_note",
      columns: [t.practiceId, t.noteId],
      foreignColumns: [notes.practiceId, notes.id],
    }),
  ],
);

/** A later correction or addition to a signed note. The app's user may only insert and read. */
export const noteAddenda = mysqlTable(
  "note_addenda",
  {
    ...tenantKey(),
    noteId: uuid("note_id").notNull(),
    text: text("text").notNull(),
    reason: varchar("reason", { length: 200 }).notNull(),
    authorId: uuid("author_id").notNull(),
    authorName: varchar("author_name", { length: 130 }).notNull(),
    registrationNumber: varchar("registration_number", { length: 10 }),
    writtenAt: instant("written_at").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({
      name: "note_addenda_note",
      columns: [t.practiceId, t.noteId],
      foreignColumns: [notes.practiceId, notes.id],
    }),
    index("note_addenda_by_note").on(t.practiceId, t.noteId, t.writtenAt),
  ],
);
