import { addDays, instantAt } from "@withy/core/zoned-time";
import { consents, type episodes, patientAlerts, patients } from "../schema";
import { addMeasure } from "./add-measures";
import type { NoteRow } from "./add-notes";
import { addProgramme, harbourProgramme } from "./add-programmes";
import { openCourse } from "./courses";
import type { FixedVisit } from "./plan-diary";
import { type House, type PersonRow, type Stage, siteOf } from "./stage";
import type { Course } from "./visit";
import { type makeWorkingDays, minutesOf, workedOnOrBefore } from "./working-day";

/** Weeks before today of her visits so far; today's is the sixth. */
const weeksBack = [8, 5, 3, 2, 1];

/** Eleri Tamworth's left hip: the one record that the demonstration tells in full. */
export function planEleri(
  stage: Stage,
  house: House,
  workingDay: ReturnType<typeof makeWorkingDays>,
): { course: Course; fixed: FixedVisit[] } {
  const nia = house.therapists.find((person) => person.familyName === "Prosser");
  if (!nia) throw new RangeError("The scenario has no Nia Prosser.");
  const days = [
    ...weeksBack.map((weeks) => workedOnOrBefore(workingDay, nia, addDays(stage.today, -7 * weeks))),
    stage.today,
  ];
  const firstDay = days[0] ?? stage.today;
  const course = addHer(stage, house, nia, firstDay);
  const next = workedOnOrBefore(workingDay, nia, addDays(stage.today, 7));
  const fixed = [...days, ...(next > stage.today ? [next] : [])].map((day, i) => ({
    therapist: nia,
    day,
    fromMinute: minutesOf(i === 0 ? "14:00" : "10:00"),
    course: () => course,
    isFirst: i === 0,
  }));
  return { course, fixed };
}

function addHer(stage: Stage, house: House, nia: PersonRow, firstDay: string): Course {
  const { rows, newId, zone } = stage;
  const site = siteOf(house, "saltgate");
  const at = instantAt(firstDay, "09:00", zone) ?? stage.now;
  const [surgery] = house.surgeries;
  const patient: typeof patients.$inferInsert = {
    practiceId: house.practiceId,
    id: newId(),
    givenName: "Eleri",
    familyName: "Tamworth",
    preferredName: "Ellie",
    bornOn: "1963-06-22",
    sex: "female",
    phone: "+447700900731",
    email: "e.tamworth@post.example",
    addressLines: ["9 Kelp Street", "Easterhaven"],
    postcode: "ZZ4 6RN",
    nhsNumber: "9993142786",
    gpPracticeId: surgery?.row.id ?? null,
    gpName: surgery?.doctors[0] ?? null,
    communicationNeeds: "Ring, do not text: reads with a magnifier. Large print for letters.",
    preferredChannel: "phone",
    nextOfKin: "Huw Tamworth, husband, 01632 960188",
    homeSiteId: site.id,
    usualTherapistId: nia.id,
    nameLastFirst: "tamworth eleri",
    nameFirstLast: "eleri tamworth",
    phoneReversed: "137009007744",
    createdAt: at,
    updatedAt: at,
  };
  rows.add(patients, patient);
  const recordedBy = house.desk[0]?.id ?? nia.id;
  const key = { practiceId: house.practiceId, patientId: patient.id };
  rows.add(
    consents,
    { ...key, id: newId(), kind: "treatment", wordingVersion: "4", givenAt: at, recordedBy },
    { ...key, id: newId(), kind: "letter-to-gp", wordingVersion: "2", givenAt: at, recordedBy },
  );
  rows.add(patientAlerts, {
    ...key,
    id: newId(),
    text: "Anticoagulant. Ask before any hands-on technique",
    isClinical: true,
    createdAt: at,
    createdBy: nia.id,
  });
  const problem = { problem: "Hip osteoarthritis", region: "hip", sides: ["left"] as const };
  const course = openCourse(stage, house, {
    patient,
    therapist: nia,
    site,
    day: firstDay,
    at,
    problem,
    side: "left",
    plannedVisits: 7,
  });
  Object.assign(course.episode, {
    referralSource: "gp",
    referredBy: patient.gpName,
    referredOn: addDays(firstDay, -53),
    reason: "Six months of left groin pain on walking and stairs.",
    goals: [
      { text: "Walk to the harbour and back, 30 minutes", setOn: firstDay, metOn: null },
      { text: "Stairs foot over foot, no rail", setOn: firstDay, metOn: null },
    ],
    redFlags: {
      "hot-joint": "absent",
      trauma: "absent",
      "thin-bones": "absent",
      steroids: "absent",
      "past-cancer": "absent",
      "weight-loss": "absent",
      "night-pain": "absent",
      fever: "absent",
      immune: "absent",
    },
  } satisfies Partial<typeof episodes.$inferInsert>);
  return course;
}

const told: readonly Record<string, string>[] = [
  {
    history:
      "Six months of pain in the left groin on walking and stairs, came on slowly. Stiff for half an hour on rising.",
    impact: "Walks to the harbour no longer. Stairs one at a time. Wants the harbour walk back most.",
    background: "Atrial fibrillation, takes an anticoagulant. No operations. No allergies known.",
    examination:
      "Left hip flexion 90°, internal rotation 10°; right 120° and 35°. Chair stand 9 in 30 seconds. Hip drops on single-leg stand.",
    assessment: "Osteoarthritis of the left hip on history and examination. No red flags.",
    consent: "Explained what I found, the options and their risks; agreed to go on.",
    treatment: "Sit to stand, bridge and side leg lift, taught and practised.",
    advice: "Pain up to 5 of 10 is fine if settled by the next morning. When to ring us explained.",
    plan: "Seven visits. Programme of 20 minutes on three days a week.",
  },
  {
    history: "Sleeps better. Groin sore after the stairs at her sister's.",
    examination: "Flexion 90°, internal rotation 10°. Step up 10 cm with the rail.",
    treatment: "Step up 10 cm, heel raise, hip hinge with hands to knees.",
    plan: "Programme as it is, add the step.",
  },
  {
    history: "Did the exercises on five of six days. Walked ten minutes.",
    examination: "Flexion 95°. Chair stand 11.",
    treatment: "Step up 10 cm without the rail, three sets of eight.",
    plan: "Walk on the days between.",
  },
  {
    history: "Walked 15 minutes once. Stairs one at a time. Wakes if she lies on the left.",
    examination: "Flexion 95°, internal rotation 12°. Step up 10 cm controlled, hip drops at the eighth.",
    treatment: "Lower chair for sit to stand. Side leg lift with a straight knee.",
    plan: "Step to 15 cm when ten are level. Walk twice.",
  },
  {
    history:
      "Walks to the harbour and back, 25 minutes, twice since last week. Stiff ten minutes on rising, was thirty.",
    examination: "Flexion 105°, internal rotation 20°. Chair stand 12.",
    treatment: "Sit to stand from a low chair, no hands. Step up 15 cm, rail in reach, left leads.",
    plan: "Bring the plan forward; think about discharge.",
  },
  {
    history: "Stairs easier with the rail. No night pain.",
    examination: "Flexion 105°, internal rotation 20°. Chair stand 13.",
    treatment: "Sit to stand made harder: low chair, no hands, three sets of eight.",
  },
];

/** Her notes in their own words, her measures, and her programme of ten items in two rounds. */
export function tellEleri(
  stage: Stage,
  house: House,
  course: Course,
  noteOf: ReadonlyMap<string, NoteRow>,
): void {
  const seen = course.visits.filter((visit) => visit.state === "fulfilled");
  seen.forEach((visit, i) => {
    const note = noteOf.get(visit.id);
    addMeasure(stage, house, visit, note, "pain-rating", {
      form: "items",
      answers: [[6, 6, 5, 5, 4, 3][i] ?? 3],
    });
    const stands = [9, null, 11, null, 12, 13][i];
    if (typeof stands === "number")
      addMeasure(stage, house, visit, note, "chair-stand-30", { form: "reading", value: stands });
    const pain = [21, null, 17, null, 15, 11][i];
    if (typeof pain === "number")
      addMeasure(stage, house, visit, note, "hoos", { form: "items", answers: hoosAnswers(pain) });
  });
  const given = seen[0];
  if (!given) return;
  addProgramme(stage, house, course, {
    title: "Harbour programme",
    exercises: harbourProgramme,
    givenAt: given.endsAt,
    change: (content) => ({
      ...content,
      advice: "Keep pain at 5 of 10 or under, settled by the next morning.",
    }),
  });
}

/** Forty answers of 0 to 4 whose ten pain items add up to `painSum`; only numbers, the questions belong to their authors. */
function hoosAnswers(painSum: number): number[] {
  const share = (sum: number, items: number) =>
    Array.from({ length: items }, (_, i) => Math.floor(sum / items) + (i < sum % items ? 1 : 0));
  const ratio = painSum / 10;
  return [
    ...share(Math.round(ratio * 5), 5),
    ...share(painSum, 10),
    ...share(Math.round(ratio * 17), 17),
    ...share(Math.round(ratio * 4), 4),
    ...share(Math.round(ratio * 4), 4),
  ];
}

export const wordsOfEleri = (number: number): Record<string, string> => {
  const words = told[number - 1] ?? told[told.length - 1] ?? {};
  return number === 1
    ? words
    : { ...words, consent: "Explained what I found, the options and their risks; agreed to go on." };
};
