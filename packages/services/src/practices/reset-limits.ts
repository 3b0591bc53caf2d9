import type { Connection } from "@withy/db/client";
import { countTry, createLimiter } from "./limit-tries";

export interface ResetLimits {
  /** Counts one request for a new password. Throws "refused" while the account or the address has used up its own. */
  count(account: string, address: string): Promise<void>;
}

const advice = "ask again. Look in your mail meanwhile: the link may have come";

/** Five requests per account and thirty per network address in an hour. */
export function createResetLimits(connection: Connection, databaseName: string): ResetLimits {
  const limiter = (keyPrefix: string, points: number) =>
    createLimiter(connection, databaseName, { keyPrefix, points, minutes: 60 });
  const perAccount = limiter("reset-account", 5);
  const perAddress = limiter("reset-address", 30);
  return {
    async count(account, address) {
      await countTry(perAddress, address, advice);
      await countTry(perAccount, account, advice);
    },
  };
}
