import type { Connection } from "@withy/db/client";
import { countTry, createLimiter } from "./limit-tries";

export interface SignInLimits {
  /** Counts one try. Throws "refused" while the account or the address has used up its tries. */
  count(account: string, address: string): Promise<void>;
  /** Forgets the account's tries after a right password. */
  forget(account: string): Promise<void>;
}

const advice = "try again, or reset your password";

/**
 * Ten tries per account and sixty per address in fifteen minutes. They lapse by themselves: nobody can lock another
 * person out for good.
 */
export function createSignInLimits(connection: Connection, databaseName: string): SignInLimits {
  const limiter = (keyPrefix: string, points: number) =>
    createLimiter(connection, databaseName, { keyPrefix, points, minutes: 15 });
  const perAccount = limiter("sign-in-account", 10);
  const perAddress = limiter("sign-in-address", 60);
  return {
    async count(account, address) {
      await countTry(perAddress, address, advice);
      await countTry(perAccount, account, advice);
    },
    async forget(account) {
      await perAccount.delete(account);
    },
  };
}
