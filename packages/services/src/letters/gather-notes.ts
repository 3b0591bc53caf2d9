import { dayOf } from "@withy/core/zoned-time";
import { notes } from "@withy/db/schema";
import type { NotedText } from "@withy/documents/letter/discharge-facts";
import { and, asc, eq } from "drizzle-orm";
import type { Context } from "../context";

type NoteRow = typeof notes.$inferSelect;

/** Every note of the episode in the order of the visits. */
export async function listNotes(ctx: Context, episodeId: string): Promise<NoteRow[]> {
  return ctx.db
    .select()
    .from(notes)
    .where(and(eq(notes.practiceId, ctx.practiceId), eq(notes.episodeId, episodeId)))
    .orderBy(asc(notes.visitAt), asc(notes.id));
}

/** What one note says under one heading; null where it says nothing. */
function noted(note: NoteRow | undefined, part: string, zone: string): NotedText | null {
  const text = note?.body[part]?.trim() ?? "";
  if (!note || text === "") return null;
  return { noteId: note.id, noteKind: note.kind, on: dayOf(note.visitAt, zone), part, text };
}

/** What the signed notes give to a letter. A draft is not yet anybody's word, so nothing is taken from one. */
export function noteFacts(rows: readonly NoteRow[], zone: string) {
  const signed = rows.filter((row) => row.state === "signed");
  const [first] = signed;
  const last = signed.at(-1);
  const each = (part: string): NotedText[] => signed.flatMap((row) => noted(row, part, zone) ?? []);
  return {
    history: [noted(first, "history", zone), noted(first, "background", zone)].filter(
      (text) => text !== null,
    ),
    examined: { first: noted(first, "examination", zone), last: noted(last, "examination", zone) },
    treatments: each("treatment"),
    advice: each("advice"),
    plan: noted(last, "plan", zone),
  };
}
