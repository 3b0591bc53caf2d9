import { readdirSync, readFileSync } from "node:fs";
import { join, relative, sep } from "node:path";
import { root } from "../../../scripts/settings.mjs";

export interface SourceFile {
  /** From the repository's root, with forward slashes. */
  readonly path: string;
  readonly text: string;
}

const skippedFolders = new Set(["node_modules", "test-results", "playwright-report", "coverage"]);

function* walk(folder: string): Generator<string> {
  for (const entry of readdirSync(folder, { withFileTypes: true })) {
    if (entry.name.startsWith(".") || skippedFolders.has(entry.name)) continue;
    const path = join(folder, entry.name);
    if (entry.isDirectory()) yield* walk(path);
    else yield path;
  }
}

/** Every file below the given folders whose name ends with one of the endings. */
export function readSources(folders: readonly string[], endings = [".ts", ".tsx", ".mjs"]): SourceFile[] {
  return folders
    .flatMap((folder) => [...walk(join(root, folder))])
    .filter((path) => endings.some((ending) => path.endsWith(ending)) && !path.endsWith("next-env.d.ts"))
    .map((path) => ({ path: relative(root, path).split(sep).join("/"), text: readFileSync(path, "utf8") }))
    .sort((a, b) => a.path.localeCompare(b.path));
}

export const codeFolders = ["apps", "packages", "tests", "scripts"];
