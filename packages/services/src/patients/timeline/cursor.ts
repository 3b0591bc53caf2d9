import { and, eq, lt, or, type SQL, sql } from "drizzle-orm";
import type { MySqlColumn } from "drizzle-orm/mysql-core";

/** Where the page before ended. Two rows of one instant are told apart by their ids. */
export interface Cursor {
  at: Date;
  id: string;
}

/** What every source of the timeline is asked: at most `limit` rows older than the cursor, newest first. */
export interface Slice {
  patientId: string;
  before: Cursor | null;
  limit: number;
}

export function readCursor(text: string | undefined): Cursor | null {
  const [at = "", id = ""] = text?.split("_") ?? [];
  const instant = new Date(at);
  return Number.isNaN(instant.getTime()) || id === "" ? null : { at: instant, id };
}

export function writeCursor(entry: { at: string; id: string }): string {
  return `${entry.at}_${entry.id}`;
}

export function olderThan(at: MySqlColumn | SQL, id: MySqlColumn, before: Cursor | null): SQL | undefined {
  if (before === null) return undefined;
  return or(lt(sql`${at}`, before.at), and(eq(sql`${at}`, before.at), lt(id, before.id)));
}
