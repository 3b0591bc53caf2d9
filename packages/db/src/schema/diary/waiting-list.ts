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
import { instant, sha256, tenantKey, uuid } from "../../columns";
import { patients } from "../patients/patients";
import { rooms } from "../practices/rooms";
import { sites } from "../practices/sites";
import { staffMembers } from "../practices/staff-members";
import { appointments } from "./appointments";
import { services } from "./services";

/** What someone who waits would take. An absent or empty wish means any. */
export interface WaitingWishes {
  readonly weekdays?: readonly number[];
  readonly partsOfDay?: readonly ("morning" | "afternoon" | "evening")[];
  readonly siteIds?: readonly string[];
  readonly therapistIds?: readonly string[];
  readonly latestOn?: string;
  /** Hours between the offer and the start that the patient needs to get there. */
  readonly noticeHours?: number;
}

/** Someone who would come sooner, or at another time. */
export const waitingEntries = mysqlTable(
  "waiting_entries",
  {
    ...tenantKey(),
    patientId: uuid("patient_id").notNull(),
    serviceId: uuid("service_id").notNull(),
    wishes: json("wishes").$type<WaitingWishes>().notNull(),
    urgency: varchar("urgency", { length: 10 }).$type<"routine" | "soon" | "urgent">().notNull(),
    /** A later visit that is given up when an offer is taken; null for someone without one. */
    insteadOfId: uuid("instead_of_id"),
    deskNote: varchar("desk_note", { length: 300 }),
    state: varchar("state", { length: 10 })
      .$type<"waiting" | "booked" | "withdrawn">()
      .notNull()
      .default("waiting"),
    waitingSince: instant("waiting_since").notNull(),
    version: int("version").notNull().default(1),
    createdBy: uuid("created_by").notNull(),
    updatedAt: instant("updated_at").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({
      name: "waiting_entries_patient",
      columns: [t.practiceId, t.patientId],
      foreignColumns: [patients.practiceId, patients.id],
    }),
    foreignKey({
      name: "waiting_entries_service",
      columns: [t.practiceId, t.serviceId],
      foreignColumns: [services.practiceId, services.id],
    }),
    foreignKey({
      name: "waiting_entries_instead_of",
      columns: [t.practiceId, t.insteadOfId],
      foreignColumns: [appointments.practiceId, appointments.id],
    }),
    // The list, longest wait first, and the match for a freed time.
    index("waiting_entries_by_state").on(t.practiceId, t.state, t.waitingSince),
    index("waiting_entries_by_patient").on(t.practiceId, t.patientId),
  ],
);

/** One freed time, offered to several people at once; the first to accept has it. */
export const offerRounds = mysqlTable(
  "offer_rounds",
  {
    ...tenantKey(),
    siteId: uuid("site_id").notNull(),
    therapistId: uuid("therapist_id").notNull(),
    roomId: uuid("room_id"),
    startsAt: instant("starts_at").notNull(),
    endsAt: instant("ends_at").notNull(),
    state: varchar("state", { length: 10 })
      .$type<"open" | "taken" | "expired" | "stopped">()
      .notNull()
      .default("open"),
    expiresAt: instant("expires_at").notNull(),
    /** The visit that was cancelled or moved away; null for a gap that the desk chose. */
    freedById: uuid("freed_by_id"),
    /** The visit that the first acceptance booked. */
    appointmentId: uuid("appointment_id"),
    version: int("version").notNull().default(1),
    createdAt: instant("created_at").notNull(),
    createdBy: uuid("created_by").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({
      name: "offer_rounds_site",
      columns: [t.practiceId, t.siteId],
      foreignColumns: [sites.practiceId, sites.id],
    }),
    foreignKey({
      name: "offer_rounds_therapist",
      columns: [t.practiceId, t.therapistId],
      foreignColumns: [staffMembers.practiceId, staffMembers.id],
    }),
    foreignKey({
      name: "offer_rounds_room",
      columns: [t.practiceId, t.roomId],
      foreignColumns: [rooms.practiceId, rooms.id],
    }),
    foreignKey({
      name: "offer_rounds_freed_by",
      columns: [t.practiceId, t.freedById],
      foreignColumns: [appointments.practiceId, appointments.id],
    }),
    foreignKey({
      name: "offer_rounds_appointment",
      columns: [t.practiceId, t.appointmentId],
      foreignColumns: [appointments.practiceId, appointments.id],
    }),
    // Open offers of a site for the desk, and those that expire for the worker.
    index("offer_rounds_by_state").on(t.practiceId, t.state, t.expiresAt),
  ],
);

/** One person's part in a round, behind a private link. Only the token's hash is kept. */
export const waitingOffers = mysqlTable(
  "waiting_offers",
  {
    ...tenantKey(),
    roundId: uuid("round_id").notNull(),
    entryId: uuid("entry_id").notNull(),
    /** 1 for the best match. */
    rank: int("rank").notNull(),
    tokenHash: sha256("token_hash").notNull(),
    state: varchar("state", { length: 10 })
      .$type<"open" | "accepted" | "declined" | "lost" | "expired" | "stopped">()
      .notNull()
      .default("open"),
    decidedAt: instant("decided_at"),
    createdAt: instant("created_at").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({
      name: "waiting_offers_round",
      columns: [t.practiceId, t.roundId],
      foreignColumns: [offerRounds.practiceId, offerRounds.id],
    }),
    foreignKey({
      name: "waiting_offers_entry",
      columns: [t.practiceId, t.entryId],
      foreignColumns: [waitingEntries.practiceId, waitingEntries.id],
    }),
    uniqueIndex("waiting_offers_token").on(t.tokenHash),
    uniqueIndex("waiting_offers_once").on(t.practiceId, t.roundId, t.entryId),
    index("waiting_offers_by_entry").on(t.practiceId, t.entryId, t.createdAt),
  ],
);
