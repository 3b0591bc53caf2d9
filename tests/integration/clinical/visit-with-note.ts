import type { SaveNoteDraftInput } from "@withy/contracts/clinical";
import { saveNoteDraft, startNote } from "@withy/services/clinical";
import type { Context } from "@withy/services/context";
import { contextFor } from "../../support/contexts";
import { addAppointment } from "../../support/diary-rows";
import { addEpisode, addPatient } from "../../support/people";
import type { TestPractice } from "../../support/practice";

export const fullSession: SaveNoteDraftInput["body"] = {
  history: "Stairs easier with the rail.",
  examination: "Left hip flexion 105, right 120.",
  consent: "Agreed to go on.",
  treatment: "Sit to stand from a low chair, 3 sets of 8.",
  plan: "Walk twice a week. See again in seven days.",
};

export const fullInitial: SaveNoteDraftInput["body"] = {
  ...fullSession,
  impact: "Cannot reach the harbour.",
  background: "High blood pressure. No known allergies.",
  assessment: "Stiff, painful left hip.",
};

let minutes = 0;

/** A patient with an open left hip and a visit that is going on, five minutes later in the day for each call. */
export async function addVisit(practice: TestPractice, options: { isInSession?: boolean } = {}) {
  const patient = await addPatient(practice, { sex: "female", bornOn: "1954-06-22" });
  const episode = await addEpisode(practice, patient.id);
  const at = 8 * 60 + minutes;
  minutes += 10;
  const visit = await addAppointment(practice, {
    patientId: patient.id,
    day: "2026-12-01",
    time: `${String(Math.floor(at / 60)).padStart(2, "0")}:${String(at % 60).padStart(2, "0")}`,
    minutes: 5,
    values: {
      cleanDownMinutes: 0,
      episodeId: episode.id,
      state: options.isInSession === false ? "booked" : "in-session",
    },
  });
  return { patient, episode, visit };
}

/** The same with its note begun, and written in full where asked. */
export async function addNote(practice: TestPractice, options: { isWritten?: boolean; ctx?: Context } = {}) {
  const ctx = options.ctx ?? contextFor(practice, "therapist");
  const made = await addVisit(practice);
  const note = await startNote(ctx, { appointmentId: made.visit.id });
  if (!options.isWritten) return { ...made, noteId: note.id, version: note.version };
  const saved = await saveNoteDraft(ctx, { noteId: note.id, version: note.version, body: fullInitial });
  return { ...made, noteId: note.id, version: saved.version };
}
