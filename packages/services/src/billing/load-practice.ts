import { notFound } from "@withy/core/errors";
import { practices } from "@withy/db/schema";
import { eq } from "drizzle-orm";
import type { Context } from "../context";

export type PracticeRow = typeof practices.$inferSelect;

/** The practice itself: its name and address, its VAT registration and how it numbers and rounds. */
export async function loadPractice(ctx: Context): Promise<PracticeRow> {
  const [row] = await ctx.db.select().from(practices).where(eq(practices.id, ctx.practiceId)).limit(1);
  if (!row) throw notFound("practice");
  return row;
}
