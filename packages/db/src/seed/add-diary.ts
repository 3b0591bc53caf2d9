import { addMinutes } from "@withy/core/zoned-time";
import { slotsOf } from "@withy/diary/slots";
import { appointmentChanges, appointments, diaryClaims, episodes } from "../schema";
import { type House, notAfterNow, type Stage } from "./stage";
import { type Course, holdsTime, type Visit } from "./visit";

/** The worker prunes older claims; nothing can be booked there any more. */
const claimDays = 60;
const changeDays = 21;
const dayMs = 86_400_000;

const patientReasons = ["Unwell", "Work", "Away that day", "Feels better", "Childcare", "No lift"];
const clinicReasons = ["Therapist unwell", "Room out of use"];
const deskNotes = [
  "Will be five minutes late",
  "Bring the scan report",
  "Pays by bank",
  "Asked for the ground floor",
  "Daughter comes along",
];

/** Writes episodes, visits, what they claim and what was last done to them. */
export function addDiary(
  stage: Stage,
  house: House,
  courses: readonly Course[],
  visits: readonly Visit[],
): void {
  for (const course of courses) stage.rows.add(episodes, { ...course.episode, ...endOf(stage, course) });
  for (const visit of visits) {
    const row = appointmentRow(stage, house, visit);
    stage.rows.add(appointments, row);
    if (holdsTime(visit) && visit.startsAt.getTime() > stage.now.getTime() - claimDays * dayMs)
      addClaims(stage, house, visit);
    addChanges(stage, house, visit, row);
  }
}

/** A course ends when its visits are done, or when nobody came for five weeks. */
function endOf(stage: Stage, course: Course): Partial<typeof episodes.$inferInsert> {
  const last = course.visits.filter((visit) => visit.state === "fulfilled").at(-1);
  const hasMore = course.visits.some((visit) => visit.endsAt > stage.now);
  if (!last || hasMore) return {};
  const isDone = course.kept >= course.plannedVisits;
  const dischargedAt = isDone ? addMinutes(last.endsAt, 25) : new Date(last.endsAt.getTime() + 35 * dayMs);
  if (dischargedAt > stage.now) return {};
  const goals = (course.episode.goals ?? []).map((goal) => ({ ...goal, metOn: isDone ? last.day : null }));
  return {
    state: "discharged",
    dischargedAt,
    dischargedBy: course.therapist.id,
    outcome: isDone ? (stage.random.chance(0.75) ? "goals-met" : "goals-partly-met") : "stopped-attending",
    goals,
    version: 2,
    updatedAt: dischargedAt,
  };
}

function appointmentRow(
  { random, now }: Stage,
  house: House,
  visit: Visit,
): typeof appointments.$inferInsert {
  const { state, startsAt, endsAt } = visit;
  const isSeen = state === "fulfilled" || state === "in-session";
  const arrivedAt = isSeen || state === "arrived" ? addMinutes(startsAt, -random.int(0, 10)) : null;
  const byClinic = state === "cancelled" && random.chance(0.12);
  const isLate =
    state === "cancelled" &&
    !byClinic &&
    visit.cancelledAt !== null &&
    startsAt.getTime() - visit.cancelledAt.getTime() < dayMs;
  return {
    practiceId: house.practiceId,
    id: visit.id,
    siteId: visit.site.id,
    therapistId: visit.therapist.id,
    roomId: visit.room.id,
    patientId: visit.course.patient.id,
    serviceId: visit.service.id,
    episodeId: visit.course.episode.id,
    startsAt,
    endsAt,
    cleanDownMinutes: visit.service.cleanDownMinutes ?? 0,
    state,
    deskNote: random.chance(0.05) ? random.pick(deskNotes) : null,
    arrivedAt: arrivedAt && notAfterNow({ now }, arrivedAt),
    sessionStartedAt: isSeen ? startsAt : null,
    sessionEndedAt: state === "fulfilled" ? endsAt : null,
    cancelledAt: visit.cancelledAt,
    cancelledBy: state === "cancelled" ? (byClinic ? "clinic" : "patient") : null,
    cancelReason: state === "cancelled" ? random.pick(byClinic ? clinicReasons : patientReasons) : null,
    isLateCancellation: isLate,
    version: state === "booked" ? 1 : 2,
    createdAt: visit.bookedAt,
    createdBy: random.pick(house.desk).id,
    updatedAt: lastTouched(visit, now),
  };
}

function lastTouched(visit: Visit, now: Date): Date {
  if (visit.cancelledAt) return visit.cancelledAt;
  if (visit.state === "booked" || visit.state === "confirmed") return visit.bookedAt;
  return notAfterNow({ now }, visit.endsAt);
}

function addClaims({ rows }: Stage, house: House, visit: Visit): void {
  const until = addMinutes(visit.endsAt, visit.service.cleanDownMinutes ?? 0);
  for (const slotAt of slotsOf(visit.startsAt, until)) {
    const claim = { practiceId: house.practiceId, slotAt, appointmentId: visit.id };
    rows.add(
      diaryClaims,
      { ...claim, resourceId: visit.therapist.id },
      { ...claim, resourceId: visit.room.id },
    );
  }
}

type Row = typeof appointments.$inferInsert;

/** "Recent changes" and undo read these: the booking, and what made the visit what it is now. */
function addChanges({ rows, newId, now, random }: Stage, house: House, visit: Visit, row: Row): void {
  const since = now.getTime() - changeDays * dayMs;
  const shot = (state: string) => ({
    state,
    startsAt: visit.startsAt.toISOString(),
    endsAt: visit.endsAt.toISOString(),
    siteId: visit.site.id,
    therapistId: visit.therapist.id,
    roomId: visit.room.id,
  });
  const change = (
    kind: "booked" | "cancelled" | "marked",
    before: string | null,
    after: string,
    changedAt: Date,
  ) => ({
    practiceId: house.practiceId,
    id: newId(),
    appointmentId: visit.id,
    siteId: visit.site.id,
    kind,
    before: before === null ? null : shot(before),
    after: shot(after),
    changedBy: random.pick(house.desk).id,
    changedAt,
  });
  if (visit.bookedAt.getTime() > since)
    rows.add(appointmentChanges, change("booked", null, "booked", visit.bookedAt));
  if (visit.cancelledAt && visit.cancelledAt.getTime() > since) {
    rows.add(appointmentChanges, change("cancelled", "booked", "cancelled", visit.cancelledAt));
  }
  const at = row.updatedAt;
  if (visit.startsAt.getTime() < since || visit.cancelledAt || visit.state === "booked") return;
  const before = {
    fulfilled: "in-session",
    "in-session": "arrived",
    arrived: "confirmed",
    confirmed: "booked",
    noshow: "booked",
  } as const;
  const from = before[visit.state as keyof typeof before];
  if (from) rows.add(appointmentChanges, change("marked", from, visit.state, at));
}
