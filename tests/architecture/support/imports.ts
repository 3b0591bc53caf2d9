import { posix } from "node:path";
import type { SourceFile } from "./source-files";

const statement = /(?:^|[;\n])\s*(?:import|export)\s[^;"'`]*?\sfrom\s*["']([^"']+)["']/g;
const bareImport = /(?:^|[;\n])\s*import\s*["']([^"']+)["']/g;
const dynamicImport = /\bimport\(\s*["']([^"']+)["']\s*\)/g;

const withoutComments = (text: string) =>
  text.replace(/\/\*[\s\S]*?\*\//g, "").replace(/(^|\s)\/\/.*$/gm, "$1");

/** What a file imports, as written: static, side-effect, re-exported and dynamic. */
export function importsOf(text: string): string[] {
  const code = withoutComments(text);
  const found = [statement, bareImport, dynamicImport].flatMap((form) =>
    [...code.matchAll(form)].map((match) => match[1] ?? ""),
  );
  return [...new Set(found)];
}

/** "@withy/core/money" to "core"; null for what is no package of ours. */
export function workspacePackage(specifier: string): string | null {
  return /^@withy\/([a-z-]+)(?:\/|$)/.exec(specifier)?.[1] ?? null;
}

/** "packages/diary/src/x.ts" to "diary", "apps/staff/…" to "staff", "tests/…" to "tests". */
export function packageOf(path: string): string {
  const [top = "", second = ""] = path.split("/");
  return top === "packages" || top === "apps" ? second : top;
}

/**
 * Finds the file that a relative, "@/" or workspace import means; null for packages from outside. Workspace
 * imports are resolved through each package's exports map.
 */
export function makeResolver(
  files: readonly SourceFile[],
  exportsOf: ReadonlyMap<string, Record<string, string>>,
) {
  const known = new Set(files.map((file) => file.path));
  const firstKnown = (base: string) =>
    [base, `${base}.ts`, `${base}.tsx`, `${base}/index.ts`, `${base}/index.tsx`].find((path) =>
      known.has(path),
    ) ?? null;
  return (from: string, specifier: string): string | null => {
    if (specifier.startsWith(".")) return firstKnown(posix.join(posix.dirname(from), specifier));
    if (specifier.startsWith("@/")) return firstKnown(`apps/staff/src/${specifier.slice(2)}`);
    const name = workspacePackage(specifier);
    if (name === null) return null;
    const target = exportTarget(exportsOf.get(name) ?? {}, `.${specifier.slice(`@withy/${name}`.length)}`);
    return target === null ? null : firstKnown(`packages/${name}/${target.replace(/^\.\//, "")}`);
  };
}

function exportTarget(map: Record<string, string>, wanted: string): string | null {
  const exact = map[wanted];
  if (exact !== undefined) return exact;
  for (const [pattern, target] of Object.entries(map)) {
    const star = pattern.indexOf("*");
    if (star >= 0 && wanted.startsWith(pattern.slice(0, star)))
      return target.replace("*", wanted.slice(star));
  }
  return null;
}

/** Cycles in a graph of imports, each as the list of files that go round; empty where there is none. */
export function findCycles(graph: ReadonlyMap<string, readonly string[]>): string[][] {
  const state = new Map<string, "open" | "done">();
  const trail: string[] = [];
  const cycles: string[][] = [];
  const visit = (node: string) => {
    state.set(node, "open");
    trail.push(node);
    for (const next of graph.get(node) ?? []) {
      if (state.get(next) === "open") cycles.push([...trail.slice(trail.indexOf(next)), next]);
      else if (!state.has(next)) visit(next);
    }
    trail.pop();
    state.set(node, "done");
  };
  for (const node of graph.keys()) if (!state.has(node)) visit(node);
  return cycles;
}
