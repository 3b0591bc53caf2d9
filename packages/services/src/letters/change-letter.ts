import { stale } from "@withy/core/errors";
import { letters } from "@withy/db/schema";
import { and, eq } from "drizzle-orm";
import type { Context } from "../context";
import { type LetterRow, sectionsOf } from "./letter-records";

type Changes = Partial<Omit<LetterRow, "practiceId" | "id" | "version" | "updatedAt">>;

/** Refuses a save of an old version, with what stands now, so that neither text is lost. */
export function requireLetterVersion(letter: LetterRow, seen: number): void {
  if (letter.version !== seen)
    throw stale("letter", { version: letter.version, sections: sectionsOf(letter) });
}

/** Writes changes to a letter whose row this transaction holds, and gives it its next version. */
export async function changeLetter(ctx: Context, letter: LetterRow, changes: Changes): Promise<LetterRow> {
  const next = { ...changes, version: letter.version + 1, updatedAt: ctx.clock.now() };
  await ctx.db
    .update(letters)
    .set(next)
    .where(and(eq(letters.practiceId, ctx.practiceId), eq(letters.id, letter.id)));
  return { ...letter, ...next };
}
