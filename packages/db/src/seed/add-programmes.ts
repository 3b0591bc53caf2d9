import { checkIssue } from "@withy/clinical/programmes/check-programme";
import { emptyProgramme, newItems } from "@withy/clinical/programmes/new-item";
import type { Programme } from "@withy/clinical/programmes/programme";
import { addMinutes } from "@withy/core/zoned-time";
import { programmes, programmeVersions } from "../schema";
import type { House, Stage } from "./stage";
import type { Course } from "./visit";

const usual: Readonly<Record<string, readonly string[]>> = {
  hip: ["sit-to-stand", "bridge", "side-leg-lift", "heel-raise"],
  knee: ["sit-to-stand", "step-up", "wall-sit", "heel-raise"],
  "lower-back": ["bridge", "bird-dog", "hip-hinge", "knee-rolls"],
  shoulder: ["book-opening", "side-plank"],
  balance: ["sit-to-stand", "heel-raise", "one-leg-stand", "heel-to-toe-walk"],
  "ankle-foot": ["heel-raise", "one-leg-stand", "ankle-turn-out"],
  "lower-leg": ["heel-raise", "calf-stretch"],
};

/** Ten timed items over two rounds: movements of one side stand once for each side. Twenty minutes with the rests. */
export const harbourProgramme = [
  "sit-to-stand",
  "step-up",
  "bridge",
  "side-leg-lift",
  "heel-raise",
  "hip-hinge",
  "backward-leg-reach",
];

export interface ProgrammePlan {
  title: string;
  exercises: readonly string[];
  change?: (content: Programme) => Programme;
  givenAt: Date;
}

/** Writes a programme that was given to the patient. @throws RangeError where the library no longer has an exercise */
export function addProgramme(stage: Stage, house: House, course: Course, plan: ProgrammePlan): void {
  const { practiceId } = house;
  let line = 0;
  const nextLine = () => {
    line += 1;
    return `line-${line}`;
  };
  const items = plan.exercises.flatMap((exercise) => newItems(exercise, "timed", nextLine));
  const plain: Programme = { ...emptyProgramme, items };
  const content = plan.change ? plan.change(plain) : plain;
  const wrong = checkIssue(content);
  if (wrong) throw new RangeError(`${plan.title}: ${wrong.message}`);
  const id = stage.newId();
  const by = course.therapist.id;
  stage.rows.add(programmes, {
    practiceId,
    id,
    episodeId: course.episode.id,
    patientId: course.patient.id,
    title: plan.title,
    version: 2,
    createdAt: addMinutes(plan.givenAt, -12),
    createdBy: by,
    updatedAt: plan.givenAt,
  });
  stage.rows.add(programmeVersions, {
    practiceId,
    programmeId: id,
    versionNumber: 1,
    content: { ...content },
    savedAt: addMinutes(plan.givenAt, -1),
    savedBy: by,
    issuedAt: plan.givenAt,
    issuedBy: by,
  });
}

/** Most courses have a programme from their first attended visit on. */
export function addProgrammes(stage: Stage, house: House, courses: readonly Course[]): void {
  for (const course of courses) {
    const exercises = usual[course.episode.region];
    const first = course.visits.find((visit) => visit.state === "fulfilled");
    if (!exercises || !first || !stage.random.chance(0.5)) continue;
    addProgramme(stage, house, course, {
      title: "Programme 1",
      exercises,
      givenAt: addMinutes(first.endsAt, -3),
    });
  }
}
