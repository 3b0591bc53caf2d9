import { createHash } from "node:crypto";
import { signedForm } from "@withy/clinical/notes/note-text";
import { addMinutes } from "@withy/core/zoned-time";
import { notes, noteVersions } from "../schema";
import { noteWords } from "./note-words";
import { type House, notAfterNow, type Stage } from "./stage";
import type { Course, Visit } from "./visit";

export type NoteRow = typeof notes.$inferInsert;

/**
 * A note for every attended visit: signed within the hour but for a few of the last days, which wait as drafts or
 * are not begun. Returns the note of each visit.
 */
export function addNotes(
  stage: Stage,
  house: House,
  courses: readonly Course[],
  told: { course: Course; words: (number: number) => Record<string, string> } | null,
): Map<string, NoteRow> {
  const byVisit = new Map<string, NoteRow>();
  for (const course of courses) {
    let number = 0;
    const isOver = course.visits.every((visit) => visit.endsAt <= stage.now);
    for (const visit of course.visits) {
      if (visit.state !== "fulfilled") continue;
      number += 1;
      const age = (stage.now.getTime() - visit.endsAt.getTime()) / 3_600_000;
      const isFresh = age < 30 && !(isOver && course.kept >= course.plannedVisits);
      const words = told?.course === course ? told.words(number) : null;
      if (isFresh && !words && stage.random.chance(0.25)) continue;
      const isDraft = isFresh && (words !== null || stage.random.chance(0.35));
      const note = writeNote(stage, house, visit, words ?? noteWords(stage.random, visit, number), isDraft);
      byVisit.set(visit.id, note);
    }
  }
  return byVisit;
}

function writeNote(
  stage: Stage,
  house: House,
  visit: Visit,
  words: Record<string, string>,
  isDraft: boolean,
): NoteRow {
  const { random, newId, rows } = stage;
  const at = notAfterNow(stage, addMinutes(visit.endsAt, random.int(2, 55)));
  const base: NoteRow = {
    practiceId: house.practiceId,
    id: newId(),
    episodeId: visit.course.episode.id,
    patientId: visit.course.patient.id,
    appointmentId: visit.id,
    authorId: visit.therapist.id,
    kind: visit.isFirst ? "initial" : "session",
    body: words,
    visitAt: visit.startsAt,
    createdAt: visit.startsAt,
    updatedAt: at,
  };
  if (isDraft) {
    const { plan: _later, ...begun } = words;
    const draft = { ...base, body: begun };
    rows.add(notes, draft);
    return draft;
  }
  const signed = sign(base, words, at, visit);
  rows.add(notes, signed);
  rows.add(noteVersions, {
    practiceId: house.practiceId,
    noteId: base.id,
    version: 2,
    body: words,
    savedAt: at,
    savedBy: visit.therapist.id,
  });
  return signed;
}

function sign(
  note: NoteRow,
  words: Record<string, string>,
  at: Date,
  { therapist, startsAt }: Visit,
): NoteRow {
  const signedName = `${therapist.givenName} ${therapist.familyName}`;
  const registrationNumber = therapist.registrationNumber ?? "";
  const facts = {
    noteId: note.id,
    patientId: note.patientId,
    kind: note.kind,
    visitAt: startsAt.toISOString(),
    signedAt: at.toISOString(),
    signedName,
    registrationNumber,
  };
  const bodyHash = createHash("sha256").update(signedForm(facts, words), "utf8").digest("hex");
  return {
    ...note,
    state: "signed",
    version: 2,
    signedAt: at,
    signedBy: therapist.id,
    signedName,
    registrationNumber,
    bodyHash,
  };
}
