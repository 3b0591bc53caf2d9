import { isStateKept } from "@withy/clinical/notes/entry-times";
import { noteVersions } from "@withy/db/schema";
import { and, desc, eq } from "drizzle-orm";
import type { Context } from "../context";
import type { NoteRow } from "./note-records";

/** Puts one state of the text into the note's history, which nobody can change. */
export async function keepState(
  ctx: Context,
  state: { noteId: string; version: number; body: Record<string, string>; savedAt: Date; savedBy: string },
): Promise<void> {
  await ctx.db.insert(noteVersions).values({ practiceId: ctx.practiceId, ...state });
}

/** Keeps the state that is about to be overwritten, where someone will have read it. */
export async function keepOverwritten(ctx: Context, note: NoteRow, now: Date): Promise<void> {
  if (Object.keys(note.body).length === 0) return;
  const [last] = await ctx.db
    .select({ version: noteVersions.version, savedAt: noteVersions.savedAt })
    .from(noteVersions)
    .where(and(eq(noteVersions.practiceId, ctx.practiceId), eq(noteVersions.noteId, note.id)))
    .orderBy(desc(noteVersions.version))
    .limit(1);
  if (last?.version === note.version) return;
  if (!isStateKept({ savedAt: note.updatedAt, lastKeptAt: last?.savedAt ?? null, now })) return;
  await keepState(ctx, {
    noteId: note.id,
    version: note.version,
    body: note.body,
    savedAt: note.updatedAt,
    savedBy: note.authorId,
  });
}
