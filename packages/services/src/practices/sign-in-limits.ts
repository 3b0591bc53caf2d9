import { AppError } from "@withy/core/errors";
import type { Connection } from "@withy/db/client";
import { RateLimiterMySQL, type RateLimiterRes } from "rate-limiter-flexible";

export interface SignInLimits {
  /** Counts one try. Throws "refused" while the account or the address has used up its tries. */
  count(account: string, address: string): Promise<void>;
  /** Forgets the account's tries after a right password. */
  forget(account: string): Promise<void>;
}

const minutes = 60;

/**
 * Ten tries per account and sixty per address in fifteen minutes, counted in the database so that every app process
 * sees them. They lapse by themselves: nobody can lock another person out for good.
 */
export function createSignInLimits(connection: Connection, databaseName: string): SignInLimits {
  const shared = {
    storeClient: connection.pool.pool,
    dbName: databaseName,
    tableName: "request_limits",
    tableCreated: true,
    clearExpiredByTimeout: false,
  };
  const perAccount = new RateLimiterMySQL({
    ...shared,
    keyPrefix: "sign-in-account",
    points: 10,
    duration: 15 * minutes,
  });
  const perAddress = new RateLimiterMySQL({
    ...shared,
    keyPrefix: "sign-in-address",
    points: 60,
    duration: 15 * minutes,
  });
  return {
    async count(account, address) {
      await consume(perAddress, address);
      await consume(perAccount, account);
    },
    async forget(account) {
      await perAccount.delete(account);
    },
  };
}

async function consume(limiter: RateLimiterMySQL, key: string): Promise<void> {
  try {
    await limiter.consume(key);
  } catch (error) {
    if (error instanceof Error) throw error;
    const wait = Math.max(1, Math.ceil((error as RateLimiterRes).msBeforeNext / 60_000));
    throw new AppError(
      "refused",
      `Too many tries. Wait ${wait === 1 ? "a minute" : `${wait} minutes`}, then try again, or reset your password.`,
      {
        kind: "too-many-tries",
      },
    );
  }
}
