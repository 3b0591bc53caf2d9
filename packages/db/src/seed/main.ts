import mysql from "mysql2/promise";
import { isSeeded, seedDemo } from "./seed";

const url = process.env.WITHY_MIGRATE_URL;
if (!url) throw new Error("Set WITHY_MIGRATE_URL to the address of the migrating user.");
const connection = await mysql.createConnection({ uri: url, timezone: "Z", supportBigNumbers: true });
try {
  if (await isSeeded(connection)) console.log("already there");
  else console.log(`${(await seedDemo(connection, new Date())).toLocaleString("en-GB")} rows`);
} finally {
  await connection.end();
}
