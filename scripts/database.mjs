import { existsSync, mkdirSync, readFileSync } from "node:fs";
import { hostname, tmpdir } from "node:os";
import { join } from "node:path";
import { isRoot } from "./machine.mjs";
import { lastLines, pause, run, startProcess } from "./processes.mjs";
import { StartError } from "./progress.mjs";

const collation = "utf8mb4_uca1400_ai_ci";
const sqlMode = [
  "STRICT_TRANS_TABLES",
  "STRICT_ALL_TABLES",
  "ERROR_FOR_DIVISION_BY_ZERO",
  "NO_ZERO_IN_DATE",
  "NO_ZERO_DATE",
  "NO_ENGINE_SUBSTITUTION",
  "ONLY_FULL_GROUP_BY",
].join(",");

const shared = [
  "--bind-address=127.0.0.1",
  "--skip-name-resolve",
  "--character-set-server=utf8mb4",
  `--collation-server=${collation}`,
  "--default-time-zone=+00:00",
  `--sql-mode=${sqlMode}`,
  "--transaction-isolation=READ-COMMITTED",
  "--max-connections=200",
  "--secure-timestamp=SUPER",
  "--log-bin-trust-function-creators=1",
];

/** Nothing that was acknowledged is lost when the machine dies. */
const durable = [
  "--innodb-flush-log-at-trx-commit=1",
  "--log-bin=withy-bin",
  "--server-id=1",
  "--binlog-format=ROW",
  "--sync-binlog=1",
  "--expire-logs-days=14",
  "--innodb-buffer-pool-size=256M",
];

/** For tests only: may lose everything, and is quick. */
const fast = [
  "--skip-log-bin",
  "--innodb-flush-log-at-trx-commit=0",
  "--innodb-doublewrite=0",
  "--innodb-log-file-size=16M",
  "--innodb-use-native-aio=0",
];

const asRoot = () => (isRoot() ? ["--user=root"] : []);

/** A socket's path may have at most 107 characters: a deep data folder gets its socket in the temporary folder. */
function socketFor(dir, port) {
  const inside = join(dir, "db.sock");
  return inside.length < 100 ? inside : join(tmpdir(), `withy-${port}.sock`);
}

export async function createDataFolder(dir) {
  if (existsSync(join(dir, "mysql"))) return false;
  mkdirSync(dir, { recursive: true, mode: 0o700 });
  await run(
    "mariadb-install-db",
    [
      "--no-defaults",
      `--datadir=${dir}`,
      "--auth-root-authentication-method=normal",
      "--skip-test-db",
      ...asRoot(),
    ],
    { failure: "The database folder could not be made." },
  );
  return true;
}

/** Starts a server on loopback over the folder and waits until it answers. `kind` is "durable" or "fast". */
export async function startDatabase({ dir, port, kind, logDir }) {
  const socket = socketFor(dir, port);
  const started = startProcess(
    "database",
    "/usr/sbin/mariadbd",
    [
      "--no-defaults",
      `--datadir=${dir}`,
      `--socket=${socket}`,
      `--pid-file=${join(dir, "db.pid")}`,
      `--port=${port}`,
      ...shared,
      ...(kind === "durable" ? durable : fast),
      ...asRoot(),
    ],
    { cwd: dir, env: process.env, logDir },
  );
  const until = Date.now() + 60_000;
  while (Date.now() < until && !started.hasEnded) {
    const isUp = await run("mariadb-admin", ["--no-defaults", "-S", socket, "-uroot", "ping"]).then(
      () => true,
      () => false,
    );
    if (isUp) return Object.assign(started, { socket, port });
    await pause(80);
  }
  started.child.kill("SIGTERM");
  throw new StartError(
    `The database did not start. Its log (${started.logFile}) ends with:\n${lastLines(readFileSync(started.logFile, "utf8"), 12)}`,
  );
}

/** Runs SQL as the database's root through its socket, which only this account can reach. */
export function runSql(server, sql, database = "") {
  return run(
    "mariadb",
    ["--no-defaults", "-S", server.socket, "-uroot", "-N", "-B", ...(database ? [database] : [])],
    { input: sql },
  );
}

const quote = (text) => `'${text.replaceAll("\\", "\\\\").replaceAll("'", "''")}'`;

/**
 * The database and its two users. withy_migrate owns tables and may grant them on; withy_app starts with nothing,
 * and the migration gives it table by table what it needs.
 */
export async function createDatabases(server, names, { appPassword, migratePassword }) {
  const user = (name, password) =>
    `CREATE USER IF NOT EXISTS ${name}@'127.0.0.1'; ALTER USER ${name}@'127.0.0.1' IDENTIFIED BY ${quote(password)};`;
  const sql = [
    // The folder comes with a root account open to every local program over TCP, and with nameless accounts.
    `DROP USER IF EXISTS root@'127.0.0.1', root@'::1', root@${quote(hostname())}, ''@'localhost', ''@${quote(hostname())};`,
    user("withy_migrate", migratePassword),
    user("withy_app", appPassword),
    ...names.flatMap((name) => [
      `CREATE DATABASE IF NOT EXISTS \`${name}\` CHARACTER SET utf8mb4 COLLATE ${collation};`,
      `GRANT ALL PRIVILEGES ON \`${name}\`.* TO withy_migrate@'127.0.0.1' WITH GRANT OPTION;`,
    ]),
  ];
  await runSql(server, sql.join("\n"));
}
