import { DrizzleQueryError } from "drizzle-orm/errors";

/**
 * A failed statement, stripped of its SQL and parameters: the driver's own error carries both, with names and
 * notes in them, and must reach no log.
 */
export class DatabaseError extends Error {
  /** The server's error number; 0 where the connection failed before the server answered. */
  readonly errno: number;
  /** For a duplicate: the name of the key, never the value. */
  readonly key: string | null;

  constructor(errno: number, key: string | null, code: string | null = null) {
    super(
      errno > 0
        ? `The database refused a statement (error ${errno}${key === null ? "" : `, key ${key}`}).`
        : `The database is out of reach${code === null ? "" : ` (${code})`}.`,
    );
    this.name = "DatabaseError";
    this.errno = errno;
    this.key = key;
  }
}

interface DriverError {
  errno?: unknown;
  code?: unknown;
  sqlMessage?: unknown;
}

/** The driver's or the query builder's error as a `DatabaseError`; any other error as it is. */
export function unwrapDatabaseError(error: unknown): unknown {
  const isFailedQuery = error instanceof DrizzleQueryError;
  const said = isFailedQuery ? error.cause : error;
  if (said instanceof DatabaseError) return said;
  const { errno, code, sqlMessage } = (said instanceof Error ? said : {}) as DriverError;
  if (typeof errno !== "number" && !isFailedQuery) return error;
  const key = typeof sqlMessage === "string" ? /for key '([^']+)'/.exec(sqlMessage)?.[1] : undefined;
  return new DatabaseError(
    typeof errno === "number" && errno > 0 ? errno : 0,
    key?.split(".").at(-1) ?? null,
    typeof code === "string" ? code : null,
  );
}

const duplicateEntry = 1062;

/** Whether a statement failed on this unique key ("PRIMARY" for the primary one). */
export function isDuplicate(error: unknown, key: string): boolean {
  return error instanceof DatabaseError && error.errno === duplicateEntry && error.key === key;
}
