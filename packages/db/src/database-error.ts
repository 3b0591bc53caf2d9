/**
 * A failed statement, stripped of its SQL and parameters: the driver's own error carries both, with names and
 * notes in them, and must reach no log.
 */
export class DatabaseError extends Error {
  readonly errno: number;
  /** For a duplicate: the name of the key, never the value. */
  readonly key: string | null;

  constructor(errno: number, key: string | null) {
    super(`The database refused a statement (error ${errno}${key === null ? "" : `, key ${key}`}).`);
    this.name = "DatabaseError";
    this.errno = errno;
    this.key = key;
  }
}

interface DriverError {
  errno: number;
  sqlMessage?: string;
}

function driverErrorIn(error: unknown): DriverError | null {
  for (let e: unknown = error; e instanceof Error; e = e.cause) {
    if ("errno" in e && typeof e.errno === "number") return e as unknown as DriverError;
  }
  return null;
}

/** The server's error number, or null where the error is not the database's. */
export function databaseErrno(error: unknown): number | null {
  return driverErrorIn(error)?.errno ?? null;
}

export function unwrapDatabaseError(error: unknown): unknown {
  if (error instanceof DatabaseError) return error;
  const driver = driverErrorIn(error);
  if (!driver) return error;
  const key = /for key '([^']+)'/.exec(driver.sqlMessage ?? "")?.[1] ?? null;
  return new DatabaseError(driver.errno, key?.split(".").at(-1) ?? null);
}

const duplicateEntry = 1062;

/** Whether a statement failed on this unique key ("PRIMARY" for the primary one). */
export function isDuplicate(error: unknown, key: string): boolean {
  const known = unwrapDatabaseError(error);
  return known instanceof DatabaseError && known.errno === duplicateEntry && known.key === key;
}
