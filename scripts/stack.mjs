import { existsSync, readFileSync } from "node:fs";
import { join } from "node:path";
import { createDatabases, createDataFolder, startDatabase } from "./database.mjs";
import { lastLines, pause, run, startProcess, stopProcess } from "./processes.mjs";
import { StartError } from "./progress.mjs";
import { appEnvironment, databaseName, root } from "./settings.mjs";

export async function startStackDatabase(settings, secrets, kind) {
  const dir = join(settings.dataDir, "db");
  await createDataFolder(dir);
  const database = await startDatabase({
    dir,
    port: settings.dbPort,
    kind,
    logDir: join(settings.dataDir, "logs"),
  });
  await createDatabases(database, [databaseName], secrets);
  return database;
}

/** Runs a TypeScript command of a package to its end and gives what it printed. */
export function runTypeScript(folder, file, { env, args = [], failure }) {
  return run(process.execPath, ["--import", "tsx", file, ...args], { cwd: join(root, folder), env, failure });
}

export async function migrate(settings, secrets) {
  const output = await runTypeScript("packages/db", "src/migrate.ts", {
    env: appEnvironment(settings, secrets),
    failure: "The database could not be brought up to date.",
  });
  return lastLines(output, 1).trim();
}

/** Fills an empty database with the demonstration practices; leaves any other alone. */
export async function seedDemo(settings, secrets) {
  const output = await runTypeScript("packages/db", "src/seed/main.ts", {
    env: appEnvironment(settings, secrets),
    failure: "The demonstration practices could not be written.",
  });
  return lastLines(output, 1).trim();
}

/** Starts the app, the worker and, for the demonstration, the stand-ins for hosted services. */
export function startPrograms(settings, secrets, { isDev = false } = {}) {
  const env = appEnvironment(settings, secrets, isDev ? "development" : "production");
  const logDir = join(settings.dataDir, "logs");
  const next = join(root, "apps/staff/node_modules/next/dist/bin/next");
  if (!existsSync(next))
    throw new StartError("Next is not installed in apps/staff. Remove node_modules and start again.");
  const typescript = (name) =>
    startProcess(name, process.execPath, ["--import", "tsx", "src/main.ts"], {
      cwd: join(root, "apps", name),
      env,
      logDir,
    });
  return [
    startProcess(
      "app",
      process.execPath,
      [next, isDev ? "dev" : "start", "-H", "127.0.0.1", "-p", String(settings.port)],
      {
        cwd: join(root, "apps/staff"),
        env,
        logDir,
      },
    ),
    typescript("worker"),
    ...(settings.demo ? [typescript("fakes")] : []),
  ];
}

async function readHealth(url) {
  try {
    const answer = await fetch(url, { signal: AbortSignal.timeout(5_000) });
    return { isOk: answer.ok, said: `${answer.status} ${(await answer.text()).slice(0, 300)}` };
  } catch (error) {
    return { isOk: false, said: error.cause?.code ?? error.message };
  }
}

export function describeEnd({ name, child, logFile }) {
  const how = child.signalCode ?? `code ${child.exitCode}`;
  return `The ${name} ended by itself (${how}). Its log (${logFile}) ends with:\n${lastLines(readFileSync(logFile, "utf8"), 20)}`;
}

/** Waits until app, database and worker all say that they are well. */
export async function waitUntilHealthy(settings, programs, patience = 90_000) {
  const until = Date.now() + patience;
  let last = { isOk: false, said: "no answer" };
  while (Date.now() < until) {
    const ended = programs.find((program) => program.hasEnded);
    if (ended) throw new StartError(describeEnd(ended));
    last = await readHealth(`http://127.0.0.1:${settings.port}/api/health`);
    if (last.isOk) return;
    await pause(150);
  }
  const logs = programs.map((program) => `  ${program.logFile}`).join("\n");
  throw new StartError(
    `Withy did not become ready: /api/health says ${last.said}. Look in these logs:\n${logs}`,
  );
}

/** Programs first, the database last, since they may still be writing to it. */
export async function stopStack(programs, database) {
  await Promise.all(programs.map((program) => stopProcess(program)));
  if (database) await stopProcess(database, 30_000);
}
