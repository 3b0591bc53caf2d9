import { foreignKey, index, mysqlTable, primaryKey } from "drizzle-orm/mysql-core";
import { instant, uuid } from "../../columns";
import { appointments } from "./appointments";
import { classSessions } from "./class-sessions";

/**
 * One five-minute slot of one therapist or room, taken by one appointment or one class (a CHECK wants exactly one of
 * the two). The primary key is what makes a double booking impossible: the second insert fails with error 1062
 * whatever the race.
 */
export const diaryClaims = mysqlTable(
  "diary_claims",
  {
    practiceId: uuid("practice_id").notNull(),
    resourceId: uuid("resource_id").notNull(),
    slotAt: instant("slot_at").notNull(),
    appointmentId: uuid("appointment_id"),
    classSessionId: uuid("class_session_id"),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.resourceId, t.slotAt] }),
    foreignKey({
      name: "diary_claims_appointment",
      columns: [t.practiceId, t.appointmentId],
      foreignColumns: [appointments.practiceId, appointments.id],
    }).onDelete("cascade"),
    foreignKey({
      name: "diary_claims_class",
      columns: [t.practiceId, t.classSessionId],
      foreignColumns: [classSessions.practiceId, classSessions.id],
    }).onDelete("cascade"),
    // Releases all claims of one appointment, or of one class.
    index("diary_claims_by_appointment").on(t.practiceId, t.appointmentId),
    index("diary_claims_by_class").on(t.practiceId, t.classSessionId),
  ],
);
