import {
  foreignKey,
  index,
  int,
  json,
  mysqlTable,
  primaryKey,
  uniqueIndex,
  varchar,
} from "drizzle-orm/mysql-core";
import { instant, plainDate, tenantKey, uuid } from "../../columns";
import { episodes } from "../clinical/episodes";
import { patients } from "../patients/patients";
import { staffMembers } from "../practices/staff-members";

export interface LetterRecipient {
  kind: "gp" | "patient" | "payer" | "other";
  name: string;
  addressLines: string[];
  email: string | null;
}

export interface LetterSentence {
  id: string;
  text: string;
  /** The row it was written from; null where a person wrote it. */
  source: { kind: string; id: string; label: string } | null;
  /** What the record said when the sentence was last made from it; a difference shows an edit or a stale fact. */
  assembled: string | null;
  /** Who an action of the plan is for. */
  actor: string | null;
  /** Why an older wording stays although the record has changed. */
  keptBecause: string | null;
}

export interface LetterSection {
  key: string;
  heading: string;
  sentences: LetterSentence[];
}

/** A letter. Once signed a trigger forbids any change to its text. */
export const letters = mysqlTable(
  "letters",
  {
    ...tenantKey(),
    episodeId: uuid("episode_id").notNull(),
    patientId: uuid("patient_id").notNull(),
    authorId: uuid("author_id").notNull(),
    kind: varchar("kind", { length: 20 }).$type<"discharge">().notNull(),
    /** Printed on the letter, unique in the practice. */
    reference: varchar("reference", { length: 20 }).notNull(),
    state: varchar("state", { length: 8 }).$type<"draft" | "signed">().notNull().default("draft"),
    recipient: json("recipient").$type<LetterRecipient>().notNull(),
    sections: json("sections").$type<LetterSection[]>().notNull(),
    datedOn: plainDate("dated_on").notNull(),
    version: int("version").notNull().default(1),
    createdAt: instant("created_at").notNull(),
    updatedAt: instant("updated_at").notNull(),
    signedAt: instant("signed_at"),
    signedBy: uuid("signed_by"),
    signedName: varchar("signed_name", { length: 130 }),
    registrationNumber: varchar("registration_number", { length: 10 }),
    /** SHA-256 of recipient, date and sections as signed. */
    bodyHash: varchar("body_hash", { length: 64 }),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({
      name: "letters_episode",
      columns: [t.practiceId, t.episodeId],
      foreignColumns: [episodes.practiceId, episodes.id],
    }),
    foreignKey({
      name: "letters_patient",
      columns: [t.practiceId, t.patientId],
      foreignColumns: [patients.practiceId, patients.id],
    }),
    foreignKey({
      name: "letters_author",
      columns: [t.practiceId, t.authorId],
      foreignColumns: [staffMembers.practiceId, staffMembers.id],
    }),
    uniqueIndex("letters_reference").on(t.practiceId, t.reference),
    index("letters_by_patient").on(t.practiceId, t.patientId, t.createdAt),
    index("letters_by_author").on(t.practiceId, t.authorId, t.state, t.createdAt),
    index("letters_by_age").on(t.practiceId, t.createdAt),
  ],
);

/**
 * One sending of a signed letter. What became of the mail is read from its outbox row; the mail carries no letter,
 * only a private link, of which the SHA-256 is kept here with what was done with it.
 */
export const letterDeliveries = mysqlTable(
  "letter_deliveries",
  {
    ...tenantKey(),
    letterId: uuid("letter_id").notNull(),
    channel: varchar("channel", { length: 8 }).$type<"email" | "print">().notNull(),
    toName: varchar("to_name", { length: 160 }).notNull(),
    toAddress: varchar("to_address", { length: 254 }).notNull(),
    outboxMessageId: uuid("outbox_message_id"),
    requestedBy: uuid("requested_by").notNull(),
    requestedAt: instant("requested_at").notNull(),
    postedOn: plainDate("posted_on"),
    tokenHash: varchar("token_hash", { length: 64 }),
    expiresAt: instant("expires_at"),
    firstOpenedAt: instant("first_opened_at"),
    openedCount: int("opened_count").notNull().default(0),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({
      name: "letter_deliveries_letter",
      columns: [t.practiceId, t.letterId],
      foreignColumns: [letters.practiceId, letters.id],
    }),
    // The link is looked up before any practice is known.
    uniqueIndex("letter_deliveries_token").on(t.tokenHash),
    index("letter_deliveries_by_letter").on(t.practiceId, t.letterId, t.requestedAt),
  ],
);
