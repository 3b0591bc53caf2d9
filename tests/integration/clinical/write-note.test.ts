import { newId } from "@withy/core/ids";
import { notes, noteVersions } from "@withy/db/schema";
import { getNote, saveNoteDraft, startNote } from "@withy/services/clinical";
import { and, asc, eq } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import { auditOf } from "../../support/audit-rows";
import { contextFor } from "../../support/contexts";
import { addAppointment } from "../../support/diary-rows";
import { addEpisode, addPatient } from "../../support/people";
import { buildPractice, type TestPractice, testNow } from "../../support/practice";
import { addNote, addVisit } from "./visit-with-note";

let practice: TestPractice;
let foreign: TestPractice;
beforeAll(async () => {
  practice = await buildPractice();
  foreign = await buildPractice({ name: "Cairn & Firth Clinics" });
});

const therapist = () => contextFor(practice, "therapist");
const versionsOf = (noteId: string) =>
  practice.db
    .select({ version: noteVersions.version, body: noteVersions.body })
    .from(noteVersions)
    .where(and(eq(noteVersions.practiceId, practice.practiceId), eq(noteVersions.noteId, noteId)))
    .orderBy(asc(noteVersions.version));

describe("starting a note", () => {
  it("begins an initial assessment first, then session notes, and audits it", async () => {
    const { visit, patient, episode } = await addVisit(practice);
    const note = await startNote(therapist(), { appointmentId: visit.id });
    expect(note).toMatchObject({
      kind: "initial",
      state: "draft",
      visitNumber: 1,
      canWrite: true,
      earlier: null,
    });
    expect(note.episode).toMatchObject({ place: "Left hip", side: "left" });
    const audit = await auditOf(practice, note.id);
    expect(audit.map((row) => [row.action, row.patientId, row.actorId])).toEqual([
      ["note.started", patient.id, practice.staff.therapist.id],
    ]);
    const second = await addAppointment(practice, {
      patientId: patient.id,
      day: "2026-12-01",
      time: "15:00",
      values: { episodeId: episode.id, state: "arrived" },
    });
    const next = await startNote(therapist(), { appointmentId: second.id });
    expect(next).toMatchObject({ kind: "session", visitNumber: 2, earlier: { id: note.id, visitNumber: 1 } });
  });

  it("gives the one that is begun already", async () => {
    const { visit } = await addVisit(practice);
    const first = await startNote(therapist(), { appointmentId: visit.id });
    expect((await startNote(therapist(), { appointmentId: visit.id })).id).toBe(first.id);
  });

  it("asks for an episode where the visit has none, then joins the visit to it", async () => {
    const patient = await addPatient(practice);
    const visit = await addAppointment(practice, {
      patientId: patient.id,
      day: "2026-12-01",
      time: "14:00",
      values: { state: "arrived" },
    });
    await expect(startNote(therapist(), { appointmentId: visit.id })).rejects.toMatchObject({
      kind: "episode-needed",
    });
    const episode = await addEpisode(practice, patient.id);
    const note = await startNote(therapist(), { appointmentId: visit.id, episodeId: episode.id });
    expect(note.episode.id).toBe(episode.id);
    const other = await addPatient(practice);
    const elsewhere = await addEpisode(practice, other.id);
    const late = await addAppointment(practice, {
      patientId: patient.id,
      day: "2026-12-01",
      time: "16:00",
      values: { state: "arrived" },
    });
    await expect(
      startNote(therapist(), { appointmentId: late.id, episodeId: elsewhere.id }),
    ).rejects.toMatchObject({ kind: "other-patient" });
  });

  it("refuses another therapist's visit, a later day, a cancelled visit and a discharged episode", async () => {
    const { visit } = await addVisit(practice);
    await expect(
      startNote(contextFor(practice, "otherTherapist"), { appointmentId: visit.id }),
    ).rejects.toMatchObject({ kind: "not-your-visit" });
    const patient = await addPatient(practice);
    const open = await addEpisode(practice, patient.id);
    const ended = await addEpisode(practice, patient.id, { state: "discharged" });
    const at = (day: string, time: string, state: "booked" | "cancelled" | "arrived", episodeId: string) =>
      addAppointment(practice, { patientId: patient.id, day, time, values: { state, episodeId } });
    const later = await at("2026-12-02", "10:00", "booked", open.id);
    const cancelled = await at("2026-12-01", "13:00", "cancelled", open.id);
    const over = await at("2026-12-01", "13:20", "arrived", ended.id);
    await expect(startNote(therapist(), { appointmentId: later.id })).rejects.toMatchObject({
      kind: "visit-to-come",
    });
    await expect(startNote(therapist(), { appointmentId: cancelled.id })).rejects.toMatchObject({
      kind: "visit-did-not-happen",
    });
    await expect(startNote(therapist(), { appointmentId: over.id })).rejects.toMatchObject({
      kind: "episode-discharged",
    });
  });

  it("two at once end in one note", async () => {
    const { visit } = await addVisit(practice);
    const both = await Promise.all([1, 2, 3].map(() => startNote(therapist(), { appointmentId: visit.id })));
    expect(new Set(both.map((note) => note.id)).size).toBe(1);
    const rows = await practice.db
      .select()
      .from(notes)
      .where(and(eq(notes.practiceId, practice.practiceId), eq(notes.appointmentId, visit.id)));
    expect(rows).toHaveLength(1);
  });
});

describe("saving a draft", () => {
  it("keeps the words, gives the next version and audits each save", async () => {
    const { noteId, version } = await addNote(practice);
    const saved = await saveNoteDraft(therapist(), {
      noteId,
      version,
      body: { history: "Walks to the harbour ", salary: "x" },
    });
    expect(saved.version).toBe(version + 1);
    const note = await getNote(therapist(), { noteId });
    expect(note.body).toEqual({ history: "Walks to the harbour " });
    expect((await auditOf(practice, noteId)).map((row) => row.action)).toEqual([
      "note.started",
      "note.saved",
      "note.read",
    ]);
  });

  it("answers the same words again without writing", async () => {
    const { noteId, version } = await addNote(practice);
    const body = { history: "The same" };
    const first = await saveNoteDraft(therapist(), { noteId, version, body });
    expect(await saveNoteDraft(therapist(), { noteId, version, body })).toEqual(first);
  });

  it("refuses an old version and gives both texts", async () => {
    const { noteId, version } = await addNote(practice);
    await saveNoteDraft(therapist(), { noteId, version, body: { history: "From the tablet" } });
    await expect(
      saveNoteDraft(therapist(), { noteId, version, body: { history: "From the desk" } }),
    ).rejects.toMatchObject({
      code: "stale",
      detail: {
        theirs: { version: version + 1, body: { history: "From the tablet" } },
        yours: { version, body: { history: "From the desk" } },
      },
    });
  });

  it("of two saves at once one wins and the other is told", async () => {
    const { noteId, version } = await addNote(practice);
    const results = await Promise.allSettled(
      ["one", "two"].map((history) => saveNoteDraft(therapist(), { noteId, version, body: { history } })),
    );
    expect(results.filter((r) => r.status === "fulfilled")).toHaveLength(1);
    expect(results.find((r) => r.status === "rejected")).toMatchObject({ reason: { code: "stale" } });
  });

  it("keeps states that stood a while, not each burst of typing", async () => {
    practice.clock.set(testNow);
    const { noteId, version } = await addNote(practice);
    const save = async (at: number, history: string) =>
      (await saveNoteDraft(therapist(), { noteId, version: at, body: { history } })).version;
    let at = await save(version, "a");
    practice.clock.advance(0.05);
    at = await save(at, "ab");
    practice.clock.advance(0.05);
    at = await save(at, "abc");
    practice.clock.advance(5);
    await save(at, "rewritten");
    expect((await versionsOf(noteId)).map((row) => row.body.history)).toEqual(["a", "abc"]);
    practice.clock.set(testNow);
  });

  it("is the author's alone", async () => {
    const { noteId, version } = await addNote(practice);
    await expect(
      saveNoteDraft(contextFor(practice, "otherTherapist"), {
        noteId,
        version,
        body: { history: "Not mine" },
      }),
    ).rejects.toMatchObject({ code: "refused", kind: "not-the-author" });
  });

  it("names the heading that is too long", async () => {
    const { noteId, version } = await addNote(practice);
    await expect(
      saveNoteDraft(therapist(), { noteId, version, body: { plan: "x".repeat(8001) } }),
    ).rejects.toMatchObject({
      kind: "heading-too-long",
      fields: [{ field: "body.plan" }],
    });
  });
});

describe("who may read and write", () => {
  it.each(["receptionist", "owner", "accounts"] as const)("%s may neither read nor write", async (person) => {
    const { noteId, version, visit } = await addNote(practice);
    const ctx = contextFor(practice, person);
    const forbidden = { code: "forbidden" };
    await expect(getNote(ctx, { noteId })).rejects.toMatchObject(forbidden);
    await expect(saveNoteDraft(ctx, { noteId, version, body: {} })).rejects.toMatchObject(forbidden);
    await expect(startNote(ctx, { appointmentId: visit.id })).rejects.toMatchObject(forbidden);
  });

  it("another practice and a guessed id answer the same", async () => {
    const { noteId, visit, version } = await addNote(practice);
    const ctx = contextFor(foreign, "therapist");
    const missing = { code: "not-found" };
    await expect(getNote(ctx, { noteId })).rejects.toMatchObject(missing);
    await expect(saveNoteDraft(ctx, { noteId, version, body: {} })).rejects.toMatchObject(missing);
    await expect(startNote(ctx, { appointmentId: visit.id })).rejects.toMatchObject(missing);
    await expect(getNote(therapist(), { noteId: newId() })).rejects.toMatchObject(missing);
  });

  it("a therapist of another site alone does not find it", async () => {
    const { noteId } = await addNote(practice);
    const roles = [{ role: "therapist" as const, siteId: practice.sites.tollhouse.id }];
    await expect(
      getNote(contextFor(practice, "otherTherapist", { roles }), { noteId }),
    ).rejects.toMatchObject({ code: "not-found" });
  });

  it("a colleague at the site reads it, cannot write, and is recorded", async () => {
    const { noteId } = await addNote(practice);
    const note = await getNote(contextFor(practice, "owningTherapist"), { noteId });
    expect(note.canWrite).toBe(false);
    const reads = (await auditOf(practice, noteId)).filter((row) => row.action === "note.read");
    expect(reads.map((row) => row.actorId)).toEqual([practice.staff.owningTherapist.id]);
  });
});
