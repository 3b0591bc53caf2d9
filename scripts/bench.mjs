import { existsSync, mkdirSync, rmSync } from "node:fs";
import { join } from "node:path";
import { createDatabases, createDataFolder, startDatabase } from "./database.mjs";
import { checkDisk, checkNode, ensurePackages } from "./machine.mjs";
import { freePorts, pause, run, startProcess, stopProcess } from "./processes.mjs";
import { main, StartError, step } from "./progress.mjs";
import { appEnvironment, databaseUrl, readSecrets, readSettings, root } from "./settings.mjs";
import { runTypeScript } from "./stack.mjs";
import { buildApp, installDependencies } from "./workspace.mjs";

const dataDir = join(root, ".withy-bench");
const blankApp = join(root, "tests/bench/blank-app");
const keeps = process.argv.includes("--keep");

const nextOf = (folder) => join(folder, "node_modules/next/dist/bin/next");

async function waitForAnswer(url, program) {
  const until = Date.now() + 60_000;
  while (Date.now() < until && !program.hasEnded) {
    const status = await fetch(url).then(
      (answer) => answer.status,
      () => 0,
    );
    if (status > 0) return;
    await pause(150);
  }
  throw new StartError(`${program.name} did not start. Look in ${program.logFile}.`);
}

/** The same build over two databases, and a page of the bare framework, each on a port of its own. */
async function startApps(secrets, dbPort) {
  const ports = await freePorts(3);
  const start = async (name, port, env, next, cwd, path) => {
    const program = startProcess(
      name,
      process.execPath,
      [next, "start", "-H", "127.0.0.1", "-p", String(port)],
      { cwd, env, logDir: join(dataDir, "logs") },
    );
    await waitForAnswer(`http://127.0.0.1:${port}${path}`, program);
    return { program, url: `http://127.0.0.1:${port}` };
  };
  const appEnv = (database, port) => ({
    ...appEnvironment({ ...readSettings({}, "/dev/null"), port, url: `http://127.0.0.1:${port}` }, secrets),
    DATABASE_URL: databaseUrl("withy_app", secrets.appPassword, dbPort, database),
    WITHY_LOG_LEVEL: "silent",
  });
  const staff = join(root, "apps/staff");
  return {
    large: await start("large", ports[0], appEnv("withy_large", ports[0]), nextOf(staff), staff, "/sign-in"),
    small: await start("small", ports[1], appEnv("withy_small", ports[1]), nextOf(staff), staff, "/sign-in"),
    blank: await start("blank", ports[2], process.env, nextOf(join(root, "tests")), blankApp, "/constant"),
  };
}

async function measure(secrets, running, dbPort) {
  await step("Two databases", async () => {
    await createDatabases(running.database, ["withy_small", "withy_large"], secrets);
    for (const name of ["withy_small", "withy_large"]) {
      const env = {
        ...process.env,
        WITHY_MIGRATE_URL: databaseUrl("withy_migrate", secrets.migratePassword, dbPort, name),
      };
      await runTypeScript("packages/db", "src/migrate.ts", {
        env,
        failure: "The bench database could not be migrated.",
      });
    }
  });
  const bench = {
    ...process.env,
    WITHY_BENCH_URL: databaseUrl("withy_migrate", secrets.migratePassword, dbPort),
    WITHY_SECRET: secrets.appSecret,
  };
  await step("Rows in bulk", async () =>
    (
      await runTypeScript("tests", "bench/generate.ts", {
        env: bench,
        failure: "The rows could not be made.",
      })
    )
      .trim()
      .split("\n")
      .join("; "),
  );
  await step("Build", () => buildApp());
  await step("Blank page of the framework", () =>
    run(process.execPath, [nextOf(join(root, "tests")), "build"], {
      cwd: blankApp,
      env: { ...process.env, NODE_ENV: "production", NEXT_TELEMETRY_DISABLED: "1" },
    }).then(() => ""),
  );
  await step("Apps", async () => {
    running.apps = await startApps(secrets, dbPort);
  });
  const { large, small, blank } = running.apps;
  const env = {
    ...bench,
    WITHY_BENCH_LARGE: large.url,
    WITHY_BENCH_PID: String(large.program.child.pid),
    WITHY_BENCH_SMALL: small.url,
    WITHY_BENCH_BLANK: blank.url,
  };
  await run(process.execPath, ["--import", "tsx", "bench/bench.ts"], {
    cwd: join(root, "tests"),
    env,
    show: true,
    failure: "A target was missed.",
  });
}

await main(async () => {
  checkNode();
  mkdirSync(dataDir, { recursive: true });
  checkDisk(dataDir, 4_000);
  await step("Debian packages", () => ensurePackages(["mariadb-server-core", "mariadb-client"]));
  await step("Node packages", () => installDependencies());
  const secrets = readSecrets(dataDir);
  const [dbPort] = await freePorts(1);
  const running = { database: null, apps: {} };
  try {
    await createDataFolder(join(dataDir, "db"));
    running.database = await startDatabase({
      dir: join(dataDir, "db"),
      port: dbPort,
      kind: "durable",
      logDir: join(dataDir, "logs"),
    });
    await measure(secrets, running, dbPort);
  } finally {
    await Promise.all(Object.values(running.apps).map(({ program }) => stopProcess(program)));
    if (running.database) await stopProcess(running.database, 60_000);
    if (!keeps && existsSync(dataDir)) rmSync(dataDir, { recursive: true, force: true });
  }
});
