import { expect, test } from "vitest";
import { codeFolders, readSources } from "./support/source-files";

const sources = readSources(codeFolders);
const mostLines = 250;

/** A table of facts has no behaviour: neither function nor class. */
const isPureData = (text: string) =>
  !/=>|\bfunction\b|\bclass\s/.test(text.replace(/\/\*[\s\S]*?\*\/|\/\/.*$/gm, ""));

test(`no file is longer than ${mostLines} lines, tables of facts apart`, () => {
  const long = sources
    .filter(({ text }) => !isPureData(text))
    .map(({ path, text }) => ({ path, lines: text.trimEnd().split("\n").length }))
    .filter(({ lines }) => lines > mostLines);
  expect(long).toEqual([]);
});

test("files and folders are named in kebab-case by what they hold", () => {
  const banned = new Set([
    "utils",
    "util",
    "helpers",
    "helper",
    "common",
    "types",
    "manager",
    "misc",
    "shared",
  ]);
  const route = /^(\(.+\)|\[\[?(\.\.\.)?[a-z-]+\]\]?)$/i;
  const wrong = sources.filter(({ path }) => {
    const parts = path.split("/");
    const stem = (parts.pop() ?? "").replace(/\.(test|spec|config|d)?\.?(ts|tsx|mjs|mts)$/, "");
    return [...parts, stem].some((part) => {
      if (route.test(part)) return false;
      return banned.has(part) || !/^[a-z0-9]+([-.][a-z0-9]+)*$/.test(part);
    });
  });
  expect(wrong.map(({ path }) => path)).toEqual([]);
});

const written = readSources(codeFolders, [".ts", ".tsx", ".mjs", ".css", ".sql", ".md", ".json"]);
const find = (pattern: RegExp, files = written) =>
  files.flatMap(({ path, text }) =>
    text
      .split("\n")
      .flatMap((line, index) =>
        pattern.test(line) ? [`${path}:${index + 1}: ${line.trim().slice(0, 120)}`] : [],
      ),
  );

test("no text holds an em dash", () => {
  // A test may name it, to forbid it.
  const texts = written.filter(({ path }) => !/\.test\.tsx?$/.test(path));
  expect(find(/\u2014/, texts)).toEqual([]);
});

test("nothing is left for later", () => {
  const marks = ["TO" + "DO", "FIX" + "ME", "X" + "XX"].join("|");
  expect(find(new RegExp(`\\b(${marks})\\b`))).toEqual([]);
});

test("no test is skipped, focused or left empty", () => {
  const tests = sources.filter(({ path }) => /\.(test|spec)\.tsx?$/.test(path));
  const off = ["skip", "only", "todo", "fails", "fixme"].join("|");
  expect(find(new RegExp(`\\b(test|it|describe)\\.(${off})\\b`), tests)).toEqual([]);
});

test("strictness is not talked away", () => {
  const code = sources.filter(({ path }) => !path.endsWith(".mjs"));
  // The linter forbids any; these would silence the compiler itself.
  const silencers = ["ts-" + "ignore", "ts-" + "nocheck", "ts-" + "expect-error"];
  expect(find(new RegExp(silencers.join("|")), code)).toEqual([]);
});

test("no path of one machine and no registry is written down", () => {
  const places = ["/wo" + "rk/", "/ho" + "me/", "registry\\.n" + "pmjs"];
  expect(find(new RegExp(places.join("|")))).toEqual([]);
});
