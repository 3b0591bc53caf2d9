import { existsSync, readFileSync, rmSync } from "node:fs";
import { run } from "./processes.mjs";

/** What one stage of the tests found. */
const outcome = (passed, failed, skipped = 0) => ({ passed, failed, skipped });

/** A command that is right or wrong as a whole, such as the linter. */
export async function checkCommand(work) {
  try {
    await work();
    return outcome(1, 0);
  } catch (error) {
    console.log(`\n${error.message}\n`);
    return outcome(0, 1);
  }
}

/** Runs a test runner that writes a JSON report; a run without a report is one failure. */
async function checkWithReport(report, command, args, options, read) {
  rmSync(report, { force: true });
  let problem = null;
  try {
    await run(command, args, { show: true, ...options });
  } catch (error) {
    problem = error;
  }
  if (!existsSync(report)) {
    console.log(`\n${problem?.message ?? "The tests gave no report."}\n`);
    return outcome(0, 1);
  }
  const found = read(JSON.parse(readFileSync(report, "utf8")));
  // A runner may end badly although each test passed, for example on an error between tests.
  return problem && found.failed === 0 ? outcome(found.passed, 1, found.skipped) : found;
}

export function readVitestReport({ testResults }) {
  const count = (status) =>
    testResults.flatMap((file) => file.assertionResults).filter((test) => test.status === status).length;
  const brokenFiles = testResults.filter(
    (file) => file.status === "failed" && file.assertionResults.length === 0,
  ).length;
  return outcome(
    count("passed"),
    count("failed") + brokenFiles,
    count("pending") + count("skipped") + count("todo"),
  );
}

export function readPlaywrightReport({ stats, errors }) {
  return outcome(stats.expected, stats.unexpected + stats.flaky + errors.length, stats.skipped);
}

export const checkWithVitest = (report, projects, options) =>
  checkWithReport(
    report,
    process.execPath,
    [
      "node_modules/vitest/vitest.mjs",
      "run",
      ...projects.flatMap((name) => ["--project", name]),
      "--reporter=default",
      "--reporter=json",
      `--outputFile.json=${report}`,
    ],
    options,
    readVitestReport,
  );

export const checkWithPlaywright = (report, files, { env, ...options }) =>
  checkWithReport(
    report,
    process.execPath,
    [
      "tests/node_modules/@playwright/test/cli.js",
      "test",
      "-c",
      "tests/e2e/playwright.config.ts",
      "--reporter=list,json",
      ...files,
    ],
    { ...options, env: { ...env, PLAYWRIGHT_JSON_OUTPUT_NAME: report } },
    readPlaywrightReport,
  );
