import { expect, test } from "vitest";
import { findCycles, importsOf, makeResolver } from "./imports";

test("reads every form of import and no comment", () => {
  const text = [
    'import a, { type B } from "one";',
    'import {\n  c,\n  d,\n} from "two";',
    'export * from "three";',
    'import "four";',
    'const later = () => import("five");',
    '// import x from "six";',
    '/* import y from "seven"; */',
    'import type { Z } from "eight";',
  ].join("\n");
  expect(importsOf(text).sort()).toEqual(["eight", "five", "four", "one", "three", "two"]);
});

test("resolves relative, app and workspace imports through the exports map", () => {
  const files = [
    "packages/core/src/money.ts",
    "packages/services/src/diary/index.ts",
    "apps/staff/src/server/env.ts",
  ];
  const resolve = makeResolver(
    files.map((path) => ({ path, text: "" })),
    new Map([
      ["core", { "./*": "./src/*.ts" }],
      ["services", { "./diary": "./src/diary/index.ts" }],
    ]),
  );
  expect(resolve("packages/core/src/names.ts", "./money")).toBe("packages/core/src/money.ts");
  expect(resolve("x.ts", "@withy/core/money")).toBe("packages/core/src/money.ts");
  expect(resolve("x.ts", "@withy/services/diary")).toBe("packages/services/src/diary/index.ts");
  expect(resolve("apps/staff/src/a.ts", "@/server/env")).toBe("apps/staff/src/server/env.ts");
  expect(resolve("x.ts", "zod")).toBeNull();
});

test("finds a circle and leaves a diamond alone", () => {
  const circle = new Map([
    ["a", ["b"]],
    ["b", ["c"]],
    ["c", ["a"]],
  ]);
  const diamond = new Map([
    ["a", ["b", "c"]],
    ["b", ["d"]],
    ["c", ["d"]],
    ["d", []],
  ]);
  expect(findCycles(circle)).toEqual([["a", "b", "c", "a"]]);
  expect(findCycles(diamond)).toEqual([]);
});
