import { runInTransaction } from "@withy/db/transaction";
import type { SystemContext } from "./context";

const inside = new WeakSet<object>();

/**
 * Runs the work with a context whose `db` is one transaction; retried as a whole on a deadlock, so the work must
 * do nothing outside the database. Called inside a transaction it joins that one.
 */
export async function inTransaction<C extends SystemContext, T>(
  ctx: C,
  work: (ctx: C) => Promise<T>,
): Promise<T> {
  if (inside.has(ctx)) return work(ctx);
  return runInTransaction(ctx.db, async (tx) => {
    const within = { ...ctx, db: tx };
    inside.add(within);
    return work(within);
  });
}
