import { addDays } from "@withy/core/zoned-time";
import { goalsByRegion, problems } from "./scenario/problems";
import type { EpisodeRow, House, PatientRow, PersonRow, SiteRow, Stage } from "./stage";
import type { Course, ProblemPlan } from "./visit";

const sources = ["self", "self", "self", "gp", "gp", "insurer", "consultant"] as const;

export interface NewCourse {
  patient: PatientRow;
  therapist: PersonRow;
  site: SiteRow;
  day: string;
  at: Date;
  problem?: ProblemPlan;
  side?: "left" | "right" | "both" | "none";
  plannedVisits?: number;
}

export function openCourse(stage: Stage, house: House, wish: NewCourse): Course {
  const { random } = stage;
  const problem = wish.problem ?? random.pick(problems);
  const plannedVisits = wish.plannedVisits ?? random.pick([3, 4, 5, 6, 6, 7, 8, 9, 10]);
  const source = random.pick(sources);
  const goals = (goalsByRegion[problem.region] ?? []).slice(0, random.int(1, 2));
  const episode: EpisodeRow = {
    practiceId: house.practiceId,
    id: stage.newId(),
    patientId: wish.patient.id,
    therapistId: wish.therapist.id,
    siteId: wish.site.id,
    problem: problem.problem,
    region: problem.region,
    side: wish.side ?? random.pick(problem.sides),
    referralSource: source,
    referredBy: source === "gp" ? (wish.patient.gpName ?? null) : null,
    referredOn: source === "gp" ? addDays(wish.day, -random.int(7, 30)) : null,
    reason: source === "gp" ? `${problem.problem}, asked to assess and treat.` : null,
    goals: goals.map((text) => ({ text, setOn: wish.day, metOn: null })),
    plannedVisits,
    openedOn: wish.day,
    redFlags: {},
    createdAt: wish.at,
    updatedAt: wish.at,
  };
  const { patient, therapist, site } = wish;
  return {
    patient,
    therapist,
    site,
    episode,
    problem,
    plannedVisits,
    visits: [],
    kept: 0,
    lastDay: wish.day,
    dueOn: wish.day,
  };
}

/** Weekly at first, then every two weeks. */
export function noteVisit(course: Course, day: string): void {
  course.kept += 1;
  course.lastDay = day;
  course.dueOn = addDays(day, course.kept <= 3 ? 7 : 14);
}

const patienceDays = 35;

/** The course that has waited longest for its next visit, among those who still come. */
export function nextDue(courses: readonly Course[], day: string): Course | null {
  const oldest = addDays(day, -patienceDays);
  let best: Course | null = null;
  for (const course of courses) {
    if (course.kept >= course.plannedVisits || course.dueOn > day || course.lastDay === day) continue;
    if (course.dueOn < oldest) continue;
    if (!best || course.dueOn < best.dueOn) best = course;
  }
  return best;
}
