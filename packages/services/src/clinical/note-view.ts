import { placeWords } from "@withy/clinical/episodes/sides";
import { readEntryTimes } from "@withy/clinical/notes/entry-times";
import type { AddendumView, EarlierNote, NoteView } from "@withy/contracts/clinical";
import { dayOf } from "@withy/core/zoned-time";
import { noteAddenda, notes } from "@withy/db/schema";
import { and, asc, eq } from "drizzle-orm";
import type { Context } from "../context";
import { loadRecord } from "../load-record";
import { loadPatientForCare } from "./clinical-patient";
import { listNoteLines } from "./episode-records";
import type { NoteAtHand } from "./note-records";

async function listAddenda(ctx: Context, noteId: string): Promise<AddendumView[]> {
  const rows = await ctx.db
    .select()
    .from(noteAddenda)
    .where(and(eq(noteAddenda.practiceId, ctx.practiceId), eq(noteAddenda.noteId, noteId)))
    .orderBy(asc(noteAddenda.writtenAt), asc(noteAddenda.id));
  return rows.map((row) => ({
    id: row.id,
    text: row.text,
    reason: row.reason,
    authorName: row.authorName,
    registrationNumber: row.registrationNumber,
    writtenAt: row.writtenAt.toISOString(),
  }));
}

async function findEarlier(
  ctx: Context,
  lines: Awaited<ReturnType<typeof listNoteLines>>,
  at: number,
): Promise<EarlierNote | null> {
  const line = lines[at - 1];
  if (at < 1 || !line) return null;
  const { body } = await loadRecord(ctx, notes, line.id, "note");
  return {
    id: line.id,
    kind: line.kind,
    state: line.state,
    visitNumber: at,
    visitAt: line.visitAt.toISOString(),
    body,
  };
}

function episodeOf({ episode }: NoteAtHand): NoteView["episode"] {
  return {
    id: episode.id,
    problem: episode.problem,
    region: episode.region,
    side: episode.side,
    place: placeWords(episode.region, episode.side),
    state: episode.state,
    redFlags: episode.redFlags,
    version: episode.version,
  };
}

/** The whole note with the visit before beside it. Its readers are audited by the verb that calls this. */
export async function noteView(ctx: Context, at: NoteAtHand): Promise<NoteView> {
  const { note, zone } = at;
  const lines = await listNoteLines(ctx, note.episodeId);
  const place = lines.findIndex((line) => line.id === note.id);
  const patient = await loadPatientForCare(ctx, note.patientId, dayOf(note.visitAt, zone));
  const entry = readEntryTimes(note.visitAt, note.signedAt ?? note.updatedAt, zone);
  return {
    id: note.id,
    kind: note.kind,
    state: note.state,
    body: note.body,
    version: note.version,
    visitNumber: place + 1,
    visitAt: note.visitAt.toISOString(),
    visitEndsAt: at.visitEndsAt?.toISOString() ?? null,
    updatedAt: note.updatedAt.toISOString(),
    authorName: at.authorName,
    canWrite: note.state === "draft" && note.authorId === ctx.staffMemberId,
    signedAt: note.signedAt?.toISOString() ?? null,
    signedName: note.signedName,
    registrationNumber: note.registrationNumber,
    bodyHash: note.bodyHash,
    entryWords: entry.words,
    isLateEntry: entry.isLate,
    addenda: await listAddenda(ctx, note.id),
    patient: patient.view,
    episode: episodeOf(at),
    siteName: at.siteName,
    zone,
    earlier: await findEarlier(ctx, lines, place),
  };
}
