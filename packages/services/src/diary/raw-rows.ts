import type { SQL } from "drizzle-orm";
import type { Context } from "../context";

/**
 * Runs a statement that the builder has no words for, or whose rows it would map too slowly. Instants come back as
 * text in UTC; `utc` reads them.
 */
export async function rowsOf<T>(db: Context["db"], query: SQL): Promise<T[]> {
  const [rows] = (await db.execute(query)) as unknown as [T[]];
  return rows;
}

/** Milliseconds since the epoch of the database's "2026-12-01 10:15:00.000". */
export function utc(text: string): number {
  return Date.parse(`${text.replace(" ", "T")}Z`);
}

export const isoOf = (text: string): string => new Date(utc(text)).toISOString();

/** An instant as a statement's parameter. */
export const sqlTime = (at: Date): string => at.toISOString().replace("T", " ").replace("Z", "");

/** A JSON column's list of words, which comes as text from a statement that the builder did not write. */
export const jsonList = (value: string | string[] | null): string[] =>
  typeof value === "string" ? (JSON.parse(value) as string[]) : (value ?? []);
