import { createHash } from "node:crypto";
import { placeWords } from "@withy/clinical/episodes/sides";
import { longDate, plainDateWords } from "@withy/core/date-words";
import { addMinutes, dayOf } from "@withy/core/zoned-time";
import {
  type LetterSection,
  type LetterSentence,
  letterDeliveries,
  letters,
  measureRecords,
} from "../schema";
import { type House, notAfterNow, type Stage } from "./stage";
import type { Course, Visit } from "./visit";

const alphabet = "23456789ABCDEFGHJKMNPQRSTVWXYZ";

/** A discharge letter to the GP for most courses that ended as planned, signed and posted the same day. */
export function addLetters(
  stage: Stage,
  house: House,
  courses: readonly Course[],
  endedOn: ReadonlyMap<string, Date>,
): void {
  const painOf = lastAndFirstPain(stage);
  for (const course of courses) {
    const endedAt = endedOn.get(course.episode.id);
    const seen = course.visits.filter((visit) => visit.state === "fulfilled");
    const [first, last] = [seen[0], seen.at(-1)];
    const surgery = house.surgeries.find(({ row }) => row.id === course.patient.gpPracticeId);
    if (
      !endedAt ||
      !first ||
      !last ||
      !surgery ||
      course.kept < course.plannedVisits ||
      !stage.random.chance(0.7)
    )
      continue;
    addLetter(stage, house, course, {
      endedAt,
      first,
      last,
      seen: seen.length,
      pain: painOf.get(course.episode.id),
      surgery: surgery.row,
    });
  }
}

interface Ending {
  endedAt: Date;
  first: Visit;
  last: Visit;
  seen: number;
  pain: { from: number; to: number; recordId: string } | undefined;
  surgery: House["surgeries"][number]["row"];
}

function lastAndFirstPain({ rows }: Stage) {
  const found = new Map<string, { from: number; to: number; recordId: string }>();
  for (const record of rows.of(measureRecords)) {
    const value = record.scores.pain;
    if (record.measureKey !== "pain-rating" || typeof value !== "number") continue;
    const before = found.get(record.episodeId);
    found.set(record.episodeId, { from: before?.from ?? value, to: value, recordId: record.id });
  }
  return found;
}

function addLetter(stage: Stage, house: House, course: Course, ending: Ending): void {
  const { random, rows, newId } = stage;
  const { practiceId } = house;
  const { patient, therapist } = course;
  const signedAt = notAfterNow(stage, addMinutes(ending.endedAt, random.int(5, 180)));
  const id = newId();
  const signature = {
    datedOn: dayOf(signedAt, stage.zone),
    signedName: `${therapist.givenName} ${therapist.familyName}`,
    registrationNumber: therapist.registrationNumber ?? "",
  };
  const { surgery } = ending;
  const address = [surgery.name, ...surgery.addressLines, surgery.postcode];
  const recipient = {
    kind: "gp" as const,
    name: patient.gpName ?? surgery.name,
    addressLines: address,
    email: surgery.email ?? null,
  };
  const sections = sectionsOf(course, ending);
  const bodyHash = createHash("sha256")
    .update(JSON.stringify([id, patient.id, signature, recipient, sections]), "utf8")
    .digest("hex");
  const reference = `L-${Array.from({ length: 6 }, () => alphabet[random.int(0, alphabet.length - 1)]).join("")}`;
  rows.add(letters, {
    practiceId,
    id,
    episodeId: course.episode.id,
    patientId: patient.id,
    authorId: therapist.id,
    kind: "discharge",
    reference,
    state: "signed",
    recipient,
    sections,
    ...signature,
    version: 2,
    createdAt: ending.endedAt,
    updatedAt: signedAt,
    signedAt,
    signedBy: therapist.id,
    bodyHash,
  });
  rows.add(letterDeliveries, {
    practiceId,
    id: newId(),
    letterId: id,
    channel: "print",
    toName: recipient.name,
    toAddress: address.join(", "),
    requestedBy: therapist.id,
    requestedAt: signedAt,
    postedOn: signature.datedOn,
  });
}

function sectionsOf(course: Course, { first, last, seen, pain }: Ending): LetterSection[] {
  const { episode, patient } = course;
  const fromEpisode = { kind: "episode", id: episode.id, label: "Episode" };
  const sentence = (
    id: string,
    text: string,
    source: LetterSentence["source"],
    actor: string | null = null,
  ): LetterSentence => ({
    id,
    text,
    source,
    assembled: source ? text : null,
    keptBecause: null,
    actor,
  });
  const place = placeWords(episode.region, episode.side).toLowerCase();
  const goals = (episode.goals ?? []).map((goal) => goal.text);
  return [
    {
      key: "diagnoses",
      heading: "Diagnoses",
      sentences: [sentence("diagnoses:problem", `${episode.problem} (${place}).`, fromEpisode)],
    },
    {
      key: "plan",
      heading: "Plan and requested actions",
      sentences: [
        sentence(
          "plan:end",
          `${patient.givenName} ${patient.familyName} is discharged to a home programme and may come back within six months without a new referral.`,
          null,
          "patient",
        ),
        sentence("plan:gp", "Nothing is asked of you for now.", null, "gp"),
      ],
    },
    {
      key: "attendance",
      heading: "Attendance details",
      sentences: [
        sentence(
          "attendance:visits",
          `${seen} visits from ${plainDateWords(first.day)} to ${longDate(last.day)}.`,
          fromEpisode,
        ),
      ],
    },
    ...(goals.length > 0
      ? [
          {
            key: "concerns",
            heading: "Patient and carer concerns, expectations and wishes",
            sentences: [sentence("concerns:goals", `What mattered most: ${goals.join("; ")}.`, fromEpisode)],
          },
        ]
      : []),
    ...(pain
      ? [
          {
            key: "scales",
            heading: "Assessment scales",
            sentences: [
              sentence("scales:pain", `Pain was ${pain.from} of 10 at first and ${pain.to} of 10 at last.`, {
                kind: "measure",
                id: pain.recordId,
                label: "Pain",
              }),
            ],
          },
        ]
      : []),
    {
      key: "advice",
      heading: "Information and advice given",
      sentences: [
        sentence(
          "advice:general",
          "Keep moving, pace it, and ring us or the GP if pain at night, fever or new weakness appears.",
          null,
        ),
      ],
    },
  ];
}
