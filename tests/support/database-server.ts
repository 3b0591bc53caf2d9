import { createHash } from "node:crypto";
import { cpSync, existsSync, mkdtempSync, readdirSync, readFileSync, renameSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import type { TestProject } from "vitest/node";
import { createDatabases, createDataFolder, startDatabase } from "../../scripts/database.mjs";
import { freePorts, stopProcess } from "../../scripts/processes.mjs";
import { databaseUrl, root } from "../../scripts/settings.mjs";
import { runTypeScript } from "../../scripts/stack.mjs";

declare module "vitest" {
  interface ProvidedContext {
    databaseCount: number;
    /** For worker number n the database is `withy_test_<n>`. */
    databasePort: number;
    databasePasswords: { appPassword: string; migratePassword: string };
  }
}

/** Known on purpose: the server listens on loopback, holds invented people and is gone after the run. */
const passwords = { appPassword: "test-app", migratePassword: "test-migrate" };
const templates = join(root, "node_modules/.cache/withy-test-database");

/** Holds no table: for the replay of the migrations. */
export const emptyDatabase = "withy_test_empty";

const databaseNames = (count: number) => Array.from({ length: count }, (_, i) => `withy_test_${i + 1}`);

/** In memory where the machine offers it. */
function privateFolder(): string {
  return mkdtempSync(join(existsSync("/dev/shm") ? "/dev/shm" : tmpdir(), "withy-test-"));
}

/** Changes whenever a table, a grant or a server setting does. */
function templateDigest(count: number): string {
  const hash = createHash("sha256").update(`${count} ${process.getuid?.()} ${process.arch}`);
  const folders = ["packages/db/migrations", "packages/db/src"];
  const files = folders.flatMap((folder) =>
    readdirSync(join(root, folder), { recursive: true, encoding: "utf8" })
      .filter((name) => /\.(sql|json|ts)$/.test(name) && !name.startsWith("seed"))
      .map((name) => join(folder, name)),
  );
  for (const file of [...files.sort(), "scripts/database.mjs", "tests/support/database-server.ts"])
    hash.update(file).update(readFileSync(join(root, file)));
  return hash.digest("hex").slice(0, 16);
}

export function migrateEnvironment(port: number, database: string): NodeJS.ProcessEnv {
  return {
    ...process.env,
    DATABASE_URL: databaseUrl("withy_app", passwords.appPassword, port, database),
    WITHY_MIGRATE_URL: databaseUrl("withy_migrate", passwords.migratePassword, port, database),
  };
}

async function startFast(dir: string) {
  const [port] = await freePorts(1);
  if (port === undefined) throw new Error("No free port.");
  return { port, server: await startDatabase({ dir, port, kind: "fast", logDir: join(dir, "logs") }) };
}

/** A folder with every worker's database migrated and granted, made once for each state of the schema. */
async function prepareTemplate(count: number): Promise<string> {
  const ready = join(templates, templateDigest(count));
  if (existsSync(ready)) return ready;
  const dir = privateFolder();
  try {
    await createDataFolder(join(dir, "db"));
    const { port, server } = await startFast(join(dir, "db"));
    try {
      await createDatabases(server, [...databaseNames(count), emptyDatabase], passwords);
      for (const name of databaseNames(count)) {
        const failure = "The test database could not be migrated.";
        await runTypeScript("packages/db", "src/migrate.ts", {
          env: migrateEnvironment(port, name),
          failure,
        });
      }
    } finally {
      await stopProcess(server);
    }
    const copy = `${ready}.${process.pid}`;
    cpSync(join(dir, "db"), copy, { recursive: true });
    for (const old of readdirSync(templates)) {
      if (!old.includes(".") && join(templates, old) !== ready)
        rmSync(join(templates, old), { recursive: true, force: true });
    }
    if (existsSync(ready)) rmSync(copy, { recursive: true });
    else renameSync(copy, ready);
    return ready;
  } finally {
    rmSync(dir, { recursive: true, force: true });
  }
}

/** One private server for the run: a copy of the template in memory, ended and removed afterwards. */
export default async function setup(project: TestProject) {
  const template = await prepareTemplate(project.getProvidedContext().databaseCount);
  const dir = privateFolder();
  cpSync(template, join(dir, "db"), { recursive: true });
  const { port, server } = await startFast(join(dir, "db"));
  project.provide("databasePort", port);
  project.provide("databasePasswords", passwords);
  return async () => {
    await stopProcess(server);
    rmSync(dir, { recursive: true, force: true });
  };
}
