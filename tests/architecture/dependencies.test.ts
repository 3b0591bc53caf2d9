import { expect, test } from "vitest";
import floors from "./security-floors.json" with { type: "json" };
import { manifests, readText } from "./support/workspace";

const lock = readText("pnpm-lock.yaml");

/** Every version of a package in the lock file. */
function lockedVersions(name: string): string[] {
  const escaped = name.replace(/[/\\^$*+?.()|[\]{}]/g, "\\$&");
  const found = [...lock.matchAll(new RegExp(`^ {2}'?${escaped}@(\\d[^:('\\s]*)`, "gm"))].map(
    (match) => match[1] ?? "",
  );
  return [...new Set(found)];
}

const parts = (version: string) => version.split(/[.-]/).map(Number);

function isBelow(version: string, floor: string): boolean {
  const [a, b] = [parts(version), parts(floor)];
  for (let i = 0; i < 3; i += 1) {
    const difference = (a[i] ?? 0) - (b[i] ?? 0);
    if (difference !== 0) return difference < 0;
  }
  return false;
}

test("versions compare by number, not by text", () => {
  expect(isBelow("9.12.0", "10.6.1")).toBe(true);
  expect(isBelow("10.6.1", "10.6.1")).toBe(false);
  expect(isBelow("10.10.0", "10.6.1")).toBe(false);
});

test.each(Object.entries(floors))("%s is at or above its security floor", (name, { floor }) => {
  const versions = lockedVersions(name);
  expect(versions).not.toEqual([]);
  expect(versions.filter((version) => isBelow(version, floor))).toEqual([]);
});

test("every dependency is pinned through the catalog", () => {
  const loose = [...manifests].flatMap(([name, manifest]) =>
    Object.entries({ ...manifest.dependencies, ...manifest.devDependencies })
      .filter(([, range]) => range !== "catalog:" && range !== "workspace:*")
      .map(([dependency, range]) => `${name}: ${dependency} ${range}`),
  );
  expect(loose).toEqual([]);
});

test("the catalog holds exact versions", () => {
  const catalog = readText("pnpm-workspace.yaml").split(/^catalog:\n/m)[1] ?? "";
  const entries = catalog.split("\n").filter((line) => /^ {2}\S/.test(line) && !line.trim().startsWith("#"));
  expect(entries.length).toBeGreaterThan(20);
  expect(entries.filter((line) => !/: \d+\.\d+\.\d+(-[\w.]+)?$/.test(line))).toEqual([]);
});

test("the lock file names no place to download from", () => {
  expect(lock).not.toMatch(/https?:\/\//);
});
