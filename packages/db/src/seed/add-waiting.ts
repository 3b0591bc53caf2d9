import { createHash } from "node:crypto";
import { auditEvents, offerRounds, waitingEntries, waitingOffers } from "../schema";
import type { WaitingWishes } from "../schema/diary/waiting-list";
import type { House, PersonRow, Stage } from "./stage";
import { type Course, holdsTime, type Visit } from "./visit";

const waitingPeople = 12;
const hourMs = 3_600_000;
const dayMs = 24 * hourMs;

type Entry = typeof waitingEntries.$inferInsert & { readonly later: Visit };

/** What twelve people would take, in the order in which they are put down; the first two have a time on offer. */
function wishesOf(n: number, therapist: PersonRow, siteId: string): WaitingWishes {
  const table: WaitingWishes[] = [
    {},
    { siteIds: [siteId] },
    { weekdays: [1, 3, 5], partsOfDay: ["morning"] },
    { therapistIds: [therapist.id] },
    { partsOfDay: ["afternoon", "evening"], noticeHours: 24 },
    { siteIds: [siteId], weekdays: [2, 4] },
    {},
    { partsOfDay: ["morning"], noticeHours: 2 },
    { weekdays: [1, 2, 3, 4, 5] },
    { therapistIds: [therapist.id], partsOfDay: ["evening"] },
    { siteIds: [siteId], noticeHours: 48 },
    {},
  ];
  return table[n] ?? {};
}

const urgencyOf = (n: number): "routine" | "soon" | "urgent" =>
  n === 2 ? "urgent" : n % 4 === 1 ? "soon" : "routine";
const notes = [
  "Rings back after five",
  null,
  "Works nights, mornings are late for her",
  null,
  "Can come at once",
];

/** People who have a follow-up ahead and would come sooner, one for each course. */
function waiters(courses: readonly Course[], now: Date): { course: Course; later: Visit }[] {
  return courses
    .flatMap((course) => {
      const later = course.visits.find(
        (visit) =>
          visit.state === "booked" && !visit.isFirst && visit.startsAt.getTime() > now.getTime() + 6 * dayMs,
      );
      return later && course.patient.email ? [{ course, later }] : [];
    })
    .slice(0, waitingPeople);
}

/** A dozen people on the waiting list, and one time on offer to two of them. */
export function addWaiting(stage: Stage, house: House, courses: readonly Course[]): void {
  const { rows, newId, now } = stage;
  const { practiceId } = house;
  const entries = waiters(courses, now).map(({ course, later }, n) => ({
    practiceId,
    id: newId(),
    patientId: course.patient.id,
    serviceId: later.service.id,
    wishes: wishesOf(n, later.therapist, later.site.id),
    urgency: urgencyOf(n),
    insteadOfId: n % 3 === 2 ? null : later.id,
    deskNote: notes[n % notes.length] ?? null,
    state: "waiting" as const,
    waitingSince: new Date(now.getTime() - (1 + n * 2) * dayMs),
    createdBy: deskOf(house, n),
    updatedAt: now,
    later,
  }));
  rows.add(waitingEntries, ...entries.map(({ later: _, ...entry }) => entry));
  const freed = freedVisit(courses, now);
  if (freed) addRound(stage, house, entries, freed);
}

const deskOf = (house: House, n: number): string => house.desk[n % house.desk.length]?.id ?? "";

/** A cancelled visit of the next days whose time nobody has taken. */
function freedVisit(courses: readonly Course[], now: Date): Visit | undefined {
  const visits = courses.flatMap((course) => course.visits);
  const isAhead = (visit: Visit): boolean =>
    visit.startsAt.getTime() > now.getTime() + 2 * dayMs &&
    visit.startsAt.getTime() < now.getTime() + 6 * dayMs;
  return visits.find(
    (freed) =>
      freed.state === "cancelled" &&
      !freed.isFirst &&
      isAhead(freed) &&
      !visits.some(
        (other) =>
          holdsTime(other) &&
          other.therapist === freed.therapist &&
          other.startsAt < freed.endsAt &&
          other.endsAt > freed.startsAt,
      ),
  );
}

/** Their links were sent in another life: nobody knows the tokens behind these hashes. */
function addRound(stage: Stage, house: House, entries: readonly Entry[], freed: Visit): void {
  const { rows, newId, now } = stage;
  const { practiceId } = house;
  const createdBy = deskOf(house, 0);
  const createdAt = new Date(now.getTime() - 20 * 60_000);
  const asked = entries.filter(
    (entry) => Object.keys(entry.wishes).length === 0 && entry.later.startsAt > freed.endsAt,
  );
  const round = {
    ...{
      practiceId,
      id: newId(),
      siteId: freed.site.id,
      therapistId: freed.therapist.id,
      freedById: freed.id,
    },
    ...{ startsAt: freed.startsAt, endsAt: freed.endsAt, createdAt, createdBy },
    expiresAt: new Date(now.getTime() + 26 * hourMs),
  };
  if (asked.length === 0) return;
  rows.add(offerRounds, round);
  rows.add(
    waitingOffers,
    ...asked.slice(0, 3).map((entry, n) => {
      const id = newId();
      const tokenHash = createHash("sha256").update(`${id} ${round.id}`).digest();
      const isNo = n === 1;
      const state = isNo ? ("declined" as const) : ("open" as const);
      const decidedAt = isNo ? new Date(now.getTime() - 8 * 60_000) : null;
      return {
        practiceId,
        id,
        roundId: round.id,
        entryId: entry.id,
        rank: n + 1,
        tokenHash,
        state,
        decidedAt,
        createdAt,
      };
    }),
  );
  const about = { subjectKind: "offer-round", subjectId: round.id, siteId: round.siteId, patientId: null };
  const deed = { practiceId, id: newId(), requestId: newId(), at: createdAt, actorId: createdBy };
  rows.add(auditEvents, {
    ...deed,
    ...about,
    action: "offer-round.made",
    detail: { startsAt: freed.startsAt.toISOString() },
  });
}
