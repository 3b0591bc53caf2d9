import { migrateDatabase } from "@withy/db/migrate";
import * as schema from "@withy/db/schema";
import { getTableName, is } from "drizzle-orm";
import { MySqlTable } from "drizzle-orm/mysql-core";
import mysql from "mysql2/promise";
import { afterAll, beforeAll, expect, test } from "vitest";

const emptyUrl = (process.env.WITHY_MIGRATE_URL ?? "").replace(/\/[^/]*$/, "/withy_test_empty");
const tablesInCode = Object.values(schema)
  .filter((value) => is(value, MySqlTable))
  .map((table) => getTableName(table as MySqlTable))
  .sort();

let connection: mysql.Connection;
const ask = async <T>(sql: string) => (await connection.query(sql))[0] as T[];

beforeAll(async () => {
  // Two at once, as when two machines start together: the second waits for the first.
  await Promise.all([migrateDatabase(emptyUrl), migrateDatabase(emptyUrl)]);
  connection = await mysql.createConnection({ uri: emptyUrl });
});
afterAll(() => connection.end());

test("the migrations build every table of the schema from nothing", async () => {
  const rows = await ask<{ name: string }>(
    "select table_name as name from information_schema.tables where table_schema = database() and table_name not like '\\_\\_%' order by table_name",
  );
  expect(rows.map((row) => row.name).sort()).toEqual(tablesInCode);
});

test("running them again changes nothing", async () => {
  const before = await ask("select * from __drizzle_migrations");
  await migrateDatabase(emptyUrl);
  expect(await ask("select * from __drizzle_migrations")).toEqual(before);
});

test("every table compares text by the same accent-aware rules", async () => {
  const other = await ask(
    "select table_name, table_collation from information_schema.tables where table_schema = database() and table_collation <> 'utf8mb4_uca1400_ai_ci'",
  );
  expect(other).toEqual([]);
});

test("a table of a practice is keyed by the practice first", async () => {
  const rows = await ask<{ name: string; first: string }>(
    `select t.table_name as name, k.column_name as first
       from information_schema.columns t
       join information_schema.key_column_usage k
         on k.table_schema = t.table_schema and k.table_name = t.table_name and k.constraint_name = 'PRIMARY' and k.ordinal_position = 1
      where t.table_schema = database() and t.column_name = 'practice_id' and k.column_name <> 'practice_id'
      order by t.table_name`,
  );
  // Read before the practice is known: a session by its cookie, a link by its token, the queues by their time.
  expect(rows.map((row) => row.name)).toEqual([
    "account_tokens",
    "jobs",
    "outbox_messages",
    "sessions",
    "staff_accounts",
  ]);
});

test("a reference between rows of a practice carries the practice", async () => {
  const bare = await ask(
    `select k.table_name, k.constraint_name from information_schema.key_column_usage k
      where k.table_schema = database() and k.referenced_table_name is not null and k.referenced_table_name <> 'practices'
      group by k.table_name, k.constraint_name
      having sum(k.column_name = 'practice_id' and k.referenced_column_name = 'practice_id') <> 1`,
  );
  expect(bare).toEqual([]);
});
