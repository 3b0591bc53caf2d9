import { diaryClaims } from "@withy/db/schema";
import { lt, sql } from "drizzle-orm";
import type { SystemContext } from "../context";

const keptDays = 60;
const atOnce = 5_000;

/**
 * Deletes one portion of the diary's claims for days long gone: nothing can be booked there, and they would only
 * grow. @returns how many went, so that the caller can go on until none are left
 */
export async function pruneOldClaims(ctx: SystemContext): Promise<number> {
  const before = new Date(ctx.clock.now().getTime() - keptDays * 24 * 60 * 60_000);
  const [result] = await ctx.db.execute(
    sql`delete from ${diaryClaims} where ${lt(diaryClaims.slotAt, before)} limit ${atOnce}`,
  );
  return (result as unknown as { affectedRows: number }).affectedRows;
}
