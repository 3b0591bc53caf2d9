import { foreignKey, index, mysqlTable, primaryKey } from "drizzle-orm/mysql-core";
import { instant, uuid } from "../../columns";
import { appointments } from "./appointments";

/**
 * One five-minute slot of one therapist or room, taken by one appointment. The primary key is what makes a double
 * booking impossible: the second insert fails with error 1062 whatever the race.
 */
export const diaryClaims = mysqlTable(
  "diary_claims",
  {
    practiceId: uuid("practice_id").notNull(),
    resourceId: uuid("resource_id").notNull(),
    slotAt: instant("slot_at").notNull(),
    appointmentId: uuid("appointment_id").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.resourceId, t.slotAt] }),
    foreignKey({
      name: "diary_claims_appointment",
      columns: [t.practiceId, t.appointmentId],
      foreignColumns: [appointments.practiceId, appointments.id],
    }).onDelete("cascade"),
    // Releases all claims of one appointment.
    index("diary_claims_by_appointment").on(t.practiceId, t.appointmentId),
  ],
);
