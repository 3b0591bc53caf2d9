import { createServer, type Server } from "node:http";
import { dayBounds } from "@withy/core/zoned-time";
import { dayAppointmentsSql } from "@withy/services/diary/day-appointments";
import { MySqlDialect } from "drizzle-orm/mysql-core";
import mysql from "mysql2/promise";

/** The day's own query, answered by nothing but node:http and mysql2: what no framework of ours can beat. */
export async function startBareServer(
  url: string,
  practiceId: string,
  siteIds: readonly string[],
  day: string,
) {
  const pool = mysql.createPool({ uri: url, timezone: "Z", connectionLimit: 4 });
  const { from, to } = dayBounds(day, "Europe/London");
  const { sql, params } = new MySqlDialect().sqlToQuery(
    dayAppointmentsSql(practiceId, { siteIds }, from, to),
  );
  const server = createServer((_, response) => {
    pool.query(sql, params).then(
      ([rows]) => response.setHeader("content-type", "application/json").end(JSON.stringify(rows)),
      () => response.writeHead(500).end(),
    );
  });
  await new Promise<void>((done) => server.listen(0, "127.0.0.1", done));
  return { url: `http://127.0.0.1:${portOf(server)}`, close: () => closeAll(server, pool) };
}

const portOf = (server: Server): number => {
  const address = server.address();
  return typeof address === "object" && address !== null ? address.port : 0;
};

async function closeAll(server: Server, pool: mysql.Pool): Promise<void> {
  server.closeAllConnections();
  await new Promise((done) => server.close(done));
  await pool.end();
}
