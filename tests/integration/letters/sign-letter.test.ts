import { letters } from "@withy/db/schema";
import { getEpisode, startNote } from "@withy/services/clinical";
import { draftDischargeLetter, getLetter, saveLetter, signLetter } from "@withy/services/letters";
import { and, eq } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import { auditOf } from "../../support/audit-rows";
import { asDatabaseOwner } from "../../support/connection";
import { contextFor } from "../../support/contexts";
import { addAppointment } from "../../support/diary-rows";
import { buildPractice, type TestPractice } from "../../support/practice";
import { addNote } from "../clinical/visit-with-note";
import { addDraft, addSigned, editOf, recordPain, therapistOf } from "./letter-steps";

let practice: TestPractice;
let foreign: TestPractice;
beforeAll(async () => {
  practice = await buildPractice();
  foreign = await buildPractice({ name: "Cairn & Firth Clinics" });
});
const therapist = () => therapistOf(practice);

describe("signing a letter", () => {
  it("stands under the writer's name and number, and may end the episode in the same act", async () => {
    const { letter, episode } = await addDraft(practice);
    const signed = await signLetter(therapist(), {
      letterId: letter.id,
      version: 1,
      discharge: { version: episode.version ?? 1, outcome: "goals-met" },
    });
    expect(signed).toMatchObject({
      state: "signed",
      canWrite: false,
      canSend: true,
      signedName: "Ana Ferreby",
      registrationNumber: "PH100002",
      episode: { state: "discharged" },
    });
    expect((await getEpisode(therapist(), { episodeId: episode.id })).outcome).toBe("goals-met");
    const [row] = await practice.db
      .select()
      .from(letters)
      .where(and(eq(letters.practiceId, practice.practiceId), eq(letters.id, letter.id)));
    expect(row?.bodyHash).toMatch(/^[0-9a-f]{64}$/);
    expect((await auditOf(practice, letter.id)).map((entry) => entry.action)).toEqual([
      "letter.drafted",
      "letter.signed",
    ]);
  });

  it("ends nothing where the episode cannot end: both stand or neither", async () => {
    const { letter, episode } = await addDraft(practice);
    const signing = signLetter(therapist(), {
      letterId: letter.id,
      version: 1,
      discharge: { version: 99, outcome: "goals-met" },
    });
    await expect(signing).rejects.toMatchObject({ code: "stale" });
    expect((await getLetter(therapist(), { letterId: letter.id })).state).toBe("draft");
    expect((await getEpisode(therapist(), { episodeId: episode.id })).state).toBe("open");
  });

  it("waits for a sentence that is out of date, and for notes that are not signed", async () => {
    const stale = await addDraft(practice);
    await recordPain(practice, stale.episode.id, 1);
    await expect(signLetter(therapist(), { letterId: stale.letter.id, version: 1 })).rejects.toMatchObject({
      kind: "letter-stale",
    });
    const unsigned = await addNote(practice, { isWritten: true });
    const letter = await draftDischargeLetter(therapist(), { episodeId: unsigned.episode.id });
    await expect(signLetter(therapist(), { letterId: letter.id, version: 1 })).rejects.toMatchObject({
      kind: "letter-notes",
    });
  });

  it("points out a visit that is still booked, and signs all the same", async () => {
    const { letter, episode, patient } = await addDraft(practice);
    await addAppointment(practice, {
      patientId: patient.id,
      day: "2026-12-21",
      time: "11:00",
      values: { episodeId: episode.id },
    });
    const seen = await getLetter(therapist(), { letterId: letter.id });
    expect(seen.checks.find((check) => check.key === "visits")).toMatchObject({ isOk: false, blocks: false });
    expect((await signLetter(therapist(), { letterId: letter.id, version: 1 })).state).toBe("signed");
  });

  it("is for its writer alone", async () => {
    const { letter } = await addDraft(practice);
    const input = { letterId: letter.id, version: 1 };
    await expect(signLetter(contextFor(practice, "owningTherapist"), input)).rejects.toMatchObject({
      kind: "not-yours",
    });
    await expect(signLetter(contextFor(practice, "owner"), input)).rejects.toMatchObject({
      code: "forbidden",
    });
    await expect(signLetter(contextFor(foreign, "therapist"), input)).rejects.toMatchObject({
      code: "not-found",
    });
  });

  it("of two presses signs once", async () => {
    const { letter } = await addDraft(practice);
    const sign = () => signLetter(therapist(), { letterId: letter.id, version: 1 });
    const results = await Promise.allSettled([sign(), sign()]);
    expect(results.map((result) => result.status).sort()).toEqual(["fulfilled", "rejected"]);
  });
});

describe("a signed letter", () => {
  it("is changed by nobody: not by its writer, not by the app's user, not by the database's owner", async () => {
    const { letter } = await addSigned(practice);
    await expect(saveLetter(therapist(), editOf(letter, { "plan:gp": "Other." }))).rejects.toMatchObject({
      kind: "letter-signed",
    });
    await expect(
      signLetter(therapist(), { letterId: letter.id, version: letter.version }),
    ).rejects.toMatchObject({ kind: "letter-signed" });
    const change = practice.db
      .update(letters)
      .set({ datedOn: "2020-01-01" })
      .where(and(eq(letters.practiceId, practice.practiceId), eq(letters.id, letter.id)));
    await expect(change).rejects.toMatchObject({ errno: 1644 });
    await asDatabaseOwner(async (owner) => {
      await expect(
        owner.query("update letters set sections = '[]' where id = ?", [letter.id]),
      ).rejects.toThrow("signed letter cannot be changed");
      await expect(owner.query("delete from letters where id = ?", [letter.id])).rejects.toThrow(
        "signed letter cannot be deleted",
      );
    });
  });

  it("stays as it is when the record changes after it", async () => {
    const { letter, episode } = await addSigned(practice);
    await recordPain(practice, episode.id, 0);
    const seen = await getLetter(therapist(), { letterId: letter.id });
    expect(seen.sections).toEqual(letter.sections);
    expect(seen.stale).toEqual([]);
  });

  it("lets a new visit be written up: the episode stays open where it was not ended", async () => {
    const { episode, patient } = await addSigned(practice);
    const visit = await addAppointment(practice, {
      patientId: patient.id,
      day: "2026-12-01",
      time: "16:30",
      values: { episodeId: episode.id, state: "in-session" },
    });
    expect((await startNote(therapist(), { appointmentId: visit.id })).kind).toBe("session");
  });
});
