import { type Connection, connect } from "@withy/db/client";
import mysql from "mysql2/promise";
import { afterAll } from "vitest";

let opened: Connection | null = null;

/** This test file's connection to its worker's database, as the app's user; closed when the file is done. */
export function testConnection(): Connection {
  if (opened) return opened;
  const url = process.env.DATABASE_URL;
  if (!url) throw new Error("Run this test in the project named db.");
  opened = connect(url, { connectionLimit: 45 });
  return opened;
}

/** The same database as its owner, to look where the app may not or to try to break in. */
export async function asDatabaseOwner<T>(work: (connection: mysql.Connection) => Promise<T>): Promise<T> {
  const connection = await mysql.createConnection({
    uri: process.env.WITHY_MIGRATE_URL ?? "",
    timezone: "Z",
    supportBigNumbers: true,
  });
  try {
    return await work(connection);
  } finally {
    await connection.end();
  }
}

afterAll(async () => {
  await opened?.close();
  opened = null;
});
