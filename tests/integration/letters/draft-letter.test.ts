import { newItems } from "@withy/clinical/programmes/new-item";
import { newId } from "@withy/core/ids";
import { notes } from "@withy/db/schema";
import {
  createProgramme,
  issueProgramme,
  recordRedFlags,
  saveGoals,
  saveProgramme,
} from "@withy/services/clinical";
import { draftDischargeLetter, getLetter } from "@withy/services/letters";
import { and, eq } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import { auditOf } from "../../support/audit-rows";
import { contextFor } from "../../support/contexts";
import { buildPractice, type TestPractice } from "../../support/practice";
import type { TestPerson } from "../../support/practice-staff";
import { addNote, fullInitial } from "../clinical/visit-with-note";
import { addDraft, addSigned, findSentence, recordPain, sentencesOf, therapistOf } from "./letter-steps";

let practice: TestPractice;
let foreign: TestPractice;
beforeAll(async () => {
  practice = await buildPractice();
  foreign = await buildPractice({ name: "Cairn & Firth Clinics" });
});

describe("a discharge letter", () => {
  it("is assembled from the record, goes to the patient's doctor, and is audited", async () => {
    const { letter, noteId, patient, episode } = await addDraft(practice);
    expect(letter).toMatchObject({
      state: "draft",
      version: 1,
      datedOn: "2026-12-01",
      canWrite: true,
      author: { name: "Ana Ferreby", jobTitle: "physiotherapist" },
      recipient: {
        kind: "gp",
        name: "Dr Ruth Ellery",
        addressLines: ["Lantern Street Surgery", "14 Lantern Street", "Easterhaven", "ZZ3 1EF"],
        email: "letters@lantern.example",
      },
      sender: { practice: "Marram Physiotherapy" },
      stale: [],
      missing: [],
    });
    expect(letter.reference).toMatch(/^L-[2-9A-HJKMNP-Z]{6}$/);
    const texts = sentencesOf(letter).map((sentence) => sentence.text);
    expect(texts).toEqual(
      expect.arrayContaining([
        "Hip osteoarthritis, left side.",
        `${patient.givenName} ${patient.familyName} came without a referral.`,
        "One visit was attended, on 1 December 2026.",
        fullInitial.background,
        `At the first visit: ${fullInitial.examination}`,
        `Treatment on 1 December 2026: ${fullInitial.treatment}`,
        fullInitial.plan,
        "No check for warning signs is on record.",
      ]),
    );
    expect(texts.find((text) => text.startsWith("Pain rating"))).toContain("6 out of 10 on 1 December 2026");
    expect(findSentence(letter, `history:${noteId}-background-1`)?.source).toEqual({
      kind: "note",
      id: noteId,
      label: "Assessment, 1 Dec",
    });
    const rows = await auditOf(practice, letter.id);
    expect(rows.map((row) => [row.action, row.patientId, row.siteId])).toEqual([
      ["letter.drafted", patient.id, episode.siteId],
    ]);
  });

  it("takes nothing from a note that is not signed, and says how many wait", async () => {
    const treated = await addNote(practice, { isWritten: true });
    const letter = await draftDischargeLetter(therapistOf(practice), { episodeId: treated.episode.id });
    expect(sentencesOf(letter).some((sentence) => sentence.source?.kind === "note")).toBe(false);
    expect(letter.checks.find((check) => check.key === "notes")).toEqual({
      key: "notes",
      isOk: false,
      blocks: true,
      words: "One note is not signed, so the letter cannot speak of it. Sign first.",
    });
  });

  it("is one draft however often it is asked for, at once too; a new one after signing", async () => {
    const treated = await addNote(practice, { isWritten: true });
    const ask = () => draftDischargeLetter(therapistOf(practice), { episodeId: treated.episode.id });
    const letters = await Promise.all([ask(), ask(), ask(), ask()]);
    expect(new Set(letters.map((letter) => letter.id)).size).toBe(1);
    const signed = await addSigned(practice);
    const again = await draftDischargeLetter(therapistOf(practice), { episodeId: signed.episode.id });
    expect(again.id).not.toBe(signed.letter.id);
  });

  it("says the first and the last score with what the change means, goals met, and warning signs", async () => {
    const treated = await addNote(practice);
    const ctx = therapistOf(practice);
    await recordPain(practice, treated.episode.id, 7, "2026-11-17");
    await recordPain(practice, treated.episode.id, 3);
    const goals = await saveGoals(ctx, {
      episodeId: treated.episode.id,
      version: 1,
      goals: [{ text: "Walk to the harbour", isMet: true }],
    });
    await recordRedFlags(ctx, {
      episodeId: treated.episode.id,
      version: goals.version,
      answers: { "weight-loss": "present", fever: "absent" },
    });
    const letter = await draftDischargeLetter(ctx, { episodeId: treated.episode.id });
    const texts = sentencesOf(letter).map((sentence) => sentence.text);
    expect(texts.find((text) => text.startsWith("Pain rating"))).toMatch(
      /7 out of 10 on 17 November 2026, 3 on 1 December 2026\. Better by 4, beyond measurement error \(1\.77\)\./,
    );
    expect(texts).toContain("Goal: Walk to the harbour (met by 1 December 2026).");
    expect(texts).toContain("Warning signs present: Weight lost without trying.");
    expect(texts).toContain("Please review the warning signs under Safety alerts.");
  });

  it("names the programme that was given out, each exercise with its form", async () => {
    const treated = await addNote(practice);
    const ctx = therapistOf(practice);
    const programme = await createProgramme(ctx, { episodeId: treated.episode.id });
    const items = ["sit-to-stand", "bridge"].flatMap((key) => newItems(key, "timed", newId));
    const { id: programmeId, version } = await saveProgramme(ctx, {
      programmeId: programme.id,
      version: programme.version,
      title: programme.title,
      content: structuredClone({ ...programme.content, items }) as never,
    });
    await issueProgramme(ctx, { programmeId, version });
    const letter = await draftDischargeLetter(ctx, { episodeId: treated.episode.id });
    expect(findSentence(letter, "advice:programme")?.text).toMatch(
      /^Home programme of two exercises, .*: sit to stand \(from a chair, no hands\) and bridge \(both feet down\)\.$/,
    );
  });

  it("is held against the record whenever it is looked at: a changed score makes one sentence stale", async () => {
    const { letter, episode } = await addDraft(practice);
    await recordPain(practice, episode.id, 2);
    const seen = await getLetter(therapistOf(practice), { letterId: letter.id });
    expect(seen.stale.map((sentence) => sentence.id)).toEqual(["scales:pain-rating"]);
    expect(seen.stale[0]?.now).toContain("Better by 4");
    expect(seen.checks.find((check) => check.key === "stale")?.isOk).toBe(false);
    expect((await auditOf(practice, letter.id)).map((row) => row.action)).toEqual([
      "letter.drafted",
      "letter.read",
    ]);
  });

  it("offers what the record has gained since", async () => {
    const treated = await addNote(practice);
    const letter = await draftDischargeLetter(therapistOf(practice), { episodeId: treated.episode.id });
    await recordPain(practice, treated.episode.id, 5);
    const seen = await getLetter(therapistOf(practice), { letterId: letter.id });
    expect(seen.missing.map((section) => [section.key, section.sentences.length])).toEqual([["scales", 1]]);
  });
});

describe("who may draft and read", () => {
  const refusedRoles: TestPerson[] = ["receptionist", "accounts", "owner"];

  it.each(refusedRoles)("not %s", async (person) => {
    const { letter, episode } = await addDraft(practice);
    const ctx = contextFor(practice, person);
    await expect(getLetter(ctx, { letterId: letter.id })).rejects.toMatchObject({ code: "forbidden" });
    await expect(draftDischargeLetter(ctx, { episodeId: episode.id })).rejects.toMatchObject({
      code: "forbidden",
    });
  });

  it("not a therapist of another site, nor of another practice: the letter is not there", async () => {
    const { letter, episode } = await addDraft(practice);
    const elsewhere = contextFor(practice, "therapist", {
      roles: [{ role: "therapist", siteId: practice.sites.tollhouse.id }],
    });
    for (const ctx of [elsewhere, contextFor(foreign, "therapist")]) {
      await expect(getLetter(ctx, { letterId: letter.id })).rejects.toMatchObject({ code: "not-found" });
      await expect(draftDischargeLetter(ctx, { episodeId: episode.id })).rejects.toMatchObject({
        code: "not-found",
      });
    }
    await expect(getLetter(therapistOf(practice), { letterId: newId() })).rejects.toMatchObject({
      code: "not-found",
    });
    await expect(getLetter(therapistOf(practice), { letterId: "1 or 1=1" })).rejects.toMatchObject({
      code: "invalid",
    });
  });

  it("writes nothing where it is refused", async () => {
    const { episode } = await addNote(practice, { isWritten: true });
    await expect(
      draftDischargeLetter(contextFor(foreign, "therapist"), { episodeId: episode.id }),
    ).rejects.toThrow();
    const [row] = await practice.db
      .select()
      .from(notes)
      .where(and(eq(notes.practiceId, practice.practiceId), eq(notes.episodeId, episode.id)));
    expect(row?.state).toBe("draft");
    expect(await auditOf(foreign, episode.id)).toEqual([]);
  });
});
