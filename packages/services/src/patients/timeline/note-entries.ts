import { findMeasure } from "@withy/clinical/measures/catalogue";
import { scalesOf } from "@withy/clinical/measures/measure";
import { formatScore } from "@withy/clinical/measures/rounding";
import type { LetterEntry, MeasureEntry, NoteEntry } from "@withy/contracts/patients";
import { can, sitesWith } from "@withy/core/access/can";
import { dayOf, timeOf } from "@withy/core/zoned-time";
import { episodes, letters, measureRecords, notes } from "@withy/db/schema";
import { and, desc, eq, isNull, sql } from "drizzle-orm";
import type { Context } from "../../context";
import { atSites, throughEpisode } from "../patient-counts";
import { olderThan, type Slice } from "./cursor";

const moment = (ctx: Context, at: Date) => ({
  at: at.toISOString(),
  day: dayOf(at, ctx.zone),
  time: timeOf(at, ctx.zone),
});

/** Signed notes: that one was signed, for whoever books; for which problem, only for whoever may read it. */
export async function noteEntries(ctx: Context, { patientId, before, limit }: Slice): Promise<NoteEntry[]> {
  const mayRead = can(ctx.roles, "clinical.read");
  const rows = await ctx.db
    .select({
      id: notes.id,
      signedAt: notes.signedAt,
      kind: notes.kind,
      signedName: notes.signedName,
      problem: episodes.problem,
    })
    .from(notes)
    .innerJoin(episodes, and(eq(episodes.practiceId, notes.practiceId), eq(episodes.id, notes.episodeId)))
    .where(
      and(
        eq(notes.practiceId, ctx.practiceId),
        eq(notes.patientId, patientId),
        eq(notes.state, "signed"),
        olderThan(notes.signedAt, notes.id, before),
        ...atSites(episodes.siteId, sitesWith(ctx.roles, mayRead ? "clinical.read" : "diary.read")),
      ),
    )
    .orderBy(desc(notes.signedAt), desc(notes.id))
    .limit(limit);
  return rows.flatMap((row) =>
    row.signedAt === null
      ? []
      : [
          {
            kind: "note",
            id: row.id,
            ...moment(ctx, row.signedAt),
            authorName: row.signedName ?? "",
            noteKind: row.kind,
            problem: mayRead ? row.problem : null,
          },
        ],
  );
}

/** Measures as recorded; one that was corrected stands aside for its correction. */
export async function measureEntries(
  ctx: Context,
  { patientId, before, limit }: Slice,
): Promise<MeasureEntry[]> {
  const rows = await ctx.db
    .select()
    .from(measureRecords)
    .where(
      and(
        eq(measureRecords.practiceId, ctx.practiceId),
        eq(measureRecords.patientId, patientId),
        isNull(measureRecords.replacedBy),
        olderThan(measureRecords.enteredAt, measureRecords.id, before),
        ...throughEpisode(ctx, measureRecords.episodeId, sitesWith(ctx.roles, "clinical.read")),
      ),
    )
    .orderBy(desc(measureRecords.enteredAt), desc(measureRecords.id))
    .limit(limit);
  return rows.map((row) => ({
    kind: "measure",
    id: row.id,
    ...moment(ctx, row.enteredAt),
    measureKey: row.measureKey,
    measureName: findMeasure(row.measureKey)?.label ?? row.measureKey,
    result: resultWords(row.measureKey, row.scores),
    takenOn: row.takenOn,
    episodeId: row.episodeId,
  }));
}

/** The scores as shown, each after its scale's name where there are several. */
function resultWords(measureKey: string, scores: Readonly<Record<string, number | null>>): string {
  const measure = findMeasure(measureKey);
  if (!measure) return "";
  const scales = scalesOf(measure);
  return scales
    .flatMap(({ key, label, unit, decimals }) => {
      const value = scores[key];
      if (value == null) return [];
      const shown = formatScore(value, decimals);
      return scales.length > 1 ? [`${label} ${shown}`] : [`${shown} ${unit}`];
    })
    .join(", ");
}

/** Letters, at the moment they were signed, or begun where they are not. */
export async function letterEntries(
  ctx: Context,
  { patientId, before, limit }: Slice,
): Promise<LetterEntry[]> {
  const at = sql`coalesce(${letters.signedAt}, ${letters.createdAt})`;
  const rows = await ctx.db
    .select({
      id: letters.id,
      at: at.mapWith(letters.createdAt),
      reference: letters.reference,
      state: letters.state,
      recipient: letters.recipient,
    })
    .from(letters)
    .where(
      and(
        eq(letters.practiceId, ctx.practiceId),
        eq(letters.patientId, patientId),
        olderThan(at, letters.id, before),
        ...throughEpisode(ctx, letters.episodeId, sitesWith(ctx.roles, "letters.read")),
      ),
    )
    .orderBy(desc(at), desc(letters.id))
    .limit(limit);
  return rows.map((row) => ({
    kind: "letter",
    id: row.id,
    ...moment(ctx, row.at as Date),
    reference: row.reference,
    state: row.state,
    recipientName: row.recipient.name,
  }));
}
