import { notFound } from "@withy/core/errors";
import { and, eq } from "drizzle-orm";
import type { AnyMySqlColumn, MySqlTable } from "drizzle-orm/mysql-core";
import type { Context } from "./context";

type TenantTable = MySqlTable & { practiceId: AnyMySqlColumn; id: AnyMySqlColumn };

/**
 * Loads one row inside the practice, or refuses as "not found": a foreign row and a missing one answer the same.
 * @param lock take the row for this transaction, for a read that a write depends on
 */
export async function loadRecord<T extends TenantTable>(
  ctx: Pick<Context, "db" | "practiceId">,
  table: T,
  id: string,
  what: string,
  options: { lock?: boolean } = {},
): Promise<T["$inferSelect"]> {
  const row = await findRecord(ctx, table, id, options);
  if (!row) throw notFound(what);
  return row;
}

export async function findRecord<T extends TenantTable>(
  ctx: Pick<Context, "db" | "practiceId">,
  table: T,
  id: string,
  options: { lock?: boolean } = {},
): Promise<T["$inferSelect"] | null> {
  const query = ctx.db
    .select()
    .from(table as MySqlTable)
    .where(and(eq(table.practiceId, ctx.practiceId), eq(table.id, id)))
    .limit(1);
  const rows = await (options.lock ? query.for("update") : query);
  return (rows[0] as T["$inferSelect"] | undefined) ?? null;
}
