import { mkdirSync } from "node:fs";
import { join } from "node:path";
import { checkCommand, checkWithVitest } from "./checks.mjs";
import { checkJourneys } from "./journeys.mjs";
import { checkDisk, checkNode, debianPackages, ensurePackages } from "./machine.mjs";
import { run } from "./processes.mjs";
import { main, seconds, step } from "./progress.mjs";
import { root } from "./settings.mjs";
import { buildApp, installDependencies, pnpm } from "./workspace.mjs";

const since = performance.now();
const reports = join(root, "test-results");
const environment = { ...process.env, CI: "1", NODE_ENV: "test", FORCE_COLOR: "0" };

/** Each stage answers with counts; a later one still runs when an earlier one failed, so that one run tells all. */
const stages = [
  [
    "Lint",
    () => checkCommand(() => run(join(root, "node_modules/.bin/biome"), ["check", "."], { cwd: root })),
  ],
  ["Types", () => checkCommand(() => pnpm(["run", "typecheck"]))],
  [
    "Rules, published values, structure",
    () => checkWithVitest(join(reports, "unit.json"), ["unit"], { cwd: root, env: environment }),
  ],
  [
    "Parts of the screen",
    () => checkWithVitest(join(reports, "ui.json"), ["ui-jsdom"], { cwd: root, env: environment }),
  ],
  [
    "Services against MariaDB",
    () => checkWithVitest(join(reports, "db.json"), ["db"], { cwd: root, env: environment }),
  ],
  ["Build", () => checkCommand(() => buildApp())],
  ["Journeys in Chromium", () => checkJourneys(join(reports, "journeys.json"))],
];

async function runStage([name, work]) {
  console.log(`\n== ${name}`);
  const began = performance.now();
  const found = await work().catch((error) => {
    console.log(`\n${error.message}\n`);
    return { passed: 0, failed: 1, skipped: 0 };
  });
  return { name, ...found, time: seconds(began) };
}

function sayResult({ name, passed, failed, skipped, time }) {
  const more = skipped > 0 ? `, ${skipped} skipped` : "";
  console.log(`  ${name.padEnd(36)} ${String(passed).padStart(5)} passed, ${failed} failed${more}, ${time}`);
}

await main(async () => {
  checkNode();
  checkDisk(root, 500);
  mkdirSync(reports, { recursive: true });
  await step("Debian packages", () => ensurePackages(Object.keys(debianPackages)));
  await step("Node packages", () => installDependencies());
  const results = [];
  for (const stage of stages) results.push(await runStage(stage));
  console.log(`\n== Summary after ${seconds(since)}`);
  for (const result of results) sayResult(result);
  const total = (key) => results.reduce((sum, result) => sum + result[key], 0);
  console.log(`\n${total("passed")} passed, ${total("failed")} failed`);
  if (total("failed") > 0) process.exitCode = 1;
});
