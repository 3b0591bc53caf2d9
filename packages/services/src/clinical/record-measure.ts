import { checkTreat } from "@withy/clinical/episodes/states";
import { findMeasure } from "@withy/clinical/measures/catalogue";
import { checkEntry, type MeasureEntry } from "@withy/clinical/measures/entry";
import type { Measure } from "@withy/clinical/measures/measure";
import { alarmOf, scoreMeasure, scoringEdition } from "@withy/clinical/measures/score";
import { checkWrite } from "@withy/clinical/notes/check-note";
import { type RecordedMeasure, recordMeasureInput } from "@withy/contracts/clinical";
import { notFound, refused, refuseIf } from "@withy/core/errors";
import { newId } from "@withy/core/ids";
import { refusal } from "@withy/core/refusal";
import { dayOf } from "@withy/core/zoned-time";
import { measureRecords } from "@withy/db/schema";
import { and, eq } from "drizzle-orm";
import { recordAudit } from "../audit";
import type { Context } from "../context";
import { loadRecord } from "../load-record";
import { once } from "../once";
import { verb } from "../verb";
import { loadPatientForCare } from "./clinical-patient";
import { type EpisodeRow, loadEpisode, loadSite } from "./episode-records";
import { answersOf } from "./measure-answers";
import { listMeasureRows, seriesViews } from "./measure-series";
import { loadNote } from "./note-records";

/** Keeps one filling-in, scored by the published rule, and says what it means against the first. */
export const recordMeasure = verb(
  "clinical.write",
  recordMeasureInput,
  async (ctx, input): Promise<RecordedMeasure> => {
    const measure = findMeasure(input.measureKey);
    if (!measure) throw notFound("measure");
    refuseIf(checkEntry(measure, input.entry));
    return once(ctx, "measure.record", async (tx) => {
      const episode = await loadEpisode(tx, "clinical.write", input.episodeId);
      refuseIf(checkTreat(episode));
      const { zone } = await loadSite(tx, episode.siteId);
      const takenOn = dayOfMeasuring(input.takenOn ?? null, dayOf(tx.clock.now(), zone));
      if (input.noteId) await checkOpenNote(tx, input.noteId, episode.id);
      const id = await insertRecord(tx, episode, measure, { ...input, takenOn });
      if (input.replaces) await replaceRecord(tx, input.replaces, { id, episodeId: episode.id, measure });
      await recordAudit(tx, {
        action: "measure.recorded",
        subjectKind: "measure",
        subjectId: id,
        patientId: episode.patientId,
        siteId: episode.siteId,
        detail: { measure: measure.key, replaces: input.replaces ?? null },
      });
      return recordedView(tx, episode, {
        id,
        takenOn,
        measureKey: measure.key,
        alarm: alarmOf(measure, input.entry),
      });
    });
  },
);

function dayOfMeasuring(given: string | null, today: string): string {
  if (given === null || given <= today) return given ?? today;
  throw refused(refusal("taken-later", "The day of measuring cannot be in the future.", "takenOn"));
}

async function insertRecord(
  ctx: Context,
  episode: EpisodeRow,
  measure: Measure,
  given: { entry: MeasureEntry; noteId?: string | null | undefined; takenOn: string },
): Promise<string> {
  const id = newId();
  const scores = scoreMeasure(measure, given.entry);
  await ctx.db.insert(measureRecords).values({
    practiceId: ctx.practiceId,
    id,
    episodeId: episode.id,
    patientId: episode.patientId,
    noteId: given.noteId ?? null,
    measureKey: measure.key,
    ruleVersion: scoringEdition,
    answers: answersOf(given.entry),
    scores: Object.fromEntries(scores.map((score) => [score.scale, score.value])),
    takenOn: given.takenOn,
    enteredBy: ctx.staffMemberId,
    enteredAt: ctx.clock.now(),
  });
  return id;
}

async function recordedView(
  ctx: Context,
  episode: EpisodeRow,
  record: { id: string; takenOn: string; measureKey: string; alarm: string | null },
): Promise<RecordedMeasure> {
  const { view, sex } = await loadPatientForCare(ctx, episode.patientId, record.takenOn);
  const rows = (await listMeasureRows(ctx, episode.id)).filter((row) => row.measureKey === record.measureKey);
  const scales = seriesViews(rows, { age: view.age, sex })[0]?.scales ?? [];
  return {
    recordId: record.id,
    measureKey: record.measureKey,
    takenOn: record.takenOn,
    scores: scales.map((scale) => ({
      scaleKey: scale.scaleKey,
      label: scale.label,
      shown: scale.points.find((point) => point.recordId === record.id)?.shown ?? "",
      change: scale.change,
      importance: scale.importance,
      reading: scale.reading,
    })),
    alarm: record.alarm,
  };
}

/** A measure joins the note of its visit only while that note is still being written. */
async function checkOpenNote(ctx: Context, noteId: string, episodeId: string): Promise<void> {
  const { note, authorName } = await loadNote(ctx, "clinical.write", noteId);
  if (note.episodeId !== episodeId) {
    throw refused(
      refusal("other-episode", "That note belongs to another episode. Record the measure from its own page."),
    );
  }
  refuseIf(checkWrite({ ...note, authorName }, ctx.staffMemberId));
}

/** Marks the corrected record; it stays in the table and in its note's history. */
async function replaceRecord(
  ctx: Context,
  oldId: string,
  by: { id: string; episodeId: string; measure: Measure },
): Promise<void> {
  const old = await loadRecord(ctx, measureRecords, oldId, "measure", { lock: true });
  if (old.episodeId !== by.episodeId) throw notFound("measure");
  refuseIf(
    old.replacedBy === null && old.measureKey === by.measure.key
      ? null
      : refusal(
          "already-corrected",
          "That result was corrected before. Reload the page and correct the latest one.",
        ),
  );
  await ctx.db
    .update(measureRecords)
    .set({ replacedBy: by.id })
    .where(and(eq(measureRecords.practiceId, ctx.practiceId), eq(measureRecords.id, oldId)));
}
