import type { MySql2Database } from "drizzle-orm/mysql2";
import mysql, { type Pool } from "mysql2/promise";
import { openDatabase } from "./quiet-session";

/** The connection pool or a transaction on it: whatever a query can be run on. */
export type Database = Omit<MySql2Database<Record<string, never>>, "$client">;

export interface Connection {
  readonly db: Database;
  readonly pool: Pool;
  close(): Promise<void>;
}

/**
 * Opens a pool in UTC and READ COMMITTED with exact big integers. No relations schema is given, so the relational query interface,
 * which MariaDB cannot run, is out of reach.
 */
export function connect(url: string, options: { connectionLimit?: number } = {}): Connection {
  const pool = mysql.createPool({
    uri: url,
    timezone: "Z",
    supportBigNumbers: true,
    connectionLimit: options.connectionLimit ?? 10,
    maxIdle: options.connectionLimit ?? 10,
    enableKeepAlive: true,
  });
  pool.pool.on("connection", (connection) => {
    connection.query("set session time_zone = '+00:00', tx_isolation = 'READ-COMMITTED'");
  });
  return { db: openDatabase(pool), pool, close: () => pool.end() };
}
