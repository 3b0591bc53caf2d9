import { spawnSync } from "node:child_process";
import { existsSync, mkdirSync, readdirSync, statfsSync } from "node:fs";
import { StartError } from "./progress.mjs";

/** What each Debian package gives us, and the file that shows it is there. */
export const debianPackages = {
  // The -core package is the server without a system service: Withy runs its own, in its own folder.
  "mariadb-server-core": () => existsSync("/usr/sbin/mariadbd"),
  "mariadb-client": () => existsSync("/usr/bin/mariadb-admin"),
  chromium: () => existsSync("/usr/bin/chromium"),
  "poppler-utils": () => existsSync("/usr/bin/pdftotext"),
  "fonts-dejavu-core": () => existsSync("/usr/share/fonts/truetype/dejavu/DejaVuSans.ttf"),
};

export function checkNode(version = process.versions.node) {
  const [major = 0, minor = 0] = version.split(".").map(Number);
  if (major > 20 || (major === 20 && minor >= 19)) return;
  throw new StartError(
    `Withy needs Node 20.19 or later; this is ${version}. Install a later Node and run the command again.`,
  );
}

export function checkDisk(folder, megabytes) {
  mkdirSync(folder, { recursive: true });
  const { bavail, bsize } = statfsSync(folder);
  const free = Math.floor((Number(bavail) * Number(bsize)) / 1_000_000);
  if (free >= megabytes) return;
  throw new StartError(
    `Only ${free} MB are free where ${folder} lies, and ${megabytes} MB are needed. Make room and run the command again.`,
  );
}

export const isRoot = () => process.getuid?.() === 0;

/** Installs what is missing of the named Debian packages, or says the one command that does. */
export function ensurePackages(names) {
  const missing = names.filter((name) => !debianPackages[name]());
  if (missing.length === 0) return "already there";
  if (!existsSync("/usr/bin/apt-get")) {
    throw new StartError(
      `Withy runs on Debian and its relatives, where these packages give what it needs: ${missing.join(", ")}.`,
    );
  }
  if (!isRoot()) {
    throw new StartError(
      `${missing.length === 1 ? "A Debian package is" : "Debian packages are"} missing. Run this once, then start again:\n\n` +
        `  sudo apt-get update && sudo apt-get install -y --no-install-recommends ${missing.join(" ")}`,
    );
  }
  const env = { ...process.env, DEBIAN_FRONTEND: "noninteractive" };
  const lists = "/var/lib/apt/lists";
  const listed =
    existsSync(lists) &&
    readdirSync(lists).some((name) => name.endsWith("_Packages") || name.endsWith("_Packages.lz4"));
  const install = () => apt(["install", "-y", "--no-install-recommends", ...missing], env);
  if (!(listed && install().status === 0)) {
    // Stale lists point at files that the mirror no longer has: refresh them once and try again.
    apt(["update"], env);
    const again = install();
    if (again.status !== 0)
      throw new StartError(`apt-get could not install ${missing.join(", ")}:\n${tail(again)}`);
  }
  return `installed ${missing.join(", ")}`;
}

function apt(args, env) {
  return spawnSync("apt-get", args, { env, encoding: "utf8", maxBuffer: 64_000_000 });
}

const tail = ({ stdout, stderr }) => `${stdout}\n${stderr}`.trim().split("\n").slice(-15).join("\n");
