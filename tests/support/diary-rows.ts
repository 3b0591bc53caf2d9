import { newId } from "@withy/core/ids";
import { addMinutes, instantAt } from "@withy/core/zoned-time";
import { type AppointmentStateCode, appointments, diaryClaims } from "@withy/db/schema";
import { stateFacts } from "@withy/diary/appointment-states";
import type { TestPractice } from "./practice";

export interface TestVisit {
  patientId: string;
  /** "2026-12-01" and "10:00" on the practice's clock. */
  day: string;
  time: string;
  minutes?: number;
  values?: VisitValues;
}

/** Columns to set otherwise than usual. */
export type VisitValues = Partial<Omit<typeof appointments.$inferSelect, "practiceId" | "id">>;

/** Puts a visit into the diary without asking any rule: with the therapist in room 1 at Saltgate unless told otherwise. */
export async function addAppointment(
  practice: TestPractice,
  { patientId, day, time, minutes = 30, values = {} }: TestVisit,
) {
  const startsAt = instantAt(day, time, practice.zone);
  if (!startsAt) throw new Error(`${day} ${time} does not exist at the site.`);
  const now = practice.clock.now();
  const appointment = {
    practiceId: practice.practiceId,
    id: newId(),
    siteId: practice.sites.saltgate.id,
    therapistId: practice.staff.therapist.id,
    roomId: practice.rooms.saltgateRoom1.id,
    patientId,
    serviceId: practice.services.followUp.id,
    startsAt,
    endsAt: addMinutes(startsAt, minutes),
    cleanDownMinutes: 5,
    state: "booked" as AppointmentStateCode,
    version: 1,
    createdAt: now,
    createdBy: practice.staff.receptionist.id,
    updatedAt: now,
    ...values,
  };
  await practice.db.insert(appointments).values(appointment);
  if (stateFacts[appointment.state].holdsTime)
    await practice.db.insert(diaryClaims).values(claimsOf(appointment));
  return appointment;
}

/** The five-minute slots that a live appointment holds of its therapist and its room, clean-down included. */
export function claimsOf(visit: {
  practiceId: string;
  id: string;
  therapistId: string;
  roomId: string;
  startsAt: Date;
  endsAt: Date;
  cleanDownMinutes: number;
}) {
  const until = addMinutes(visit.endsAt, visit.cleanDownMinutes);
  const claims: (typeof diaryClaims.$inferInsert)[] = [];
  for (let slotAt = visit.startsAt; slotAt < until; slotAt = addMinutes(slotAt, 5)) {
    for (const resourceId of [visit.therapistId, visit.roomId]) {
      claims.push({ practiceId: visit.practiceId, resourceId, slotAt, appointmentId: visit.id });
    }
  }
  return claims;
}
