import mysql from "mysql2/promise";
import { fillVolume } from "./volume";
import { large, small } from "./volume-plan";

/** Fills both databases; says how long the large one took. */
for (const plan of [small, large]) {
  const url = process.env.WITHY_BENCH_URL?.replace(/[^/]*$/, plan.database);
  if (!url) throw new Error("Set WITHY_BENCH_URL to the address of the migrating user.");
  const connection = await mysql.createConnection({ uri: url, timezone: "Z" });
  const [rows] = await connection.query("SELECT 1 FROM practices LIMIT 1");
  if ((rows as unknown[]).length === 0) {
    const since = performance.now();
    await fillVolume(connection, plan);
    console.log(
      `${plan.appointments.toLocaleString("en-GB")} appointments in ${((performance.now() - since) / 1000).toFixed(1)} s`,
    );
  }
  await connection.end();
}
