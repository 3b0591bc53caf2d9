import { describe, expect, test } from "vitest";
import { findCycles, importsOf, makeResolver, packageOf, workspacePackage } from "./support/imports";
import { readSources } from "./support/source-files";
import { allowedImports, manifests } from "./support/workspace";

const sources = readSources(["apps", "packages"]);
const imports = sources.flatMap(({ path, text }) =>
  importsOf(text).map((specifier) => ({ path, specifier })),
);
const say = (found: { path: string; specifier: string }[]) =>
  found.map((i) => `${i.path} imports ${i.specifier}`);
const isTest = (path: string) => /\.test\.tsx?$/.test(path);

describe("who may import whom", () => {
  test("every package has a row in the table and every row a package", () => {
    expect([...manifests.keys()].sort()).toEqual(Object.keys(allowedImports).sort());
  });

  test("no file imports a package that its own may not use", () => {
    const wrong = imports.filter(({ path, specifier }) => {
      const [from, to] = [packageOf(path), workspacePackage(specifier)];
      return to !== null && to !== from && !allowedImports[from]?.includes(to);
    });
    expect(say(wrong)).toEqual([]);
  });

  test("no package.json lists a package that it may not use", () => {
    const wrong = [...manifests].flatMap(([name, manifest]) =>
      Object.keys({ ...manifest.dependencies, ...manifest.devDependencies })
        .map((dependency) => ({ path: name, specifier: dependency }))
        .filter(({ specifier }) => {
          const to = workspacePackage(specifier);
          return to !== null && !allowedImports[name]?.includes(to);
        }),
    );
    expect(say(wrong)).toEqual([]);
  });

  test("every package that is imported is listed in the importer's package.json", () => {
    const unlisted = imports.filter(({ path, specifier }) => {
      if (/^(\.|@\/|node:)/.test(specifier)) return false;
      const name = specifier
        .split("/")
        .slice(0, specifier.startsWith("@") ? 2 : 1)
        .join("/");
      const manifest = manifests.get(packageOf(path));
      const listed = { ...manifest?.dependencies, ...manifest?.devDependencies };
      // Some packages are nothing but types: "fhir/r4" comes out of @types/fhir.
      return name !== manifest?.name && !(name in listed) && !(`@types/${name}` in listed);
    });
    expect(say(unlisted)).toEqual([]);
  });

  test("relative imports stay inside their package", () => {
    const wrong = imports.filter(({ path, specifier }) => {
      if (!specifier.startsWith(".")) return false;
      const target = new URL(specifier, `file:///${path}`).pathname.slice(1);
      return packageOf(target) !== packageOf(path);
    });
    expect(say(wrong)).toEqual([]);
  });
});

describe("the app", () => {
  const inStaff = imports.filter(({ path }) => path.startsWith("apps/staff/"));

  test("never reaches for the database", () => {
    const wrong = inStaff.filter(({ specifier }) => /^(@withy\/db|drizzle-orm|mysql2)(\/|$)/.test(specifier));
    expect(say(wrong)).toEqual([]);
  });

  // A file of server actions is made to be called from the browser: Next puts an address in its place.
  const isActions = (path: string, specifier: string) =>
    specifier.startsWith("@/server/") &&
    /^\s*["']use server["']/.test(textOf(resolve(path, specifier) ?? ""));

  test("keeps services and server modules out of what runs in the browser", () => {
    const isForBrowser = (path: string) =>
      /^apps\/staff\/src\/(features|components)\//.test(path) || /^\s*["']use client["']/.test(textOf(path));
    const wrong = inStaff.filter(
      ({ path, specifier }) =>
        !isTest(path) &&
        !isActions(path, specifier) &&
        isForBrowser(path) &&
        /^(@withy\/services(\/|$)|@\/server\/|server-only$)/.test(specifier),
    );
    expect(say(wrong)).toEqual([]);
  });

  test("has features that never import each other", () => {
    const featureOf = (path: string | null) =>
      /^apps\/staff\/src\/features\/([^/]+)\//.exec(path ?? "")?.[1] ?? null;
    const wrong = inStaff.filter(({ path, specifier }) => {
      const [from, to] = [featureOf(path), featureOf(resolve(path, specifier))];
      return from !== null && to !== null && from !== to;
    });
    expect(say(wrong)).toEqual([]);
  });
});

const texts = new Map(sources.map(({ path, text }) => [path, text]));
const textOf = (path: string) => texts.get(path) ?? "";
const exportsOf = new Map([...manifests].map(([name, manifest]) => [name, manifest.exports ?? {}]));
const resolve = makeResolver(sources, exportsOf);

test("no import goes round in a circle", () => {
  const graph = new Map(
    sources.map(({ path, text }) => [
      path,
      importsOf(text).flatMap((specifier) => resolve(path, specifier) ?? []),
    ]),
  );
  expect(findCycles(graph).map((cycle) => cycle.join(" > "))).toEqual([]);
});

test("every workspace import names a file that exists", () => {
  const missing = imports.filter(
    ({ path, specifier }) =>
      workspacePackage(specifier) !== null &&
      !/\.(css|woff2)$/.test(specifier) &&
      resolve(path, specifier) === null,
  );
  expect(say(missing)).toEqual([]);
});

test("packages are entered by sub-path: none has a root barrel", () => {
  const withRoot = [...manifests]
    .filter(([, manifest]) => manifest.exports?.["."] !== undefined)
    .map(([name]) => name);
  const barrels = sources
    .filter(({ path }) => /^packages\/[^/]+\/src\/index\.tsx?$/.test(path))
    .map(({ path }) => path);
  expect([...withRoot, ...barrels]).toEqual([]);
});
