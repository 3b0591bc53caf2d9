import { openDatabase } from "@withy/db/quiet-session";
import type { SystemContext } from "@withy/services/context";
import mysql from "mysql2/promise";

/** Thrown in place of an answer by a worker that is no more. */
export class Killed extends Error {
  override readonly name = "Killed";
}

type Statement = (...given: unknown[]) => Promise<unknown>;

/**
 * A database as a worker has it that dies after so many statements: before the next one reaches the server, or after
 * it was done and before the answer is back. From then on nothing of it works, and its connections are cut, so that
 * the server rolls back what was open.
 */
export function mortalDatabase(statements: number, diesBefore: boolean) {
  const pool = mysql.createPool({ uri: process.env.DATABASE_URL ?? "", timezone: "Z", connectionLimit: 2 });
  const open = new Set<mysql.PoolConnection>();
  let left = statements;
  const die = (): never => {
    left = -1;
    for (const connection of open) connection.destroy();
    throw new Killed();
  };
  const mortal =
    (run: Statement): Statement =>
    async (...given) => {
      if (left < 0 || (left === 0 && diesBefore)) die();
      const isLast = left === 0;
      left -= 1;
      const answer = await run(...given);
      return isLast ? die() : answer;
    };
  const wrap = <T extends object>(real: T): T =>
    new Proxy(real, {
      get(target, name) {
        const value: unknown = Reflect.get(target, name);
        if (typeof value !== "function") return value;
        const bound = value.bind(target) as Statement;
        if (name === "query" || name === "execute") return mortal(bound);
        if (name !== "getConnection") return bound;
        return async () => {
          if (left < 0) throw new Killed();
          const connection = (await bound()) as mysql.PoolConnection;
          open.add(connection);
          await connection.query("set session time_zone = '+00:00', tx_isolation = 'READ-COMMITTED'");
          return wrap(connection);
        };
      },
    });
  pool.pool.on("connection", (connection) => {
    connection.query("set session time_zone = '+00:00', tx_isolation = 'READ-COMMITTED'");
  });
  const db = openDatabase(wrap(pool)) as SystemContext["db"];
  return { db, isDead: () => left < 0, die, bury: () => pool.end().catch(() => undefined) };
}
