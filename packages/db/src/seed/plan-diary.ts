import { addDays, daysBetween, instantAt } from "@withy/core/zoned-time";
import { makePatients } from "./add-patient";
import { nextDue, noteVisit, openCourse } from "./courses";
import { cast as castOfMarram } from "./scenario/names";
import { type House, type PersonRow, type RoomRow, type ServiceRow, type Stage, serviceOf } from "./stage";
import type { Course, Visit } from "./visit";
import { fateOf, fillOf } from "./visit-fate";
import { clockOf, makeWorkingDays, type WorkingDay } from "./working-day";

export const daysBack = 98;
export const daysAhead = 56;

/** A visit that the story needs at a time of its own. */
export interface FixedVisit {
  readonly therapist: PersonRow;
  readonly day: string;
  readonly fromMinute: number;
  readonly course: () => Course;
  readonly isFirst: boolean;
}

interface DayAt {
  readonly therapist: PersonRow;
  readonly day: string;
  readonly work: WorkingDay;
  readonly room: RoomRow;
}

export interface Leave {
  readonly therapistId: string;
  readonly from: string;
  readonly to: string;
}

/**
 * Makes up the diary day by day: each therapist's free stretches are filled with first visits and with the courses
 * that are due, as full as that day would be by now. Nothing overlaps, since each stretch is filled in order.
 */
export function planDiary(stage: Stage, house: House, fixed: readonly FixedVisit[], leave: readonly Leave[]) {
  const courses = new Map<string, Course[]>(house.therapists.map((therapist) => [therapist.id, []]));
  const visits: Visit[] = [];
  const newPatient = makePatients(stage, house);
  const cast = house.plan.sites[0]?.key === "saltgate" ? [...castOfMarram] : [];
  const workingDay = makeWorkingDays(stage, house);
  const startCourse = ({ therapist, day, work }: DayAt, at: Date): Course => {
    const known =
      day >= addDays(stage.today, -42) && work.site.plan.key === "saltgate" ? cast.shift() : undefined;
    const patient = newPatient({
      site: work.site,
      therapist,
      since: new Date(at.getTime() - 4 * 86_400_000),
      ...(known ? { cast: known } : {}),
    });
    return openCourse(stage, house, { patient, therapist, site: work.site, day, at });
  };
  for (let offset = -daysBack; offset <= daysAhead; offset += 1) {
    const day = addDays(stage.today, offset);
    const roomsTaken = new Map<string, number>();
    for (const therapist of house.therapists) {
      const work = workingDay(therapist, day);
      if (!work || leave.some((off) => off.therapistId === therapist.id && off.from <= day && day <= off.to))
        continue;
      const room = nextRoom(work, therapist, roomsTaken);
      if (!room) continue;
      const own = therapist.plan.isGymOnly ? gymCourses(courses, work) : (courses.get(therapist.id) ?? []);
      const wanted = fixed.filter((visit) => visit.therapist.id === therapist.id && visit.day === day);
      visits.push(...fillDay(stage, house, { therapist, day, work, room }, own, wanted, startCourse));
    }
  }
  return { visits, courses: [...new Set(visits.map((visit) => visit.course))] };
}

function nextRoom(work: WorkingDay, therapist: PersonRow, taken: Map<string, number>): RoomRow | null {
  if (therapist.plan.isGymOnly) return work.site.gymRooms[0] ?? null;
  const at = taken.get(work.site.id) ?? 0;
  taken.set(work.site.id, at + 1);
  return work.site.treatmentRooms[at] ?? null;
}

/** Gym sessions are part of courses that began in a treatment room at the same site. */
const gymCourses = (courses: ReadonlyMap<string, Course[]>, work: WorkingDay): Course[] =>
  [...courses.values()].flat().filter((course) => course.site.id === work.site.id && course.kept >= 2);

function fillDay(
  stage: Stage,
  house: House,
  at: DayAt,
  own: Course[],
  wanted: readonly FixedVisit[],
  startCourse: (at: DayAt, when: Date) => Course,
): Visit[] {
  const { random } = stage;
  const ahead = daysBetween(stage.today, at.day);
  const fill = fillOf(ahead, house.plan.busyness);
  const made: Visit[] = [];
  const usual = serviceOf(house, at.therapist.plan.isGymOnly ? "gym" : "followUp");
  const first = serviceOf(house, "initial");
  const lengthOf = (service: ServiceRow) => service.durationMinutes + (service.cleanDownMinutes ?? 0);
  const place = (
    minute: number,
    service: ServiceRow,
    course: Course | null,
    isFirst: boolean,
    isCertain = false,
  ): Visit | null => {
    const startsAt = instantAt(at.day, clockOf(minute), stage.zone);
    if (!startsAt) return null;
    const whose = course ?? startCourse(at, startsAt);
    if (!course) own.push(whose);
    const visit = makeVisit(stage, at, whose, service, startsAt, { isFirst, isCertain });
    made.push(visit);
    return visit;
  };
  for (const stretch of at.work.stretches) {
    let minute = stretch.from;
    while (minute < stretch.to) {
      const next = wanted
        .filter((visit) => visit.fromMinute >= minute && visit.fromMinute < stretch.to)
        .sort((a, b) => a.fromMinute - b.fromMinute)[0];
      if (next?.fromMinute === minute) {
        const service = next.isFirst ? first : usual;
        const course = next.course();
        place(minute, service, course, next.isFirst, true);
        minute += lengthOf(service);
        continue;
      }
      const free = (next?.fromMinute ?? stretch.to) - minute;
      const course = nextDue(own, at.day);
      const canStart = !at.therapist.plan.isGymOnly && free >= lengthOf(first);
      const isFirst = canStart && random.chance(course ? 0.13 : ahead > 0 ? 0.2 : 0.45);
      const service = isFirst ? first : usual;
      if (free < lengthOf(service) || !random.chance(fill) || (!isFirst && !course)) {
        minute += Math.min(free, 30);
        continue;
      }
      const visit = place(minute, service, isFirst ? null : course, isFirst);
      // A cancelled visit gives its time back; more often than not someone else takes it.
      if (visit?.state !== "cancelled" || random.chance(0.4)) minute += lengthOf(service);
    }
  }
  return made;
}

function makeVisit(
  stage: Stage,
  at: DayAt,
  course: Course,
  service: ServiceRow,
  startsAt: Date,
  { isFirst, isCertain }: { isFirst: boolean; isCertain: boolean },
): Visit {
  const endsAt = new Date(startsAt.getTime() + service.durationMinutes * 60_000);
  const fate = fateOf(stage, startsAt, endsAt, { isFirst, isCertain });
  const visit: Visit = {
    id: stage.newId(),
    course,
    therapist: at.therapist,
    site: at.work.site,
    room: at.room,
    service,
    day: at.day,
    startsAt,
    endsAt,
    isFirst,
    ...fate,
  };
  course.visits.push(visit);
  if (fate.state === "fulfilled" || endsAt > stage.now) noteVisit(course, at.day);
  else course.dueOn = addDays(at.day, 3);
  return visit;
}
