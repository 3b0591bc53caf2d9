import type { RecordMeasureInput } from "@withy/contracts/clinical";
import { newId } from "@withy/core/ids";
import { measureRecords } from "@withy/db/schema";
import { listMeasures, recordMeasure, signNote } from "@withy/services/clinical";
import { and, eq } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import { auditOf } from "../../support/audit-rows";
import { contextFor } from "../../support/contexts";
import { buildPractice, type TestPractice } from "../../support/practice";
import { addNote, addVisit } from "./visit-with-note";

let practice: TestPractice;
beforeAll(async () => {
  practice = await buildPractice();
});
const therapist = () => contextFor(practice, "therapist");

const pain = (score: number): Pick<RecordMeasureInput, "measureKey" | "entry"> => ({
  measureKey: "pain-rating",
  entry: { form: "items", answers: [score] },
});
const psfs = (...scores: (number | null)[]): Pick<RecordMeasureInput, "measureKey" | "entry"> => ({
  measureKey: "patient-specific-functional",
  entry: {
    form: "activities",
    activities: ["Stairs", "Socks", "Garden"].map((name, i) => ({ name, score: scores[i] ?? null })),
  },
});

describe("recording", () => {
  it("scores by the rule, explains the change from unrounded values and audits it", async () => {
    const { episode } = await addVisit(practice);
    await recordMeasure(therapist(), { episodeId: episode.id, ...psfs(3, 5, 2), takenOn: "2026-11-17" });
    const latest = await recordMeasure(therapist(), { episodeId: episode.id, ...psfs(6, 7, 5) });
    expect(latest.takenOn).toBe("2026-12-01");
    expect(latest.scores[0]).toMatchObject({
      shown: "6.0",
      change: {
        direction: "better",
        isBeyondError: true,
        words: "Better by 2.7, beyond measurement error (2.0).",
      },
    });
    const [row] = await practice.db
      .select()
      .from(measureRecords)
      .where(and(eq(measureRecords.practiceId, practice.practiceId), eq(measureRecords.id, latest.recordId)));
    expect(row?.scores).toEqual({ function: 6 });
    expect(row?.answers).toEqual({ items: [6, 7, 5], labels: ["Stairs", "Socks", "Garden"] });
    const [audit] = await auditOf(practice, latest.recordId);
    expect(audit).toMatchObject({
      action: "measure.recorded",
      detail: { measure: "patient-specific-functional" },
    });
    expect(JSON.stringify(audit?.detail)).not.toContain("Stairs");
  });

  it("keeps the unrounded score", async () => {
    const { episode } = await addVisit(practice);
    const { recordId } = await recordMeasure(therapist(), { episodeId: episode.id, ...psfs(3, 5, 2) });
    const [row] = await practice.db
      .select()
      .from(measureRecords)
      .where(and(eq(measureRecords.practiceId, practice.practiceId), eq(measureRecords.id, recordId)));
    expect(row?.scores.function).toBeCloseTo(10 / 3, 12);
  });

  it("reads a chair stand for the patient's age and sex; pushing with the arms is 0", async () => {
    const { episode } = await addVisit(practice);
    const stand = (value: number, usedArms: boolean) =>
      recordMeasure(therapist(), {
        episodeId: episode.id,
        measureKey: "chair-stand-30",
        entry: { form: "reading", value, usedArms },
      });
    expect((await stand(11, true)).scores[0]).toMatchObject({
      shown: "0",
      reading: "Below average for women 70 to 74: 10 or more expected.",
    });
    expect((await stand(10, false)).scores[0]).toMatchObject({
      shown: "10",
      reading: "Not below average for women 70 to 74: 10 or more expected.",
    });
  });

  it("raises the prompt of item 9 whatever the total", async () => {
    const { episode } = await addVisit(practice);
    const result = await recordMeasure(therapist(), {
      episodeId: episode.id,
      measureKey: "phq-9",
      entry: { form: "items", answers: [0, 0, 0, 0, 0, 0, 0, 0, 1] },
    });
    expect(result.scores[0]).toMatchObject({ shown: "1", reading: "minimal" });
    expect(result.alarm).toContain("Item 9");
  });

  it("keeps a filling-in without a score, with its reason", async () => {
    const { episode } = await addVisit(practice);
    const answers = Array.from({ length: 40 }, (_, i) => (i < 5 ? 1 : null));
    const result = await recordMeasure(therapist(), {
      episodeId: episode.id,
      measureKey: "hoos",
      entry: { form: "items", answers },
    });
    expect(result.scores.map((score) => score.shown)).toEqual([
      "75.0",
      "No score: at least 5 of 10 items are needed and 0 were answered.",
      "No score: at least 9 of 17 items are needed and 0 were answered.",
      "No score: at least 2 of 4 items are needed and 0 were answered.",
      "No score: at least 2 of 4 items are needed and 0 were answered.",
    ]);
  });

  it("refuses what is out of range, a day to come, an unknown measure and another form", async () => {
    const { episode } = await addVisit(practice);
    const record = (more: Partial<RecordMeasureInput>) =>
      recordMeasure(therapist(), { episodeId: episode.id, ...pain(3), ...more });
    await expect(record(pain(11))).rejects.toMatchObject({
      code: "refused",
      fields: [{ field: "answers.0" }],
    });
    await expect(record({ takenOn: "2026-12-02" })).rejects.toMatchObject({ kind: "taken-later" });
    await expect(record({ measureKey: "horoscope" })).rejects.toMatchObject({ code: "not-found" });
    await expect(record({ measureKey: "phq-9" })).rejects.toMatchObject({ kind: "measure-entry" });
  });

  it("acts once for one key", async () => {
    const { episode } = await addVisit(practice);
    const ctx = contextFor(practice, "therapist", { idempotencyKey: newId() });
    const first = await recordMeasure(ctx, { episodeId: episode.id, ...pain(6) });
    expect((await recordMeasure(ctx, { episodeId: episode.id, ...pain(6) })).recordId).toBe(first.recordId);
  });

  it("a correction replaces the old record, which stays but counts no more", async () => {
    const { episode } = await addVisit(practice);
    const wrong = await recordMeasure(therapist(), { episodeId: episode.id, ...pain(8) });
    await recordMeasure(therapist(), { episodeId: episode.id, ...pain(3), replaces: wrong.recordId });
    const [series] = await listMeasures(therapist(), { episodeId: episode.id });
    expect(series?.scales[0]?.points.map((point) => point.shown)).toEqual(["3"]);
    await expect(
      recordMeasure(therapist(), { episodeId: episode.id, ...pain(2), replaces: wrong.recordId }),
    ).rejects.toMatchObject({ kind: "already-corrected" });
    const rows = await practice.db
      .select()
      .from(measureRecords)
      .where(
        and(eq(measureRecords.practiceId, practice.practiceId), eq(measureRecords.episodeId, episode.id)),
      );
    expect(rows).toHaveLength(2);
  });

  it("joins a note only while it is being written", async () => {
    const { episode, noteId, version } = await addNote(practice, { isWritten: true });
    await recordMeasure(therapist(), { episodeId: episode.id, noteId, ...pain(5) });
    await signNote(therapist(), { noteId, version });
    await expect(
      recordMeasure(therapist(), { episodeId: episode.id, noteId, ...pain(4) }),
    ).rejects.toMatchObject({ kind: "note-signed" });
    const elsewhere = await addVisit(practice);
    await expect(
      recordMeasure(therapist(), { episodeId: elsewhere.episode.id, noteId, ...pain(4) }),
    ).rejects.toMatchObject({ kind: "other-episode" });
  });
});

describe("reading the series", () => {
  it("orders by day, compares first with last, and is audited", async () => {
    const { episode } = await addVisit(practice);
    for (const [score, takenOn] of [
      [4, "2026-11-24"],
      [7, "2026-11-10"],
      [6, "2026-11-17"],
    ] as const) {
      await recordMeasure(therapist(), { episodeId: episode.id, ...pain(score), takenOn });
    }
    const [series] = await listMeasures(therapist(), { episodeId: episode.id });
    const scale = series?.scales[0];
    expect(scale?.points.map((point) => point.shown)).toEqual(["7", "6", "4"]);
    expect(scale?.change).toMatchObject({ difference: -3, direction: "better", isBeyondError: true });
    expect(scale?.importance).toContain("2 points and 30%");
    expect((await auditOf(practice, episode.id)).at(-1)).toMatchObject({
      action: "measures.read",
      actorId: practice.staff.therapist.id,
    });
  });

  it.each(["receptionist", "owner", "accounts"] as const)("%s is refused", async (person) => {
    const { episode } = await addVisit(practice);
    const ctx = contextFor(practice, person);
    await expect(listMeasures(ctx, { episodeId: episode.id })).rejects.toMatchObject({ code: "forbidden" });
    await expect(recordMeasure(ctx, { episodeId: episode.id, ...pain(3) })).rejects.toMatchObject({
      code: "forbidden",
    });
  });

  it("another practice does not find it", async () => {
    const { episode } = await addVisit(practice);
    const foreign = await buildPractice({ name: "Cairn & Firth Clinics" });
    const ctx = contextFor(foreign, "therapist");
    await expect(listMeasures(ctx, { episodeId: episode.id })).rejects.toMatchObject({ code: "not-found" });
    await expect(recordMeasure(ctx, { episodeId: episode.id, ...pain(3) })).rejects.toMatchObject({
      code: "not-found",
    });
  });
});
