import { type SQLWrapper, sql } from "drizzle-orm";
import type { Database } from "./client";

/**
 * Runs several writes of a transaction, in their order, in one journey to the server. The first that fails ends them
 * with its own error, and the caller's transaction rolls back what went before. No rows or counts come back.
 */
export async function writeTogether(db: Database, writes: readonly SQLWrapper[]): Promise<void> {
  if (writes.length === 0) return;
  const statements = sql.join(
    writes.map((write) => write.getSQL()),
    sql`; `,
  );
  await db.execute(sql`begin not atomic ${statements}; end`);
}
