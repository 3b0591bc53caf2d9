import { fileURLToPath } from "node:url";
import { drizzle } from "drizzle-orm/mysql2";
import { migrate } from "drizzle-orm/mysql2/migrator";
import mysql, { type Connection } from "mysql2/promise";
import { grantStatements } from "./grants";

const migrationsFolder = fileURLToPath(new URL("../migrations", import.meta.url));

/**
 * Brings the database named in the address up to date and renews the app user's rights. Two at once wait for each
 * other: migrations have no lock of their own.
 * @param url the address of the user that owns DDL
 */
export async function migrateDatabase(url: string): Promise<void> {
  const connection = await mysql.createConnection({ uri: url, timezone: "Z", supportBigNumbers: true });
  try {
    await connection.query("select get_lock('withy-migrate', 120)");
    await migrate(drizzle(connection), { migrationsFolder });
    await grantToApp(connection);
  } finally {
    await connection.end();
  }
}

async function grantToApp(connection: Connection): Promise<void> {
  const [rows] = await connection.query("select database() as name");
  const name = (rows as { name: string }[])[0]?.name ?? "";
  const [tables] = await connection.query(
    "select table_name as t from information_schema.tables where table_schema = ?",
    [name],
  );
  for (const statement of grantStatements(
    name,
    (tables as { t: string }[]).map((r) => r.t),
  )) {
    await connection.query(statement);
  }
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  const url = process.env["WITHY_MIGRATE_URL"];
  if (!url) throw new Error("Set WITHY_MIGRATE_URL to the address of the migrating user.");
  await migrateDatabase(url);
  console.log(`The database ${new URL(url).pathname.slice(1)} is up to date.`);
}
