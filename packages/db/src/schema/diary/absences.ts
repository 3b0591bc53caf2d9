import { foreignKey, index, int, mysqlTable, primaryKey, varchar } from "drizzle-orm/mysql-core";
import { instant, tenantKey, uuid } from "../../columns";
import { rooms } from "../practices/rooms";
import { staffMembers } from "../practices/staff-members";

/** Time in which a therapist or a room is not to be booked: leave, a meeting, a repair. Exactly one of the two is set. */
export const absences = mysqlTable(
  "absences",
  {
    ...tenantKey(),
    staffMemberId: uuid("staff_member_id"),
    roomId: uuid("room_id"),
    kind: varchar("kind", { length: 10 }).$type<"leave" | "blocked">().notNull(),
    reason: varchar("reason", { length: 120 }).notNull(),
    startsAt: instant("starts_at").notNull(),
    endsAt: instant("ends_at").notNull(),
    createdBy: uuid("created_by").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({
      name: "absences_member",
      columns: [t.practiceId, t.staffMemberId],
      foreignColumns: [staffMembers.practiceId, staffMembers.id],
    }),
    foreignKey({
      name: "absences_room",
      columns: [t.practiceId, t.roomId],
      foreignColumns: [rooms.practiceId, rooms.id],
    }),
    index("absences_by_member").on(t.practiceId, t.staffMemberId, t.endsAt, t.startsAt),
    index("absences_by_room").on(t.practiceId, t.roomId, t.endsAt, t.startsAt),
  ],
);

/** A therapist's wish to be away. Once approved it stands in `absences`; the request keeps who said so. */
export const leaveRequests = mysqlTable(
  "leave_requests",
  {
    ...tenantKey(),
    staffMemberId: uuid("staff_member_id").notNull(),
    startsAt: instant("starts_at").notNull(),
    endsAt: instant("ends_at").notNull(),
    reason: varchar("reason", { length: 120 }).notNull(),
    state: varchar("state", { length: 10 })
      .$type<"requested" | "approved" | "declined" | "withdrawn">()
      .notNull()
      .default("requested"),
    requestedAt: instant("requested_at").notNull(),
    requestedBy: uuid("requested_by").notNull(),
    decidedAt: instant("decided_at"),
    decidedBy: uuid("decided_by"),
    decisionNote: varchar("decision_note", { length: 200 }),
    absenceId: uuid("absence_id"),
    version: int("version").notNull().default(1),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({
      name: "leave_requests_member",
      columns: [t.practiceId, t.staffMemberId],
      foreignColumns: [staffMembers.practiceId, staffMembers.id],
    }),
    // What waits for a decision, and a person's own requests.
    index("leave_requests_by_state").on(t.practiceId, t.state, t.startsAt),
    index("leave_requests_by_member").on(t.practiceId, t.staffMemberId, t.startsAt),
  ],
);
