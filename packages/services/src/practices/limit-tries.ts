import { AppError } from "@withy/core/errors";
import type { Connection } from "@withy/db/client";
import { unwrapDatabaseError } from "@withy/db/database-error";
import { RateLimiterMySQL, type RateLimiterRes } from "rate-limiter-flexible";

/** A counter of tries under one prefix, kept in the database so that every app process sees it. It lapses by itself. */
export function createLimiter(
  connection: Connection,
  databaseName: string,
  limit: { keyPrefix: string; points: number; minutes: number },
): RateLimiterMySQL {
  return new RateLimiterMySQL({
    storeClient: connection.pool.pool,
    dbName: databaseName,
    tableName: "request_limits",
    tableCreated: true,
    clearExpiredByTimeout: false,
    keyPrefix: limit.keyPrefix,
    points: limit.points,
    duration: limit.minutes * 60,
  });
}

/** Counts one try. @throws refused "too-many-tries" with the minutes to wait and this advice */
export async function countTry(limiter: RateLimiterMySQL, key: string, advice: string): Promise<void> {
  try {
    await limiter.consume(key);
  } catch (error) {
    if (error instanceof Error) throw unwrapDatabaseError(error);
    const wait = Math.max(1, Math.ceil((error as RateLimiterRes).msBeforeNext / 60_000));
    throw new AppError(
      "refused",
      `Too many tries. Wait ${wait === 1 ? "a minute" : `${wait} minutes`}, then ${advice}.`,
      { kind: "too-many-tries" },
    );
  }
}
