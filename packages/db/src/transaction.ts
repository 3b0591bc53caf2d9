import type { Database } from "./client";
import { DatabaseError } from "./database-error";

const deadlock = 1213;
const lockWait = 1205;
const tries = 5;

/**
 * Runs the work in one transaction, READ COMMITTED as the pool's sessions are. A deadlock or a lock wait rolls back and runs the whole
 * function again, up to five times with jitter: MariaDB answers either for unrelated bookings too, and a cluster
 * answers a conflict as a deadlock at commit.
 */
export async function runInTransaction<T>(db: Database, work: (tx: Database) => Promise<T>): Promise<T> {
  for (let attempt = 1; ; attempt += 1) {
    try {
      return await db.transaction((tx) => work(tx as unknown as Database));
    } catch (error) {
      const isPassing = error instanceof DatabaseError && [deadlock, lockWait].includes(error.errno);
      if (!isPassing || attempt === tries) throw error;
      await new Promise((resolve) => setTimeout(resolve, Math.random() * 15 * 2 ** attempt));
    }
  }
}
