import { findMeasure } from "@withy/clinical/measures/catalogue";
import type { MeasureEntry } from "@withy/clinical/measures/entry";
import { scoreMeasure, scoringEdition } from "@withy/clinical/measures/score";
import { type MeasureAnswers, measureRecords } from "../schema";
import type { NoteRow } from "./add-notes";
import { type House, notAfterNow, type Stage } from "./stage";
import type { Course, Visit } from "./visit";

const activities: Readonly<Record<string, readonly string[]>> = {
  "lower-back": ["Sitting an hour", "Lifting the shopping", "Turning in bed"],
  knee: ["Stairs down", "Kneeling", "Walking the dog"],
  hip: ["Putting on socks", "Stairs up", "Walking to the harbour"],
  shoulder: ["Reaching the top shelf", "Fastening a belt behind", "Lying on that side"],
};
const legs = new Set(["knee", "hip", "balance"]);

/** Writes one filling-in, scored by the published rule. */
export function addMeasure(
  stage: Stage,
  house: House,
  visit: Visit,
  note: NoteRow | undefined,
  key: string,
  entry: MeasureEntry,
): void {
  const measure = findMeasure(key);
  if (!measure) throw new RangeError(`There is no measure ${key}.`);
  stage.rows.add(measureRecords, {
    practiceId: house.practiceId,
    id: stage.newId(),
    episodeId: visit.course.episode.id,
    patientId: visit.course.patient.id,
    noteId: note?.id ?? null,
    measureKey: key,
    ruleVersion: scoringEdition,
    answers: asKept(entry),
    scores: Object.fromEntries(scoreMeasure(measure, entry).map(({ scale, value }) => [scale, value])),
    takenOn: visit.day,
    enteredBy: visit.therapist.id,
    enteredAt: notAfterNow(stage, visit.endsAt),
  });
}

function asKept(entry: MeasureEntry): MeasureAnswers {
  if (entry.form === "items") return { items: [...entry.answers] };
  if (entry.form === "activities")
    return { items: entry.activities.map((a) => a.score), labels: entry.activities.map((a) => a.name) };
  return entry.form === "reading" ? { items: [entry.value], details: {} } : { items: [entry.value] };
}

const clamp = (value: number, from: number, to: number) => Math.min(to, Math.max(from, Math.round(value)));

/** Pain at most visits, the patient's own activities at the first and every third, the chair stand for legs: better as visits go by. */
export function addMeasures(
  stage: Stage,
  house: House,
  courses: readonly Course[],
  noteOf: ReadonlyMap<string, NoteRow>,
): void {
  const { random } = stage;
  for (const course of courses) {
    const seen = course.visits.filter((visit) => visit.state === "fulfilled");
    const start = random.int(5, 8);
    const pace = 0.35 + random.next() * 0.75;
    const named = activities[course.episode.region] ?? [];
    const stands = random.int(7, 11);
    seen.forEach((visit, i) => {
      const note = noteOf.get(visit.id);
      const pain = clamp(start - pace * i + random.int(-1, 1), 0, 10);
      if (i === 0 || random.chance(0.6))
        addMeasure(stage, house, visit, note, "pain-rating", { form: "items", answers: [pain] });
      if (i % 3 !== 0) return;
      if (named.length > 0) {
        const scored = named.map((name) => ({
          name,
          score: clamp(10 - start + pace * i * 1.2 + random.int(-1, 1), 0, 10),
        }));
        addMeasure(stage, house, visit, note, "patient-specific-functional", {
          form: "activities",
          activities: scored,
        });
      }
      if (legs.has(course.episode.region)) {
        addMeasure(stage, house, visit, note, "chair-stand-30", {
          form: "reading",
          value: clamp(stands + pace * i * 0.8, 0, 25),
        });
      }
    });
  }
}
