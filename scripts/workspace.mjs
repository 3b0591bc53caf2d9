import { createHash } from "node:crypto";
import { existsSync, readdirSync, readFileSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { run } from "./processes.mjs";
import { root } from "./settings.mjs";

const { packageManager } = JSON.parse(readFileSync(join(root, "package.json"), "utf8"));
const quiet = { NEXT_TELEMETRY_DISABLED: "1", TURBO_TELEMETRY_DISABLED: "1", DO_NOT_TRACK: "1", CI: "1" };

/** pnpm through npx: the version that the lock file was made with, whatever else is on this machine. */
export function pnpm(args, options = {}) {
  return run("npx", ["-y", packageManager, ...args], {
    cwd: root,
    ...options,
    env: { ...process.env, ...quiet, ...options.env },
  });
}

/** Every file that decides what gets installed. */
function manifestFiles() {
  const inFolder = (folder) =>
    readdirSync(join(root, folder), { withFileTypes: true })
      .filter((entry) => entry.isDirectory())
      .map((entry) => join(folder, entry.name, "package.json"));
  return [
    "pnpm-lock.yaml",
    "pnpm-workspace.yaml",
    "package.json",
    "tests/package.json",
    ...inFolder("apps"),
    ...inFolder("packages"),
  ]
    .filter((file) => existsSync(join(root, file)))
    .sort();
}

function manifestDigest() {
  const hash = createHash("sha256").update(process.version);
  for (const file of manifestFiles()) hash.update(file).update(readFileSync(join(root, file)));
  return hash.digest("hex");
}

/** Installs exactly what the lock file says; does nothing where that was done already. */
export async function installDependencies() {
  const stamp = join(root, "node_modules", ".withy-installed");
  const digest = manifestDigest();
  if (existsSync(stamp) && readFileSync(stamp, "utf8") === digest) return "already there";
  await pnpm(["install", "--frozen-lockfile"], {
    failure: "The packages could not be installed. Check the network and try again.",
  });
  writeFileSync(stamp, digest);
  return "";
}

/** Builds the app; turbo answers at once where nothing changed since the last build. */
export async function buildApp() {
  const output = await pnpm(["run", "build"], {
    env: { NODE_ENV: "production" },
    failure: "The app could not be built.",
  });
  return output.includes("FULL TURBO") ? "nothing changed" : "";
}
